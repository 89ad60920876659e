import { beforeAll, describe, expect, it } from 'vitest';
import { project } from '@oriel/shared/projection/layer-on-glass';
import { eyeFromPixel, focalPx, pixelOfPoint, type Camera } from '@oriel/shared/viewer/camera';
import { glassErrorMm } from '@oriel/shared/viewer/measuring/glass-error';
import { factorFromSpot } from '@oriel/shared/viewer/measuring/scale-from-spot';
import { tiltFromSpot } from '@oriel/shared/viewer/measuring/tilt-from-spot';
import { lensFromTwoDistances } from '@oriel/shared/viewer/measuring/two-distances';
import { measured, type Measured } from '@oriel/shared/viewer/measuring/uncertainty';
import { normalNoise, repeatableRandom } from '../video/random';
import { startOpenCv, type OpenCv } from './opencv';

const exactly = (value: number) => measured(value, 0);

/** Reference: OpenCV.js, projectPoints. */
describe('the field of view by two distances, beside OpenCV', () => {
  let cv: OpenCv;
  beforeAll(async () => void ({ cv } = await startOpenCv()));

  /** How wide a camera of OpenCV's sees a card whose two edges stand at x ± half, this far before the lens. */
  function widthSeen(focal: number, cardMm: number, depthMm: number, x: number): number {
    const edges = [x - cardMm / 2, 12, depthMm, x + cardMm / 2, 12, depthMm];
    const mats = [
      cv.matFromArray(2, 3, cv.CV_64F, edges),
      cv.matFromArray(3, 1, cv.CV_64F, [0, 0, 0]),
      cv.matFromArray(3, 1, cv.CV_64F, [0, 0, 0]),
      cv.matFromArray(3, 3, cv.CV_64F, [focal, 0, 640, 0, focal, 360, 0, 0, 1]),
      cv.matFromArray(4, 1, cv.CV_64F, [0, 0, 0, 0]),
      new cv.Mat(),
    ];
    cv.projectPoints(mats[0], mats[1], mats[2], mats[3], mats[4], mats[5]);
    const [ax, , bx] = mats[5].data64F;
    for (const mat of mats) mat.delete();
    return bx - ax;
  }

  it.each([
    [906.6, 12],
    [1108.51, 4],
    [734.4, -3],
  ])('finds f = %f px of a lens %f mm behind the front, off the axis too', (focal, behind) => {
    const sighting = (distance: number, x: number) => ({
      distanceMm: exactly(distance),
      widthPx: exactly(widthSeen(focal, 85.6, distance + behind, x)),
    });
    const lens = lensFromTwoDistances(exactly(85.6), sighting(250, 0), sighting(700, 60), 1280);
    expect(lens.focalPx.value).toBeCloseTo(focal, 6);
    expect(lens.behindFrontMm.value).toBeCloseTo(behind, 6);
  });
});

