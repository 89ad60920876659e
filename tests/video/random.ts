/** A repeatable source of numbers from 0 to 1: a linear congruential generator modulo 2^31 (constants of ISO C's example `rand`). */
export function repeatableRandom(seed: number): () => number {
  let state = seed;
  return () => {
    state = (Math.imul(state, 1103515245) + 12345) & 0x7fffffff;
    return state / 0x7fffffff;
  };
}

/** `count` normally distributed numbers of this standard deviation, by the Box-Muller transform. */
export function normalNoise(count: number, deviation: number, random: () => number): Float32Array {
  return Float32Array.from(
    { length: count },
    () => deviation * Math.sqrt(-2 * Math.log(random() + 1e-9)) * Math.cos(2 * Math.PI * random()),
  );
}
