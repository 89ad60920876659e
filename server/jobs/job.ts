import type * as z from 'zod';

/** One kind of work done apart from requests, as data. */
export interface Job<T extends z.ZodType = z.ZodType> {
  /** Also the name of its queue. */
  readonly name: string;
  readonly data: T;
  /** How often it is tried again after failing, or after its server died. */
  readonly retries: number;
  /** A job that has run longer than this counts as dead, s. */
  readonly expiresAfterS: number;
  /** How many run side by side in one server. */
  readonly atOnce: number;
}

export const defineJob = <T extends z.ZodType>(job: Job<T>): Job<T> => job;
export type DataOf<J> = J extends Job<infer T> ? z.output<T> : never;
