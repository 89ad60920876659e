import { createHash, randomBytes } from 'node:crypto';

/** What the database keeps of a secret that was mailed or given to a screen: whoever reads the table cannot use it. */
export const hashOfToken = (token: string): Buffer => createHash('sha256').update(token).digest();

/** 32 random bytes, base64url, beside their hash. */
export function makeToken(): { token: string; hash: Buffer } {
  const token = randomBytes(32).toString('base64url');
  return { token, hash: hashOfToken(token) };
}

export const hoursFromNow = (hours: number): Date => new Date(Date.now() + hours * 3_600_000);
