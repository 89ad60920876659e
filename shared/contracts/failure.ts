import * as z from 'zod';

/**
 * The one shape of everything that goes wrong, from a schema or a domain error to the interface:
 * what happened, what to do, which fields, and a reference to find it in the log.
 */
export const Failure = z.object({
  code: z.string(),
  message: z.string(),
  remedy: z.string(),
  fields: z.record(z.string(), z.string()).optional(),
  detail: z.record(z.string(), z.unknown()).optional(),
  reference: z.string(),
});
export type Failure = z.infer<typeof Failure>;
