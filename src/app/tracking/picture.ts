import type { Region } from './region';

/** How the pixels beyond the edge of the frame are taken: the detectors were trained on black, the landmarks on the edge repeated. */
export type Beyond = 'black' | 'repeat';

/** A frame that can be looked at in square pieces. */
export interface Picture {
  readonly width: number;
  readonly height: number;
  /**
   * Samples a region as n x n pixels of red, green and blue, row by row, into `into` (length n * n * 3), with 0 to 255 carried to
   * `low` to 1. Enlarging is bilinear; reducing averages as many taps as needed, so that nothing aliases.
   */
  sample(region: Region, n: number, low: number, beyond: Beyond, into: Float32Array): void;
}

/** Taps along each side of one output pixel: a bilinear tap spans two source pixels, so one serves up to a reduction of 2.5. */
export const tapsFor = (reduction: number): number => (reduction < 2.5 ? 1 : Math.ceil(reduction / 2));
