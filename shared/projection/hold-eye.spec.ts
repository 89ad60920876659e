import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bleedOver } from './bleed';
import { clearance } from './clearance';
import { clearRoom, eyeRoom } from './eye-room';
import { growToCover, scaleRectangle } from './grow-to-cover';
import { holdEye } from './hold-eye';
import { onGlassFrom, planeFromHome } from './home-plane';
import { livingRoom } from './living-room';
import { retarget } from './retarget';
import type { PlacedLayer, SceneGeometry } from './scene-geometry';
import { SIDE_AXIS, sideOf, sideOfGlass, SIDES } from './sides';
import { anyDepth, anyGlass, anyRectangle, anySetting, figure, share, within } from './testing/arbitraries';
import type { Point3, ViewingZone } from './types';

const held = (room: ReturnType<typeof eyeRoom>, eye: Point3) => {
  const out = { x: 0, y: 0, z: 1 };
  holdEye(room, eye, out);
  return out;
};

/** Anywhere a person or a fault of tracking may put an eye. */
const wildEye = fc.record({ x: figure(-20_000, 20_000), y: figure(-20_000, 20_000), z: figure(1, 50_000) });

/** A zone and a home eye within it. */
const homely = fc.tuple(anySetting, share, share, share).map(([setting, a, b, c]) => ({
  ...setting,
  homeEye: {
    x: within(setting.zone.leftMm, setting.zone.rightMm, a),
    y: within(setting.zone.lowestMm, setting.zone.highestMm, b),
    z: within(setting.zone.nearestMm, setting.zone.farthestMm, c),
  },
}));

/** By how much the worst edge of those layers that the bleed formula calls covered shows on the glass from an eye, mm. */
function shows({ glass, homeEye, layers }: SceneGeometry, covered: ViewingZone, eye: Point3): number {
  let worst = -Infinity;
  for (const layer of layers) {
    const bleed = bleedOver(covered, glass, homeEye, layer);
    const seen = onGlassFrom(planeFromHome(layer.placed, homeEye, layer.depthMm), eye, layer.depthMm);
    for (const side of SIDES) {
      if (!bleed[side].reaches || bleed[side].spareMm < 0) continue;
      worst = Math.max(worst, SIDE_AXIS[side].outward * (sideOfGlass(glass, side) - sideOf(seen, side)));
    }
  }
  return worst;
}

