import { layerIds, someScene } from '@oriel/shared/contracts/testing/some-scene';
import { drawLayers } from '../layers/drawn-layer';
import { extentsOf } from './extents';
import { pick, type Holdable } from './picking';
import { drawnAt } from '../../drawing/placing';
import { layOutSheet } from './sheet-layout';

const { plan, section } = layOutSheet({ width: 1400, height: 950 }, extentsOf(someScene));
const things: Holdable = {
  eye: { x: 300, y: 100, z: 1500 },
  homeEye: someScene.homeEye,
  glass: someScene.glass,
  zone: someScene.zone,
  layers: drawLayers(someScene),
  selectedId: null,
};
const at = (frame: typeof plan, across: number, z: number, held = things) => pick(frame, drawnAt(frame, { across, z }), held, 9);

describe('taking hold in plan and section', () => {
  it('finds eyes, layers, the ends of the glass and the sides of the zone', () => {
    expect(at(plan, 300, 1500)).toEqual({ kind: 'eye' });
    expect(at(plan, 0, 1800)).toEqual({ kind: 'home' });
    expect(at(section, 100, 1500)).toEqual({ kind: 'eye' });
    expect(at(plan, -200, -900)).toEqual({ kind: 'layer', id: layerIds[0] });
    expect(at(section, 0, -300)).toEqual({ kind: 'layer', id: layerIds[1] });
    expect(at(plan, 600, 0)).toEqual({ kind: 'glass' });
    expect(at(plan, -300, 1200)).toEqual({ kind: 'zone', side: 'nearestMm' });
    expect(at(plan, -600, 2100)).toEqual({ kind: 'zone', side: 'leftMm' });
    expect(at(section, 300, 2000)).toEqual({ kind: 'zone', side: 'highestMm' });
    expect(at(section, -200, 2000)).toEqual({ kind: 'zone', side: 'lowestMm' });
    expect(at(plan, 0, 700)).toBeNull();
  });

  it('prefers the selected layer where two lie close', () => {
    const near = drawLayers({ ...someScene, layers: [...someScene.layers, { ...someScene.layers[1], id: 'close', depthMm: 320 }] });
    const between = (selectedId: string) => at(plan, 0, -310, { ...things, layers: near, selectedId });
    expect(between('close')).toEqual({ kind: 'layer', id: 'close' });
    expect(between(layerIds[1])).toEqual({ kind: 'layer', id: layerIds[1] });
  });
});
