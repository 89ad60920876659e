import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { project } from './layer-on-glass';
import { requiredExtent } from './required-extent';
import { SIDE_AXIS, sideOfGlass, SIDES } from './sides';
import { anyDepth, anyGlass, anyZone, share, within } from './testing/arbitraries';

const GLASS = { widthMm: 600, heightMm: 400 };
const ZONE = { leftMm: -500, rightMm: 700, lowestMm: -100, highestMm: 250, nearestMm: 500, farthestMm: 2000 };

describe('requiredExtent', () => {
  it('behind the glass asks from the opposite end, nearest (worked by hand, d = 250)', () => {
    const { left, right, bottom, top } = requiredExtent(250, GLASS, ZONE);
    expect(right).toEqual({ atMm: 700, eye: { x: -500, y: 75, z: 500 } });
    expect(left).toEqual({ atMm: -800, eye: { x: 700, y: 75, z: 500 } });
    expect(top).toEqual({ atMm: 350, eye: { x: 100, y: -100, z: 500 } });
    expect(bottom).toEqual({ atMm: -425, eye: { x: 100, y: 250, z: 500 } });
  });

  it('behind the glass asks from the farthest eye where the whole zone lies beyond the edge', () => {
    const beyond = { ...ZONE, leftMm: 400, rightMm: 700 };
    expect(requiredExtent(250, GLASS, beyond).right).toEqual({ atMm: 287.5, eye: { x: 400, y: 75, z: 2000 } });
  });

  it('in front of the glass asks from the edge’s own end: nearest where that end is beyond the edge, else farthest', () => {
    const { right, top } = requiredExtent(-100, GLASS, ZONE);
    expect(right).toEqual({ atMm: 380, eye: { x: 700, y: 75, z: 500 } });
    expect(top).toEqual({ atMm: 210, eye: { x: 100, y: 250, z: 500 } });
    const inside = { ...ZONE, rightMm: 200, highestMm: 100 };
    expect(requiredExtent(-100, GLASS, inside).right).toEqual({ atMm: 295, eye: { x: 200, y: 0, z: 2000 } });
  });

  it('on the glass asks for the glass', () => {
    const { left, right, bottom, top } = requiredExtent(0, GLASS, ZONE);
    expect([left.atMm, right.atMm, bottom.atMm, top.atMm]).toEqual([-300, 300, -200, 200]);
  });

  it('covers every sampled eye of the zone, and is tight at the eye it names', () => {
    fc.assert(
      fc.property(
        anyDepth,
        anyGlass,
        anyZone,
        fc.array(fc.tuple(share, share, share), { minLength: 20, maxLength: 20 }),
        (depthMm, glass, zone, samples) => {
          const required = requiredExtent(depthMm, glass, zone);
          for (const side of SIDES) {
            const { axis, outward } = SIDE_AXIS[side];
            const edge = sideOfGlass(glass, side);
            const seenAt = (eye: { x: number; y: number; z: number }) =>
              outward * project({ x: 0, y: 0, z: -depthMm, [axis]: required[side].atMm }, eye)[axis];
            for (const [s, t, u] of samples) {
              const eye = {
                x: within(zone.leftMm, zone.rightMm, s),
                y: within(zone.lowestMm, zone.highestMm, t),
                z: within(zone.nearestMm, zone.farthestMm, u),
              };
              expect(seenAt(eye)).toBeGreaterThanOrEqual(outward * edge - 1e-6);
            }
            expect(seenAt(required[side].eye)).toBeCloseTo(outward * edge, 6);
          }
        },
      ),
    );
  });

  it('takes its extreme at a corner of the box: no grid point of the zone asks for more, for depths behind and in front', () => {
    for (const depthMm of [-300, -50, 80, 4000]) {
      for (const zone of [
        ZONE,
        { ...ZONE, leftMm: 350, rightMm: 900, lowestMm: 210, highestMm: 400 },
        { ...ZONE, leftMm: -900, rightMm: -310 },
      ]) {
        const required = requiredExtent(depthMm, GLASS, zone);
        let most = -Infinity;
        for (let i = 0; i <= 20; i++) {
          for (let k = 0; k <= 20; k++) {
            const e = within(zone.leftMm, zone.rightMm, i / 20);
            const ez = within(zone.nearestMm, zone.farthestMm, k / 20);
            most = Math.max(most, 300 + ((300 - e) * depthMm) / ez);
          }
        }
        expect(required.right.atMm).toBeCloseTo(most, 9);
      }
    }
  });

  it('names a layer that an eye of the zone is not in front of', () => {
    expect(() => requiredExtent(-500, GLASS, ZONE)).toThrowError(
      expect.objectContaining({ name: 'GeometryError', value: 'depthMm' }),
    );
  });
});
