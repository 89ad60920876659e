import { type DerivativeEdge, derivativeEdges } from '@oriel/shared/contracts/photos';
import type { LayerOnScreen } from './scene-on-screen';

/** The first picture of every layer: small, so that something is there at once. */
export const firstEdge: DerivativeEdge = derivativeEdges[0];

/**
 * The smallest derivative that is as fine as this screen can show the layer from anywhere in the viewing zone, or as the image itself is;
 * `greatestPx` is the largest the renderer can hold.
 */
export function sharpEdge(layer: LayerOnScreen, greatestPx = Infinity): DerivativeEdge {
  const own = Math.max(layer.image.width, layer.image.height);
  const wanted = Math.min(layer.largestPx, own);
  const held = derivativeEdges.filter((edge) => edge <= greatestPx);
  return held.find((edge) => edge >= wanted) ?? held.at(-1) ?? firstEdge;
}

/** What a derivative takes up decoded, by its width and height in px. */
export function decodedBytes(layer: LayerOnScreen, edge: DerivativeEdge, bytesOf: (widthPx: number, heightPx: number) => number): number {
  const { width, height } = layer.image;
  const share = Math.min(1, edge / Math.max(width, height));
  return bytesOf(Math.round(width * share), Math.round(height * share));
}
