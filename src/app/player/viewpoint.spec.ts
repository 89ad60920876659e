import { type PlacedOnStage, placeLayer } from './place-layer';
import { sceneOnScreen } from './scene-on-screen';
import { fullArea, testLayer, testScene } from './testing/scene';
import { Viewpoint } from './viewpoint';

const scene = sceneOnScreen(testScene([testLayer({ name: 'a', depthMm: 100 })]), { ...fullArea, centreMm: { x: 30, y: -20 } });
const frameMs = 1000 / 60;

/** Runs frames up to `untilMs`, with what happens before each. */
function run(viewpoint: Viewpoint, fromMs: number, untilMs: number, faceExpected: boolean, before: (tMs: number) => void = () => undefined) {
  const out = { x: 0, y: 0, z: 1 };
  for (let tMs = fromMs; tMs < untilMs; tMs += frameMs) {
    before(tMs);
    viewpoint.at(tMs, faceExpected, out);
  }
  return out;
}

describe('Viewpoint', () => {
  it('comes to a face and stays with it, reckoned from the middle of the stage', () => {
    const viewpoint = new Viewpoint(scene, true);
    const eye = run(viewpoint, 0, 3000, true, (tMs) => viewpoint.face({ x: 130, y: 30, z: 800 }, tMs - 50));
    expect(eye.x).toBeCloseTo(100, 1);
    expect(eye.y).toBeCloseTo(50, 1);
    expect(eye.z).toBeCloseTo(800, 0);
  });

  it('stays home while nobody is there and less motion is asked for, and drifts calmly otherwise', () => {
    expect(run(new Viewpoint(scene, true), 0, 6000, true)).toEqual({ x: 0, y: 0, z: 600 });
    const drifting = run(new Viewpoint(scene, false), 0, 6000, true);
    expect(Math.abs(drifting.x)).toBeGreaterThan(1);
    expect(Math.abs(drifting.x)).toBeLessThan(100);
  });

  it('follows the hand to where it points in the viewing zone, and holds there when no face is expected', () => {
    const viewpoint = new Viewpoint(scene, true);
    run(viewpoint, 0, 100, false);
    viewpoint.point(1, 0, 100);
    const eye = run(viewpoint, 100, 20_000, false);
    expect(viewpoint.byHand).toBe(true);
    // Within the last tenth of the zone it is eased to a stop.
    expect(eye.x).toBeGreaterThan(190);
    expect(eye.y).toBeGreaterThan(95);
  });

  it('lets the hand win over a face, and the face take over again when the hand rests', () => {
    const viewpoint = new Viewpoint(scene, true);
    const face = (tMs: number) => viewpoint.face({ x: 130, y: -20, z: 600 }, tMs - 50);
    run(viewpoint, 0, 2000, true, face);
    viewpoint.point(0, 0.5, 2000);
    expect(run(viewpoint, 2000, 4000, true, face).x).toBeLessThan(-190);
    expect(run(viewpoint, 4000, 9000, true, face).x).toBeCloseTo(100, 0);
    expect(viewpoint.byHand).toBe(false);
  });

  it.each([
    ['ArrowLeft', 'x', -25],
    ['ArrowRight', 'x', 25],
    ['ArrowUp', 'y', 12.5],
    ['ArrowDown', 'y', -12.5],
    ['-', 'z', 37.5],
  ] as const)('%s moves the eye along %s', (key, axis, mm) => {
    const viewpoint = new Viewpoint(scene, true);
    run(viewpoint, 0, 100, false);
    expect(viewpoint.press(key, 100)).toBe(true);
    expect(run(viewpoint, 100, 4000, false)[axis] - scene.homeEye[axis]).toBeCloseTo(mm, 0);
  });

  it('leaves other keys alone and ignores eyes that cannot be', () => {
    const viewpoint = new Viewpoint(scene, true);
    expect(viewpoint.press('a', 0)).toBe(false);
    viewpoint.face({ x: NaN, y: 0, z: 600 }, 1);
    viewpoint.face({ x: 0, y: 0, z: -5 }, 2);
    expect(run(viewpoint, 10, 1000, true)).toEqual({ x: 0, y: 0, z: 600 });
  });

  it('never brings the eye nearer than a hand’s breadth to a layer in front of the glass', () => {
    const near = sceneOnScreen(testScene([testLayer({ name: 'a', depthMm: -250 })]), fullArea);
    const viewpoint = new Viewpoint(near, true);
    expect(run(viewpoint, 0, 4000, true, (tMs) => viewpoint.face({ x: 0, y: 0, z: 120 }, tMs - 50)).z).toBeGreaterThanOrEqual(350);
  });

  it('holds a viewer outside the zone to where the scene is clear, and never goes past it', () => {
    const glass = { widthMm: 480, heightMm: 270 };
    const tight = testLayer({ name: 'a', depthMm: 400, placed: { xMm: 0, yMm: 0, widthMm: 0, heightMm: 0 } });
    // Just enough bleed, by the formula of the required extent: 240 + (240 + 200) * 400/400 and 135 + (135 + 100) * 400/400, seen at home at 600/1000.
    const scene = sceneOnScreen(testScene([{ ...tight, placed: { xMm: 0, yMm: 0, widthMm: 2 * 680 * 0.6, heightMm: 2 * 370 * 0.6 } }]), fullArea);
    const out: PlacedOnStage = { leftPx: 0, topPx: 0, widthPx: 0, heightPx: 0 };
    for (const seen of [{ x: 3000, y: -900, z: 500 }, { x: -3000, y: 900, z: 4000 }, { x: 0, y: 0, z: 90 }]) {
      const viewpoint = new Viewpoint(scene, true);
      const eye = run(viewpoint, 0, 4000, true, (tMs) => viewpoint.face(seen, tMs - 50));
      placeLayer(scene.layers[0], eye, scene.stage, out);
      expect(out.leftPx).toBeLessThanOrEqual(0);
      expect(out.topPx).toBeLessThanOrEqual(0);
      expect(out.leftPx + out.widthPx).toBeGreaterThanOrEqual(glass.widthMm * 4);
      expect(out.topPx + out.heightPx).toBeGreaterThanOrEqual(glass.heightMm * 4);
    }
  });
});
