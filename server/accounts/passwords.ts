import { compare, hash } from 'bcryptjs';
import { randomBytes } from 'node:crypto';
import { passwordMaxBytes } from '@oriel/shared/contracts/fields';

export interface Passwords {
  hash(password: string): Promise<string>;
  /** Takes the same work whether there is a hash to compare with or not (null), so that time tells nothing about who has an account. */
  matches(password: string, storedHash: string | null): Promise<boolean>;
}

/**
 * Passwords under bcrypt (N. Provos, D. Mazières, *A Future-Adaptable Password Scheme*, USENIX 1999).
 * @param cost log2 of the rounds; tests lower it.
 */
export function createPasswords(cost = 12): Passwords {
  const decoy = hash(randomBytes(24).toString('base64'), cost);
  return {
    hash: (password) => hash(password, cost),
    async matches(password, storedHash) {
      // bcrypt would cut a longer password and accept whatever follows the first 72 bytes.
      const usable = storedHash !== null && Buffer.byteLength(password) <= passwordMaxBytes;
      const same = await compare(password, usable ? storedHash : await decoy);
      return usable && same;
    },
  };
}
