import { beginningOf } from '@oriel/shared/contracts/beginning-of';
import type { SceneDocument } from '@oriel/shared/contracts/scenes';
import { type Change, changeLayer } from './change';
import { clamp, depthLimits, positionLimits, sizeLimits } from './limits';

/** Moves a layer in depth. Where it is placed on the glass stays, so the picture from the home eye does not change. */
export const setDepth =
  (id: string, depthMm: number): Change =>
  (document) =>
    changeLayer(document, id, (layer) => ({ ...layer, depthMm: clamp(depthMm, depthLimits(document)) }));

/** Puts a layer's centre at a place on the glass, mm, as the home eye sees it. */
export const place =
  (id: string, xMm: number, yMm: number): Change =>
  (document) =>
    changeLayer(document, id, (layer) => ({
      ...layer,
      placed: { ...layer.placed, xMm: clamp(xMm, positionLimits), yMm: clamp(yMm, positionLimits) },
    }));

/** Sizes a layer about its centre to a width on the glass, mm; its shape is kept. */
export const setWidth =
  (id: string, widthMm: number): Change =>
  (document) =>
    changeLayer(document, id, (layer) => {
      const { placed } = layer;
      const longest = Math.max(placed.widthMm, placed.heightMm) / placed.widthMm;
      const shortest = Math.min(placed.widthMm, placed.heightMm) / placed.widthMm;
      const width = clamp(widthMm, { least: sizeLimits.least / shortest, most: sizeLimits.most / longest });
      return { ...layer, placed: { ...placed, widthMm: width, heightMm: (placed.heightMm * width) / placed.widthMm } };
    });

export const renameLayer =
  (id: string, name: string): Change =>
  (document) =>
    name.trim() === '' ? document : changeLayer(document, id, (layer) => ({ ...layer, name: beginningOf(name.trim(), 120) }));

/** Opacity from 0 to 1. */
export const setOpacity =
  (id: string, opacity: number): Change =>
  (document) =>
    changeLayer(document, id, (layer) => ({ ...layer, opacity: clamp(opacity, { least: 0, most: 1 }) }));

export const showLayer = (id: string): Change => withShown(id, true);
export const hideLayer = (id: string): Change => withShown(id, false);

const withShown =
  (id: string, shown: boolean): Change =>
  (document: SceneDocument) =>
    changeLayer(document, id, (layer) => ({ ...layer, shown }));
