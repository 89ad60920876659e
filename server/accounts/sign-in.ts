import type { Database } from '../database/database';
import { DomainFailure } from '../http/failure';
import { accountByEmail } from './account-store';
import type { Passwords } from './passwords';

/**
 * @returns the account's id.
 * @throws wrong-sign-in (422, for 401 always means that a session is missing), alike for an unknown address and a wrong password.
 */
export async function proveSignIn(db: Database, passwords: Passwords, email: string, password: string): Promise<string> {
  const account = await accountByEmail(db, email);
  const matches = await passwords.matches(password, account?.password_hash ?? null);
  if (!account || !matches)
    throw new DomainFailure(422, 'wrong-sign-in', 'This address and password do not belong together.', 'Check both, or set a new password by mail.');
  return account.id;
}
