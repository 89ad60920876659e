import type { Layer, SceneDocument } from '../scenes';

/** A layer of a picture 1600 x 900 px that covers a glass of 1200 x 675 mm with a tenth to spare. */
export function someLayer(more: Partial<Layer> & { id: string }): Layer {
  return {
    name: 'Meadow',
    image: { id: more.id, width: 1600, height: 900, trim: { left: 0, top: 0, ofWidth: 1600, ofHeight: 900 } },
    depthMm: 0,
    placed: { xMm: 0, yMm: 0, widthMm: 1320, heightMm: 742.5 },
    opacity: 1,
    shown: true,
    ...more,
  };
}

export const layerIds = ['11111111-1111-4111-8111-111111111111', '22222222-2222-4222-8222-222222222222', '33333333-3333-4333-8333-333333333333'] as const;

/** A scene of three layers in a living room. */
export const someScene: SceneDocument = {
  name: 'October on the ridge',
  glass: { widthMm: 1200, heightMm: 675 },
  homeEye: { x: 0, y: 0, z: 1800 },
  zone: { leftMm: -600, rightMm: 600, lowestMm: -200, highestMm: 300, nearestMm: 1200, farthestMm: 2400 },
  layers: [
    someLayer({ id: layerIds[0], name: 'Sky', depthMm: 900 }),
    someLayer({ id: layerIds[1], name: 'Larches', depthMm: 300 }),
    someLayer({ id: layerIds[2], name: 'Meadow', depthMm: -60, placed: { xMm: 0, yMm: -200, widthMm: 1320, heightMm: 300 } }),
  ],
};

/** A scene with one of its layers changed. */
export const withLayer = (scene: SceneDocument, id: string, change: Partial<Layer>): SceneDocument => ({
  ...scene,
  layers: scene.layers.map((layer) => (layer.id === id ? { ...layer, ...change } : layer)),
});
