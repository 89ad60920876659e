import type * as z from 'zod';
import { degrees } from '../../screen/screen-measure';

export interface Limits {
  readonly least: number;
  readonly most: number;
}

/** The least and the most that the contract allows. */
export const limitsOf = ({ minValue, maxValue }: z.ZodNumber): Limits => ({ least: minValue ?? -Infinity, most: maxValue ?? Infinity });

/** The same of an angle, in degrees, to a tenth within. */
export function degreeLimitsOf(schema: z.ZodNumber): Limits {
  const { least, most } = limitsOf(schema);
  return { least: Math.ceil(degrees(least) * 10) / 10, most: Math.floor(degrees(most) * 10) / 10 };
}
