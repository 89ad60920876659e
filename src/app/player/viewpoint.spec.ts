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
    expect(eye.x).toBeCloseTo(200, 0);
    expect(eye.y).toBeCloseTo(100, 0);
  });

  it('lets the hand win over a face, and the face take over again when the hand rests', () => {
    const viewpoint = new Viewpoint(scene, true);
    const face = (tMs: number) => viewpoint.face({ x: 130, y: -20, z: 600 }, tMs - 50);
    run(viewpoint, 0, 2000, true, face);
    viewpoint.point(0, 0.5, 2000);
    expect(run(viewpoint, 2000, 4000, true, face).x).toBeCloseTo(-200, 0);
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
    expect(run(viewpoint, 0, 4000, true, (tMs) => viewpoint.face({ x: 0, y: 0, z: 120 }, tMs - 50)).z).toBe(350);
  });
});
