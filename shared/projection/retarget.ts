import { scaleRectangle } from './grow-to-cover';
import { requireGlass } from './requirements';
import type { PlacedLayer, SceneGeometry } from './scene-geometry';
import type { Glass, Point3, ViewingZone } from './types';

/**
 * Shapes that differ by less are one: a screen's sides are told in whole mm, and a dark line along an edge is seen where a sliver of the picture
 * that is cut off is not. Practice.
 */
const SAME_SHAPE = 0.005;

/** A scene carried to another glass: the factor, and the fitted glass, which is the part of the other glass it fills. */
export interface Retargeted<L extends PlacedLayer = PlacedLayer> {
  readonly factor: number;
  readonly glass: Glass;
  readonly homeEye: Point3;
  readonly zone: ViewingZone;
  readonly layers: L[];
}

/**
 * A scene on another screen: glass, home eye, zone, layers and depths all scaled by one factor, which leaves every angle
 * and so the whole appearance as it was. The factor is that of the largest glass of the scene's own shape that fits
 * within the other one: the ratio of widths where the shapes agree ("scales with the width of the glass"), and of heights
 * where the other glass is the wider in shape. What remains of the other glass is outside the scene and is left dark. Shapes that differ by
 * less than half a per cent agree: the scene then covers the other glass, and reaches so little past two of its edges.
 * Other properties of the layers are kept.
 */
export function retarget<L extends PlacedLayer>(
  scene: Omit<SceneGeometry, 'layers'> & { readonly layers: readonly L[] },
  otherGlass: Glass,
): Retargeted<L> {
  requireGlass(scene.glass);
  requireGlass(otherGlass);
  const { glass, homeEye, zone } = scene;
  const [less, more] = [otherGlass.widthMm / glass.widthMm, otherGlass.heightMm / glass.heightMm].sort((a, b) => a - b);
  const factor = more / less - 1 < SAME_SHAPE ? more : less;
  return {
    factor,
    glass: { widthMm: glass.widthMm * factor, heightMm: glass.heightMm * factor },
    homeEye: { x: homeEye.x * factor, y: homeEye.y * factor, z: homeEye.z * factor },
    zone: scaleZone(zone, factor),
    layers: scene.layers.map((layer) => ({
      ...layer,
      placed: scaleRectangle(layer.placed, factor),
      depthMm: layer.depthMm * factor,
    })),
  };
}

/** A viewing zone scaled about the centre of the glass. */
export const scaleZone = (zone: ViewingZone, factor: number): ViewingZone => ({
  leftMm: zone.leftMm * factor,
  rightMm: zone.rightMm * factor,
  lowestMm: zone.lowestMm * factor,
  highestMm: zone.highestMm * factor,
  nearestMm: zone.nearestMm * factor,
  farthestMm: zone.farthestMm * factor,
});
