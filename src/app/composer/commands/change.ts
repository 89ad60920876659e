import type { Layer, SceneDocument } from '@oriel/shared/contracts/scenes';

/** A command: a scene into the scene after it. Pure, so that undoing is keeping the scene before. */
export type Change = (document: SceneDocument) => SceneDocument;

/** The scene with one layer changed; the same scene where there is no such layer. */
export function changeLayer(document: SceneDocument, id: string, change: (layer: Layer) => Layer): SceneDocument {
  if (!document.layers.some((layer) => layer.id === id)) return document;
  return { ...document, layers: document.layers.map((layer) => (layer.id === id ? change(layer) : layer)) };
}
