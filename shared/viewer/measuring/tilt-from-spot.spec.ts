import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { figure } from '../../projection/testing/arbitraries';
import type { Point3 } from '../../projection/types';
import { eyeFromPixel, pixelOfPoint, type Camera } from '../camera';
import { tiltFromSpot } from './tilt-from-spot';
import { measured } from './uncertainty';

const exactly = ({ x, y, z }: Point3) => ({ x: measured(x, 0), y: measured(y, 0), z: measured(z, 0) });
const nowhere = exactly({ x: 0, y: 0, z: 0 });

describe('tiltFromSpot', () => {
  it('finds a camera turned down by 10 degrees from who stands straight before it (by hand)', () => {
    const ten = Math.PI / 18;
    const seen = exactly({ x: 0, y: 2000 * Math.sin(ten), z: 2000 * Math.cos(ten) });
    const { pitchRad, yawRad } = tiltFromSpot(nowhere, exactly({ x: 0, y: 0, z: 2000 }), seen);
    expect(pitchRad.value).toBeCloseTo(-ten, 12);
    expect(yawRad.value).toBeCloseTo(0, 12);
  });

  it('is as sure as the spot: 10 mm sideways at 2 m is 5 mrad of yaw (by hand)', () => {
    const spot = { x: measured(0, 10), y: measured(0, 20), z: measured(2000, 10) };
    const { pitchRad, yawRad } = tiltFromSpot(nowhere, spot, exactly({ x: 0, y: 0, z: 1 }));
    expect(yawRad.uncertainty).toBeCloseTo(0.005, 5);
    expect(pitchRad.uncertainty).toBeCloseTo(0.01, 4);
  });

  it('finds any tilt that camera.ts was given, whatever its roll', () => {
    const anyCamera = fc.record({
      position: fc.record({ x: figure(-600, 600), y: figure(-600, 600), z: figure(-50, 100) }),
      pitchRad: figure(-0.6, 0.6),
      yawRad: figure(-0.6, 0.6),
      rollRad: figure(-1.6, 1.6),
      hfovRad: figure(0.6, 1.6),
      mirrored: fc.boolean(),
      widthPx: fc.constant(1280),
      heightPx: fc.constant(720),
    });
    fc.assert(
      fc.property(anyCamera, figure(-400, 400), figure(-300, 300), figure(800, 4000), (camera: Camera, x, y, z) => {
        const spot = { x, y, z };
        const pixel = pixelOfPoint(camera, spot);
        fc.pre(pixel !== null && pixel.x > 0 && pixel.x < 1280 && pixel.y > 0 && pixel.y < 720);
        const untilted = { ...camera, position: { x: 0, y: 0, z: 0 }, pitchRad: 0, yawRad: 0 };
        const seen = eyeFromPixel(untilted, pixel!.x, pixel!.y, 1000);
        const { pitchRad, yawRad } = tiltFromSpot(exactly(camera.position), exactly(spot), exactly(seen));
        expect(pitchRad.value).toBeCloseTo(camera.pitchRad, 8);
        expect(yawRad.value).toBeCloseTo(camera.yawRad, 8);
      }),
    );
  });

  it('refuses a spot behind the camera', () => {
    expect(() => tiltFromSpot(nowhere, exactly({ x: 0, y: 0, z: -1 }), exactly({ x: 0, y: 0, z: 1 }))).toThrow('stand on it');
  });
});
