import { type DerivativeEdge, derivativeEdges } from '@oriel/shared/contracts/photos';

/** Every object is named after the SHA-256 of the uploaded file it is or comes from: the same content is kept once. */
export const originalKey = (sha256: string) => `originals/${sha256}`;
export const derivativeKey = (sha256: string, edge: DerivativeEdge) => `derivatives/${sha256}/${edge}.webp`;
export const layerKey = (sha256: string, edge: DerivativeEdge) => `layers/${sha256}/${edge}.webp`;

/**
 * Long edges to make for a picture of this size, px: pictures are never enlarged, so the last one made, of the first edge
 * that holds the whole picture, stands for all larger ones.
 */
export function edgesFor(width: number, height: number): readonly DerivativeEdge[] {
  const whole = derivativeEdges.findIndex((edge) => edge >= Math.max(width, height));
  return whole < 0 ? derivativeEdges : derivativeEdges.slice(0, whole + 1);
}

/** The edge under which the answer to a request for `asked` is kept. */
export function edgeKept(width: number, height: number, asked: DerivativeEdge): DerivativeEdge {
  const made = edgesFor(width, height);
  return made.includes(asked) ? asked : made[made.length - 1];
}

export const allKeys = (sha256: string): string[] => [
  originalKey(sha256),
  ...derivativeEdges.flatMap((edge) => [derivativeKey(sha256, edge), layerKey(sha256, edge)]),
];
