import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fillBand } from './fill-band';
import { onGlassFrom, planeFromHome } from './home-plane';
import { project } from './layer-on-glass';
import { rangeOf, SIDE_AXIS, sideOfGlass, SIDES, type Side } from './sides';
import { anySetting, figure, share, within } from './testing/arbitraries';
import { shiftOverZone } from './zone-shift';
import type { SceneSetting } from './scene-geometry';
import type { Point3 } from './types';

const HOME = { x: 0, y: 0, z: 1000 };
const GLASS = { widthMm: 600, heightMm: 400 };
/** A zone at the home distance only. */
const FLAT = { leftMm: -400, rightMm: 600, lowestMm: 0, highestMm: 0, nearestMm: 1000, farthestMm: 1000 };

/** By rays: how far in from an edge facing `side`, seen on the glass at `at`, the back layer shows; as drawn from home. */
function seenBehind(
  side: Side,
  front: number,
  back: number,
  { homeEye }: SceneSetting,
  eye: Point3,
  at: number,
): number {
  const { axis, outward } = SIDE_AXIS[side];
  const flat = (z: number, figure: number) => ({ x: 0, y: 0, z, [axis]: figure });
  const carry = (from: Point3, onGlass: number, depth: number) => onGlass + ((onGlass - from[axis]) * depth) / from.z;
  const edge = carry(eye, at, front);
  const edgeFromHome = project(flat(-front, edge), homeEye)[axis];
  const hidden = project(flat(-back, carry(eye, at, back)), homeEye)[axis];
  return outward * (edgeFromHome - hidden);
}

describe('fillBand', () => {
  it('at the home distance is the relative shift of the two layers at the end of the zone', () => {
    const band = fillBand(200, 600, { glass: GLASS, homeEye: HOME, zone: FLAT });
    const [front, back] = [200, 600].map((depth) => shiftOverZone(depth, HOME, FLAT));
    // By hand: 600 * (600/1600 - 200/1200) = 125 and 400 * ... = 83.333. Going right uncovers what is behind the right edges.
    expect(band.right).toBeCloseTo(125, 9);
    expect(band.left).toBeCloseTo(83.333333, 6);
    expect(band.right).toBeCloseTo(Math.abs(back.right - front.right), 9);
    expect(band.left).toBeCloseTo(Math.abs(back.left - front.left), 9);
  });

  it('agrees with where the two rectangles are seen', () => {
    const placed = { xMm: 0, yMm: 0, widthMm: 100, heightMm: 100 };
    const eye = { x: 600, y: 0, z: 1000 };
    const centre = (depth: number) => onGlassFrom(planeFromHome(placed, HOME, depth), eye, depth).xMm;
    expect(fillBand(200, 600, { glass: GLASS, homeEye: HOME, zone: FLAT }).right).toBeCloseTo(
      centre(600) - centre(200),
      9,
    );
  });

  it('is nothing between layers of one depth', () => {
    expect(fillBand(300, 300, { glass: GLASS, homeEye: HOME, zone: FLAT })).toEqual({
      left: 0,
      right: 0,
      bottom: 0,
      top: 0,
    });
  });

  it('covers every sampled eye of the zone and point of the glass, and is tight at one', () => {
    const samples = fc.array(fc.tuple(share, share, share), { minLength: 20, maxLength: 20 });
    fc.assert(
      fc.property(anySetting, figure(-80, 3000), figure(0, 3000), samples, (setting, front, further, chosen) => {
        const back = front + further;
        const band = fillBand(front, back, setting);
        const { zone, glass } = setting;
        for (const side of SIDES) {
          const { axis } = SIDE_AXIS[side];
          const { low, high } = rangeOf(zone, axis);
          const half = Math.abs(sideOfGlass(glass, side));
          const at = (s: number, t: number, u: number) =>
            seenBehind(
              side,
              front,
              back,
              setting,
              { x: 0, y: 0, [axis]: within(low, high, s), z: within(zone.nearestMm, zone.farthestMm, t) },
              within(-half, half, u),
            );
          for (const [s, t, u] of chosen) expect(at(s, t, u)).toBeLessThanOrEqual(band[side] + 1e-6);
          const corners = [0, 1].flatMap((s) => [0, 1].flatMap((t) => [0, 1].map((u) => at(s, t, u))));
          expect(band[side]).toBeCloseTo(Math.max(0, ...corners), 5);
        }
      }),
    );
  });

  it('names a back layer that stands in front', () => {
    expect(() => fillBand(300, 200, { glass: GLASS, homeEye: HOME, zone: FLAT })).toThrowError(
      expect.objectContaining({ name: 'GeometryError', value: 'backDepthMm' }),
    );
  });
});