/** Reference: Monte Carlo propagation of distributions (JCGM 101:2008), 20,000 trials: standard deviations then scatter by 0.5 %. */
describe('uncertainties, beside a Monte Carlo', () => {
  const trials = 20_000;
  const random = repeatableRandom(7);

  const draws = ({ value, uncertainty }: Measured) => Array.from(normalNoise(trials, uncertainty, random), (noise) => value + noise);
  const spread = (values: readonly number[]) => {
    const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
    return Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (values.length - 1));
  };
  /** Draws every input anew in each trial. */
  const trial = (inputs: readonly Measured[], f: (x: number[]) => number) => {
    const columns = inputs.map(draws);
    return Array.from({ length: trials }, (_, i) => f(columns.map((column) => column[i])));
  };
  const alike = (found: number, reference: number, share = 0.03) => expect(Math.abs(found / reference - 1)).toBeLessThan(share);

  it('of the field of view and of the lens by two distances', () => {
    const inputs = [measured(300, 2), measured(900, 3), measured(319.6, 1.5), measured(105.2, 1.2), measured(85.6, 0.07)];
    const lensOf = ([d1, d2, w1, w2, size]: Measured[]) =>
      lensFromTwoDistances(size, { distanceMm: d1, widthPx: w1 }, { distanceMm: d2, widthPx: w2 }, 1280);
    const lens = lensOf(inputs);
    alike(lens.hfovRad.uncertainty, spread(trial(inputs, (x) => lensOf(x.map(exactly)).hfovRad.value)));
    alike(lens.focalPx.uncertainty, spread(trial(inputs, (x) => lensOf(x.map(exactly)).focalPx.value)));
    alike(lens.behindFrontMm.uncertainty, spread(trial(inputs, (x) => lensOf(x.map(exactly)).behindFrontMm.value)));
  });

  it('of a tilt, and of a viewer’s own scale', () => {
    const lens = [measured(20, 3), measured(280, 3), measured(5, 3)];
    const spot = [measured(300, 15), measured(-60, 20), measured(1800, 10)];
    const seen = [measured(410, 4), measured(-90, 4), measured(1790, 20)];
    const inputs = [...lens, ...spot, ...seen];
    const point = ([x, y, z]: Measured[]) => ({ x, y, z });
    const tiltOf = (all: Measured[]) => tiltFromSpot(point(all.slice(0, 3)), point(all.slice(3, 6)), point(all.slice(6)));
    const tilt = tiltOf(inputs);
    alike(tilt.pitchRad.uncertainty, spread(trial(inputs, (x) => tiltOf(x.map(exactly)).pitchRad.value)));
    alike(tilt.yawRad.uncertainty, spread(trial(inputs, (x) => tiltOf(x.map(exactly)).yawRad.value)));

    const range = measured(1890, 9);
    const factor = factorFromSpot(1.048, range, point(lens), point(spot));
    const factors = trial([range, ...lens, ...spot], ([seenMm, ...rest]) => {
      const all = rest.map(exactly);
      return factorFromSpot(1.048, exactly(seenMm), point(all.slice(0, 3)), point(all.slice(3))).value;
    });
    alike(factor.uncertainty, spread(factors));
  });

  it('of a layer on the glass, for a whole set-up at once', () => {
    const camera: Camera = {
      position: { x: 0, y: 280, z: 0 },
      pitchRad: -0.12,
      yawRad: 0.04,
      rollRad: 0.01,
      hfovRad: 1.1,
      mirrored: false,
      widthPx: 1280,
      heightPx: 720,
    };
    const glass = { widthMm: 941, heightMm: 529 };
    const eye = { x: 250, y: -40, z: 1800 };
    const unsure = { hfovRad: 0.02, tiltRad: 0.008, positionMm: 4, viewerScale: 0.03, glassScale: 0 };
    const depth = 300;

    const pixel = pixelOfPoint(camera, eye)!;
    const way = { x: eye.x - camera.position.x, y: eye.y - camera.position.y, z: eye.z - camera.position.z };
    const along = (Math.hypot(way.x, way.y, way.z) * focalPx(camera)) / Math.hypot(focalPx(camera), pixel.x - 640, pixel.y - 360);
    const inputs = [0.02, 0.008, 0.008, 4, 4, 4, 0.03].map((u) => measured(0, u));
    const eyes = ([fov, pitch, yaw, x, y, z, scale]: number[]) => {
      const other: Camera = {
        ...camera,
        hfovRad: camera.hfovRad + fov,
        pitchRad: camera.pitchRad + pitch,
        yawRad: camera.yawRad + yaw,
        position: { x: camera.position.x + x, y: camera.position.y + y, z: camera.position.z + z },
      };
      return eyeFromPixel(other, pixel.x, pixel.y, along * (1 + scale) * (focalPx(other) / focalPx(camera)));
    };
    const columns = inputs.map(draws);
    const places = [[0, 0], ...[-1, 1].flatMap((sx) => [-1, 1].map((sy) => [(sx * glass.widthMm) / 2, (sy * glass.heightMm) / 2]))];
    const scatter = places.map(([sx, sy]) => {
      const point = { x: sx + ((sx - eye.x) * depth) / eye.z, y: sy + ((sy - eye.y) * depth) / eye.z, z: -depth };
      const drawn = Array.from({ length: trials }, (_, i) => project(point, eyes(columns.map((column) => column[i]))));
      return Math.hypot(spread(drawn.map(({ x }) => x)), spread(drawn.map(({ y }) => y)));
    });
    alike(glassErrorMm(glass, camera, unsure, depth, eye), Math.max(...scatter));
  });
});
