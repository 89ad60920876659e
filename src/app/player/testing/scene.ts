import type { Layer, SceneDocument } from '@oriel/shared/contracts/scenes';
import type { WindowOnScreen } from '../window-on-screen';

/** A layer for tests, with what matters to them. */
export function testLayer(part: Partial<Layer> & { name: string }): Layer {
  return {
    id: `00000000-0000-4000-8000-${part.name.padStart(12, '0').slice(-12)}`,
    image: { id: '00000000-0000-4000-8000-000000000001', width: 3000, height: 2000, trim: { left: 0, top: 0, ofWidth: 3000, ofHeight: 2000 } },
    depthMm: 0,
    placed: { xMm: 0, yMm: 0, widthMm: 480, heightMm: 320 },
    opacity: 1,
    shown: true,
    ...part,
  };
}

/** A scene on a glass of 480 x 270 mm, seen from 600 mm. */
export function testScene(layers: Layer[]): SceneDocument {
  return {
    name: 'A test',
    glass: { widthMm: 480, heightMm: 270 },
    homeEye: { x: 0, y: 0, z: 600 },
    zone: { leftMm: -200, rightMm: 200, lowestMm: -100, highestMm: 100, nearestMm: 400, farthestMm: 1200 },
    layers,
  };
}

/** A screen of 1920 x 1080 px and 480 x 270 mm, wholly filled. */
export const fullArea: WindowOnScreen = { widthPx: 1920, heightPx: 1080, pxPerMm: 4, deviceRatio: 1, centreMm: { x: 0, y: 0 } };
