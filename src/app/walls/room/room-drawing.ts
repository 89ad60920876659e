import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import type { Point3 } from '@oriel/shared/projection/types';
import { acrossOf, glassAcross, sidesOf } from '../../drawing/across';
import { roundStep } from '../../drawing/depth-scale';
import { type DepthFrame, type ElevationFrame, type Frame, boxOf } from '../../drawing/frames';
import { type Across, depthRangeOf, drawnAt, drawnOnGlass } from '../../drawing/placing';
import { plainMm } from '../../figures/words';
import { degrees } from '../../screen/screen-measure';
import { coneOf } from './wall-room';
import { seenPart } from './zone-seen';

const leastTickPx = 54;

/** The part of the zone that the camera does not see: the whole of it, with what is seen left out (fill rule evenodd). */
function unseenPath(frame: DepthFrame, setUp: WallSetUp): string {
  const { low, high } = sidesOf(frame.view);
  const { zone } = setUp;
  const whole: Across[] = [zone.nearestMm, zone.farthestMm].flatMap((z, back) => {
    const ends = [{ across: zone[low], z }, { across: zone[high], z }];
    return back ? ends.reverse() : ends;
  });
  const outline = (corners: readonly Across[]) =>
    corners.map((corner, index) => {
      const { x, y } = drawnAt(frame, corner);
      return `${index ? 'L' : 'M'}${x.toFixed(1)},${y.toFixed(1)}`;
    }).join('') + (corners.length > 0 ? 'Z' : '');
  return outline(whole) + outline(seenPart(frame.view, setUp));
}

/** A view of the wall in which distance is seen, as lines and places on the paper. */
export function drawView(frame: DepthFrame, setUp: WallSetUp, spot: Point3 | null, clip: Frame) {
  const { glass, camera, zone } = setUp;
  const { beforeMm } = depthRangeOf(frame);
  const { low, high } = sidesOf(frame.view);
  const [from, to] = glassAcross(frame.view, glass).map((across) => drawnAt(frame, { across, z: 0 }));
  const step = roundStep(frame.pxPerMm, leastTickPx);
  const plan = frame.view === 'plan';
  return {
    frame,
    clip,
    plan,
    title: plan ? 'Plan' : 'Section',
    glass: { from, to },
    glassText: plan ? `glass, ${plainMm(glass.widthMm)} mm` : `${plainMm(glass.heightMm)} mm`,
    zone: boxOf(drawnAt(frame, { across: zone[low], z: zone.nearestMm }), drawnAt(frame, { across: zone[high], z: zone.farthestMm })),
    unseen: unseenPath(frame, setUp),
    cone: coneOf(frame.view, camera, beforeMm).map(([lens, end]) => ({ from: drawnAt(frame, lens), to: drawnAt(frame, end) })),
    lens: drawnAt(frame, { across: acrossOf(frame.view, camera.position), z: camera.position.z }),
    cameraText: plan ? `camera, ${plainMm(degrees(camera.hfovRad))}° across` : `camera ${turnWords(camera.pitchRad, 'up', 'down')}`,
    ticks: Array.from({ length: Math.floor(beforeMm / step) }, (_, i) => ({ text: plainMm((i + 1) * step), at: drawnAt(frame, { across: 0, z: (i + 1) * step }) })),
    spot: spot && drawnAt(frame, { across: acrossOf(frame.view, spot), z: spot.z }),
  };
}

/** The wall from the front: the glass, and where on its frame the lens sits. */
export function drawElevation(frame: ElevationFrame, { glass, camera, zone }: WallSetUp) {
  const at = (x: number, y: number) => drawnOnGlass(frame, { x, y });
  const corner = at(-glass.widthMm / 2, glass.heightMm / 2);
  return {
    frame,
    glass: { left: corner.x, top: corner.y, width: glass.widthMm * frame.pxPerMm, height: glass.heightMm * frame.pxPerMm },
    lens: at(camera.position.x, camera.position.y),
    rollDeg: -degrees(camera.rollRad),
    zone: boxOf(at(zone.leftMm, zone.highestMm), at(zone.rightMm, zone.lowestMm)),
    text: `${plainMm(glass.widthMm)} × ${plainMm(glass.heightMm)} mm`,
  };
}

function turnWords(rad: number, positive: string, negative: string): string {
  const figure = plainMm(Math.abs(degrees(rad)));
  return Number(figure) === 0 ? 'level' : `${figure}° ${rad > 0 ? positive : negative}`;
}