describe('holdEye', () => {
  it('lets no edge show that the bleed formula calls covered, wherever the viewer stands', () => {
    fc.assert(
      fc.property(anySetting, anyRectangle, anyDepth, wildEye, (setting, placed, depthMm, eye) => {
        const scene = { ...setting, layers: [{ placed, depthMm }] };
        expect(shows(scene, scene.zone, held(clearRoom(scene), eye))).toBeLessThan(1e-6);
      }),
      { numRuns: 2000 },
    );
  });

  it('so a scene whose layers are just large enough shows no edge on any glass, with the zone of any room beside its own', () => {
    let clear = 0;
    fc.assert(
      fc.property(homely, fc.array(anyDepth, { minLength: 1, maxLength: 5 }), anyGlass, anySetting, wildEye, (setting, depths, glass, { zone }, eye) => {
        const plain: PlacedLayer[] = depths.map((depthMm) => ({ placed: { xMm: 0, yMm: 0, ...setting.glass }, depthMm }));
        const factor = growToCover(plain, setting);
        const grown = plain.map((layer) => ({ ...layer, placed: scaleRectangle(layer.placed, factor) }));
        const scene = retarget({ ...setting, layers: grown }, glass);
        if (clearance(scene).length > 0) return;
        clear++;
        for (const room of [clearRoom(scene), clearRoom(scene, zone)]) expect(shows(scene, scene.zone, held(room, eye))).toBeLessThan(1e-6);
      }),
      { numRuns: 1000 },
    );
    expect(clear).toBeGreaterThan(300);
  });

  it('leaves an eye well inside the zone and the home eye exactly as they are', () => {
    fc.assert(
      fc.property(homely, fc.tuple(figure(0.25, 0.75), figure(0.25, 0.75), figure(0.25, 0.75)), ({ glass, homeEye, zone }, [a, b, c]) => {
        const room = eyeRoom(glass, homeEye, zone);
        const eye = {
          x: within(zone.leftMm, zone.rightMm, a),
          y: within(zone.lowestMm, zone.highestMm, b),
          z: within(zone.nearestMm, zone.farthestMm, c),
        };
        const seen = held(room, eye);
        for (const key of ['x', 'y', 'z'] as const) expect(seen[key]).toBeCloseTo(eye[key], 9);
        // Where two limits of the room meet in the home eye, the corner is rounded by a hundredth of the zone.
        const home = held(room, homeEye);
        expect(Math.abs(home.x - homeEye.x)).toBeLessThanOrEqual(0.01 * (zone.rightMm - zone.leftMm) + 1e-9);
        expect(Math.abs(home.y - homeEye.y)).toBeLessThanOrEqual(0.01 * (zone.highestMm - zone.lowestMm) + 1e-9);
        expect(home.z).toBeCloseTo(homeEye.z, 9);
      }),
    );
  });

  it('never jerks: along any straight walk speed changes by little from step to step and never exceeds the walker’s by more than the steepest sight line leans', () => {
    const { glass, homeEye, zone } = livingRoom('landscape');
    for (const factor of [0.25, 1]) {
      const scene = retarget({ glass, homeEye, zone, layers: [] }, { widthMm: glass.widthMm * factor, heightMm: glass.heightMm * factor });
      const room = eyeRoom(scene.glass, scene.homeEye, scene.zone);
      const stepMm = 1 * factor;
      const steepest = Math.max(...[room.left, room.right, room.bottom, room.top].map(({ otherSlope }) => -otherSlope));
      for (const [from, way] of [
        [{ x: -2000, y: 100, z: 700 }, { x: 1, y: 0, z: 0 }],
        [{ x: 300, y: -900, z: 900 }, { x: 0, y: 1, z: 0 }],
        [{ x: 900, y: 200, z: 300 }, { x: 0, y: 0, z: 1 }],
        [{ x: -1500, y: 500, z: 400 }, { x: 0.7, y: -0.2, z: 0.68 }],
      ]) {
        const places = Array.from({ length: 4000 }, (_, i) => held(room, { x: from.x + i * stepMm * way.x, y: from.y + i * stepMm * way.y, z: from.z + i * stepMm * way.z }));
        let fastest = 0;
        let sharpest = 0;
        for (let i = 2; i < places.length; i++) {
          const [a, b, c] = [places[i - 2], places[i - 1], places[i]];
          for (const key of ['x', 'y', 'z'] as const) {
            fastest = Math.max(fastest, Math.abs(c[key] - b[key]));
            sharpest = Math.max(sharpest, Math.abs(c[key] - 2 * b[key] + a[key]));
          }
        }
        expect(fastest).toBeLessThan(1.001 * Math.max(1, steepest) * stepMm);
        expect(sharpest).toBeLessThan(0.02 * stepMm);
      }
    }
  });

  it('works by hand: straight on from twice the farthest, and sideways at the nearest of a plain zone', () => {
    // Slopes through the right edge (300): least (300 - 200)/2000 = 0.05; through the left: (-300 - 200)/500 = -1. At 1000 mm: 250 and 700.
    const room = eyeRoom({ widthMm: 600, heightMm: 600 }, { x: 0, y: 0, z: 1000 }, { leftMm: -200, rightMm: 200, lowestMm: -200, highestMm: 200, nearestMm: 500, farthestMm: 2000 });
    expect(room.right).toMatchObject({ ownSlope: 0.05, otherSlope: -1, easeMm: 40, bluntMm: 4 });
    // The sides meet within half of 400 mm where 2 * (300 - 0.05 z) = 200.
    expect(room.farthestMm).toBe(4000);
    const far = held(room, { x: 0, y: 0, z: 8000 });
    expect(far.z).toBeGreaterThan(3999);
    expect(far.z).toBeLessThanOrEqual(4000);
    // Nearer than the zone they leave a quarter of its width from where -600 + 2 z = 100; straight on an eye stays as it is until it is eased there.
    expect(room).toMatchObject({ nearestMm: 350, nearEaseMm: 165 });
    expect(held(room, { x: 0, y: 0, z: 520 })).toEqual({ x: 0, y: 0, z: 520 });
    expect(held(room, { x: 0, y: 0, z: 10 }).z).toBeGreaterThanOrEqual(350);
    const aside = held(room, { x: 5000, y: 0, z: 1000 });
    expect(aside.x).toBeCloseTo((250 + 700 - Math.hypot(450, 8)) / 2, 6);
    expect(aside.z).toBe(1000);
    // Farther than the farthest the direction is kept.
    const slant = held(room, { x: 100, y: -50, z: 8000 });
    expect(slant.x / slant.z).toBeCloseTo(100 / 8000, 9);
    expect(slant.y / slant.z).toBeCloseTo(-50 / 8000, 9);
  });
});
