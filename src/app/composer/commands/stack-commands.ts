import { beginningOf } from '@oriel/shared/contracts/beginning-of';
import type { Layer, LayerImage } from '@oriel/shared/contracts/scenes';
import { placeTrimmed } from '@oriel/shared/projection/cover-glass';
import type { Change } from './change';

export const MOST_LAYERS = 64;

/** Adds an image as the foremost layer on the glass itself. */
export const addLayer =
  (id: string, name: string, image: LayerImage): Change =>
  (document) => {
    if (document.layers.length >= MOST_LAYERS) return document;
    const layer: Layer = {
      id,
      name: beginningOf(name.trim(), 120) || 'Layer',
      image,
      depthMm: 0,
      placed: placeTrimmed(document.glass, image),
      opacity: 1,
      shown: true,
    };
    return { ...document, layers: [...document.layers, layer] };
  };

/** A second layer of the same image, right before the first. */
export const duplicateLayer =
  (id: string, copyId: string): Change =>
  (document) => {
    const at = document.layers.findIndex((layer) => layer.id === id);
    if (at < 0 || document.layers.length >= MOST_LAYERS) return document;
    const original = document.layers[at];
    const copy = { ...original, id: copyId, name: `${beginningOf(original.name, 115)} copy` };
    return { ...document, layers: document.layers.toSpliced(at + 1, 0, copy) };
  };

export const removeLayer =
  (id: string): Change =>
  (document) =>
    document.layers.some((layer) => layer.id === id) ? { ...document, layers: document.layers.filter((layer) => layer.id !== id) } : document;

/** Moves a layer by `by` places in the ledger; the later stands before the earlier where depths are equal. */
export const reorderLayer =
  (id: string, by: number): Change =>
  (document) => {
    const from = document.layers.findIndex((layer) => layer.id === id);
    const to = Math.min(Math.max(from + by, 0), document.layers.length - 1);
    if (from < 0 || from === to) return document;
    const layers = document.layers.toSpliced(from, 1).toSpliced(to, 0, document.layers[from]);
    return { ...document, layers };
  };
