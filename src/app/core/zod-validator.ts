import type { ValidatorFn } from '@angular/forms';
import type * as z from 'zod';

/** A field's rule is the contract's own schema; its message is what the field shows. */
export const accordingTo =
  (schema: z.ZodType): ValidatorFn =>
  (control) => {
    const parsed = schema.safeParse(control.value);
    return parsed.success ? null : { contract: parsed.error.issues[0].message };
  };
