import type { Passwords } from '../accounts/passwords';

/** Passwords that count their costly work, so that a test can compare what two requests cost without measuring time. */
export function countingPasswords(passwords: Passwords): Passwords & { taken(): { hashes: number; comparisons: number } } {
  let counted = { hashes: 0, comparisons: 0 };
  return {
    hash: (password) => ((counted.hashes += 1), passwords.hash(password)),
    matches: (password, hash) => ((counted.comparisons += 1), passwords.matches(password, hash)),
    taken: () => {
      const result = counted;
      counted = { hashes: 0, comparisons: 0 };
      return result;
    },
  };
}
