import { type LayerOnGlass, layerOnGlass } from '@oriel/shared/projection/layer-on-glass';
import type { Point3 } from '@oriel/shared/projection/types';
import type { LayerOnScreen, Stage } from './scene-on-screen';

/** Where a layer is drawn: px from the upper left corner of the stage, y downward. */
export interface PlacedOnStage {
  leftPx: number;
  topPx: number;
  widthPx: number;
  heightPx: number;
}

const onGlass: LayerOnGlass = { scale: 1, x: 0, y: 0 };

/** Where an eye sees a layer, written into `out`. Allocates nothing: made for the render loop. */
export function placeLayer(layer: LayerOnScreen, eye: Point3, stage: Stage, out: PlacedOnStage): void {
  layerOnGlass(eye, layer.depthMm, onGlass);
  const { plane } = layer;
  const { pxPerMm } = stage;
  out.widthPx = plane.widthMm * onGlass.scale * pxPerMm;
  out.heightPx = plane.heightMm * onGlass.scale * pxPerMm;
  out.leftPx = stage.widthPx / 2 + (plane.xMm * onGlass.scale + onGlass.x) * pxPerMm - out.widthPx / 2;
  out.topPx = stage.heightPx / 2 - (plane.yMm * onGlass.scale + onGlass.y) * pxPerMm - out.heightPx / 2;
}
