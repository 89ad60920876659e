import { layerIds, someScene, withLayer } from '@oriel/shared/contracts/testing/some-scene';
import { statedFaults } from './stated-faults';

describe('faults in words', () => {
  it('name the layer, the side, the shortness and the eye', () => {
    const far = { ...someScene, zone: { ...someScene.zone, leftMm: -900 } };
    const fault = statedFaults(far).find(({ words }) => words.startsWith('Sky, right edge'));
    // From 900 left, 1200 away: X = 600 + 1500 * 900/1200 = 1725 mm asked for; 660 * 2700/1800 = 990 mm there are: 735 short (computed).
    expect(fault).toEqual({ words: 'Sky, right edge: 735 mm short', from: 'from 900 mm left, 50 mm up, 1200 mm away', layerId: layerIds[0], shortMm: 735, eye: { x: -900, y: 50, z: 1200 } });
  });

  it('speak only of what is shown', () => {
    const hidden = layerIds.slice(1).reduce((scene, id) => withLayer(scene, id, { shown: false }), someScene);
    const alone = withLayer(hidden, layerIds[0], { depthMm: 0 });
    expect(statedFaults(alone)).toEqual([]);
    expect(statedFaults(withLayer(alone, layerIds[0], { shown: false })).map(({ words }) => words)).toContain('Nothing covers the left side of the glass');
  });
});
