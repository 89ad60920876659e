import * as z from 'zod';

export const Id = z.uuid();
export const Name = z
  .string()
  .trim()
  .min(1, 'Give it a name')
  .max(120, 'Use at most 120 characters')
  .regex(/^\P{Cc}*$/u, 'Use one line, without control characters');
export const Email = z.string().trim().toLowerCase().pipe(z.email('Write an address like name@example.org').max(254));
/** A moment, ISO 8601 with offset. */
export const Moment = z.iso.datetime({ offset: true });
/** An opaque secret from a mailed link: 32 random bytes, base64url. */
export const Token = z.string().min(40).max(60);

/** bcrypt reads no more than 72 bytes (N. Provos, D. Mazières, USENIX 1999), so a longer password is refused and not cut. */
export const passwordMaxBytes = 72;
export const passwordMinCharacters = 10;
export const Password = z
  .string()
  .min(passwordMinCharacters, `Use at least ${passwordMinCharacters} characters`)
  .refine(
    (text) => new TextEncoder().encode(text).length <= passwordMaxBytes,
    `Use at most ${passwordMaxBytes} bytes: that is ${passwordMaxBytes} plain letters, fewer with accents or emoji`,
  );
