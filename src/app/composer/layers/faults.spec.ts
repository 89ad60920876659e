import { hideLayer, setDepth } from '../commands/layer-commands';
import { layerIds, someScene } from '../commands/testing';
import { depthColour } from './depth-colour';
import { statedFaults } from './faults';

describe('faults in words', () => {
  it('name the layer, the side, the shortness and the eye', () => {
    const far = setDepth(layerIds[0], 900)({ ...someScene, zone: { ...someScene.zone, leftMm: -900 } });
    const fault = statedFaults(far).find(({ words }) => words.startsWith('Sky, right edge'));
    // From 900 left, 1200 away: X = 600 + 1500 * 900/1200 = 1725 mm asked for; 660 * 2700/1800 = 990 mm there are: 735 short (computed).
    expect(fault).toEqual({ words: 'Sky, right edge: 735 mm short', from: 'from 900 mm left, 50 mm up, 1200 mm away', layerId: layerIds[0], shortMm: 735, eye: { x: -900, y: 50, z: 1200 } });
  });

  it('speak only of what is shown', () => {
    const alone = hideLayer(layerIds[1])(hideLayer(layerIds[2])(setDepth(layerIds[0], 0)(someScene)));
    expect(statedFaults(alone)).toEqual([]);
    expect(statedFaults(hideLayer(layerIds[0])(alone)).map(({ words }) => words)).toContain('Nothing covers the left side of the glass');
  });
});

describe('colours of depth', () => {
  const glass = { widthMm: 1000, heightMm: 500 };
  it('run from the near token to the farthest one', () => {
    expect(depthColour(-300, glass)).toBe('var(--near)');
    expect(depthColour(5000, glass)).toBe('var(--farthest)');
    expect(depthColour(550, glass)).toBe('color-mix(in oklab, var(--far) 50.0%, var(--middle))');
  });
});
