import type * as z from 'zod';

/** Work not yet saved, and the revision it was done on. */
export interface Draft<T> {
  readonly revision: number;
  readonly document: T;
}

/** Whether two documents are the same in every figure; the schema settles the order of their keys. */
export const sameBy =
  <T>(schema: z.ZodType<T>) =>
  (a: T, b: T): boolean =>
    a === b || JSON.stringify(schema.parse(a)) === JSON.stringify(schema.parse(b));
