/** Bits of the frame's number drawn as blocks along the lower left edge, lowest first; one more block holds their parity. */
export const NUMBER_BITS = 12;
export const BLOCK_PX = 16;

const MIDDLE_GREY = 128;

/**
 * Reads the number a frame carries: light and dark blocks of 16 x 16 pixels from the lower left corner, twelve bits and their parity.
 * Null where the parity does not agree, as in a video without numbers.
 */
export function readFrameNumber(luma: Uint8Array, stride: number, height: number): number | null {
  const y = height - BLOCK_PX / 2;
  const bit = (block: number): number => (luma[y * stride + block * BLOCK_PX + BLOCK_PX / 2] > MIDDLE_GREY ? 1 : 0);
  let number = 0;
  let parity = 0;
  for (let k = 0; k < NUMBER_BITS; k++) {
    number |= bit(k) << k;
    parity ^= bit(k);
  }
  return bit(NUMBER_BITS) === parity ? number : null;
}
