/** A computer as it is emulated: what its browser gets of this machine's cores. */
export interface Computer {
  readonly words: string;
  /** Share of one of this machine's cores that each thread may have; null for no limit of its own. */
  readonly eachThread: number | null;
  /** Cores' worth that all threads together may have; null for no limit. */
  readonly inAll: number | null;
}

export const COMPUTERS = {
  unthrottled: { words: 'this machine, unthrottled', eachThread: null, inAll: null },
  quarter: { words: 'four cores at a quarter of this machine’s', eachThread: 1 / 4, inAll: 4 / 4 },
  sixth: { words: 'four cores at a sixth of this machine’s', eachThread: 1 / 6, inAll: 4 / 6 },
  half: { words: 'half a core of this machine’s in all', eachThread: null, inAll: 1 / 2 },
} as const satisfies Record<string, Computer>;

export type ComputerName = keyof typeof COMPUTERS;
