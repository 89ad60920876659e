import { layerScale } from '@oriel/shared/projection/layer-on-glass';
import { sharpEdge } from './picture-edge';
import { type PlacedOnStage, placeLayer } from './place-layer';
import { sceneOnScreen } from './scene-on-screen';
import { fullArea, testLayer, testScene } from './testing/scene';

describe('sceneOnScreen', () => {
  it('paints the farthest first; of equal depths the later in the ledger stands before the earlier; what is not shown is left out', () => {
    const layers = [
      testLayer({ name: 'near', depthMm: -50 }),
      testLayer({ name: 'first', depthMm: 100 }),
      testLayer({ name: 'far', depthMm: 900 }),
      testLayer({ name: 'second', depthMm: 100 }),
      testLayer({ name: 'hidden', depthMm: 50, shown: false }),
      testLayer({ name: 'clear', depthMm: 60, opacity: 0 }),
    ];
    expect(sceneOnScreen(testScene(layers), fullArea).layers.map(({ name }) => name)).toEqual(['far', 'first', 'second', 'near']);
  });

  it('fills the middle of a window of another shape, and scales depths with the glass', () => {
    const scene = sceneOnScreen(testScene([testLayer({ name: 'a', depthMm: 300 })]), { ...fullArea, widthPx: 1000, heightPx: 801, centreMm: { x: 20, y: -10 } });
    expect(scene.stage).toMatchObject({ widthPx: 1000, heightPx: 562, leftPx: 0, topPx: 119 });
    expect(scene.layers[0].depthMm).toBeCloseTo((300 * 1000) / 1920, 9);
    expect(scene.homeEye.z).toBeCloseTo((600 * 1000) / 1920, 9);
    // 562.5 px are covered, of which 562 are whole; their middle is half a px above the window's: 119 + 562/2 against 801/2.
    expect(scene.stage.centreMm.x).toBeCloseTo(20, 9);
    expect(scene.stage.centreMm.y).toBeCloseTo(-10 + 0.5 / 4, 9);
  });

  it('keeps the eye a hand’s breadth away from the foremost layer', () => {
    expect(sceneOnScreen(testScene([testLayer({ name: 'a', depthMm: -250 })]), fullArea).nearestEyeMm).toBe(350);
  });
});

describe('placeLayer', () => {
  const out: PlacedOnStage = { leftPx: 0, topPx: 0, widthPx: 0, heightPx: 0 };

  it('draws a layer as composed when seen from the home eye, whatever its depth', () => {
    for (const depthMm of [-120, 0, 100, 5000]) {
      const { stage, layers, homeEye } = sceneOnScreen(testScene([testLayer({ name: 'a', depthMm })]), fullArea);
      placeLayer(layers[0], homeEye, stage, out);
      expect(out.leftPx).toBeCloseTo(0, 9);
      expect(out.topPx).toBeCloseTo((1080 - 1280) / 2, 9);
      expect(out.widthPx).toBeCloseTo(1920, 9);
    }
  });

  it('shifts a layer 100 mm behind by 14.285714 mm for an eye 100 mm to the right at 600 mm (checks of projection, computed)', () => {
    const { stage, layers } = sceneOnScreen(testScene([testLayer({ name: 'a', depthMm: 100 })]), fullArea);
    placeLayer(layers[0], { x: 100, y: 0, z: 600 }, stage, out);
    expect(out.leftPx).toBeCloseTo(14.285714 * 4, 4);
  });
});

describe('sharpEdge', () => {
  const edgeFor = (depthMm: number, deviceRatio = 1) =>
    sharpEdge(sceneOnScreen(testScene([testLayer({ name: 'a', depthMm })]), { ...fullArea, deviceRatio }).layers[0]);

  it('takes the smallest picture that is as fine as the layer is ever seen', () => {
    const plane = 480 / layerScale({ x: 0, y: 0, z: 600 }, 600);
    expect(plane * layerScale({ x: 0, y: 0, z: 1200 }, 600) * 4).toBeCloseTo(2560, 9);
    expect(edgeFor(600)).toBe(3200);
    expect(edgeFor(0)).toBe(3200);
    expect(sharpEdge(sceneOnScreen(testScene([testLayer({ name: 'a', placed: { xMm: 0, yMm: 0, widthMm: 200, heightMm: 100 } })]), fullArea).layers[0])).toBe(800);
  });

  it('never asks for more than the image has', () => {
    const image = { id: '00000000-0000-4000-8000-000000000001', width: 500, height: 300, trim: { left: 0, top: 0, ofWidth: 500, ofHeight: 300 } };
    expect(sharpEdge(sceneOnScreen(testScene([testLayer({ name: 'a', image })]), { ...fullArea, deviceRatio: 3 }).layers[0])).toBe(800);
  });

  it('never asks for more than the renderer can hold', () => {
    expect(sharpEdge(sceneOnScreen(testScene([testLayer({ name: 'a' })]), fullArea).layers[0], 2048)).toBe(1600);
  });
});
