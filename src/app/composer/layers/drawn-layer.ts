import type { Layer, SceneDocument } from '@oriel/shared/contracts/scenes';
import { type Bleed, bleedOver } from '@oriel/shared/projection/bleed';
import { onGlassFrom, planeFromHome } from '@oriel/shared/projection/home-plane';
import { layerScale } from '@oriel/shared/projection/layer-on-glass';
import type { Point3, Rectangle } from '@oriel/shared/projection/types';
import { depthColour } from './depth-colour';

/** A layer with all that the sheet and the ledger show of it. */
export interface DrawnLayer {
  readonly layer: Layer;
  /** Its place in the document. */
  readonly index: number;
  /** Its rectangle in its own plane, mm; null where it stands too near an eye to have one. */
  readonly plane: Rectangle | null;
  readonly bleed: Bleed | null;
  readonly colour: string;
  /** Painting order: the farthest first, and the later of two at one depth after the earlier. */
  readonly order: number;
}

/** The layers of a scene, in the document's order. */
export function drawLayers({ layers, glass, homeEye, zone }: SceneDocument): DrawnLayer[] {
  const painted = layers.map((_, index) => index).sort((a, b) => layers[b].depthMm - layers[a].depthMm || a - b);
  const nearestMm = Math.min(homeEye.z, zone.nearestMm);
  return layers.map((layer, index) => {
    const inView = nearestMm + layer.depthMm > 0;
    return {
      layer,
      index,
      plane: inView ? planeFromHome(layer.placed, homeEye, layer.depthMm) : null,
      bleed: inView ? bleedOver(zone, glass, homeEye, layer) : null,
      colour: depthColour(layer.depthMm, glass),
      order: painted.indexOf(index),
    };
  });
}

/** Where a layer is seen on the glass from an eye, mm; null where the eye is not before it. */
export function seenFrom({ plane, layer }: DrawnLayer, eye: Point3): Rectangle | null {
  return plane && eye.z + layer.depthMm > 0 ? onGlassFrom(plane, eye, layer.depthMm) : null;
}

/** How far `placed` must move for the layer to move by one mm on the glass as this eye sees it. */
export function placedPerSeen({ layer }: DrawnLayer, eye: Point3, homeEye: Point3): number {
  return layerScale(homeEye, layer.depthMm) / layerScale(eye, layer.depthMm);
}
