/*
 * Maximal-length sequences from a linear feedback shift register (S. Golomb, Shift Register Sequences, 1967; memory). With n stages and a
 * primitive polynomial the sequence has period N = 2^n - 1, one more 1 than 0s in a period, and, taken as +1 and -1, the circular
 * autocorrelation N at no shift and -1 at every other: whatever is seen of it has one place in time and no other.
 */

/** Exponents besides 0 of a primitive polynomial over GF(2) for each number of stages: x^5 + x^2 + 1 and so on. */
const PRIMITIVE: Readonly<Record<number, readonly number[]>> = {
  3: [3, 1],
  4: [4, 1],
  5: [5, 2],
  6: [6, 1],
  7: [7, 1],
};

/** One period of the sequence for 3 to 7 stages, as 1 and 0; begins with the ones of the full register. */
export function maximalSequence(stages: number): number[] {
  const exponents = PRIMITIVE[stages];
  if (!exponents) throw new RangeError(`A sequence has 3 to 7 stages, not ${stages}.`);
  const bits: number[] = Array.from({ length: stages }, () => 1);
  // Recurrence of the polynomial: s(k + n) = s(k) + s(k + m), modulo 2.
  while (bits.length < 2 ** stages - 1) {
    const k = bits.length - stages;
    bits.push(exponents.reduce((sum, exponent) => sum ^ bits[exponent === stages ? k : k + exponent], 0));
  }
  return bits;
}
