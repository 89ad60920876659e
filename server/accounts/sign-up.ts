import type { Database } from '../database/database';
import { DomainFailure } from '../http/failure';
import { createHousehold } from '../households/household-store';
import type { Mailer } from '../mail/mailer';
import { alreadyHereLetter, confirmLetter } from './account-letters';
import { accountByEmail, createAccount } from './account-store';
import { hashOfToken, hoursFromNow, makeToken } from '../http/secret-token';
import type { Passwords } from './passwords';

export interface NewHousehold {
  readonly token: string;
  readonly name: string;
  readonly password: string;
  readonly householdName: string;
}

const confirmHours = 24;

export const linkSpent = (remedy: string) =>
  new DomainFailure(410, 'link-spent', 'This link has been used already, has expired, or is not whole.', remedy);

/** Only after the account is there for good: within its transaction, two confirmations at one moment would wait for each other for ever. */
export async function forgetSignUps(db: Database, email: string): Promise<void> {
  await db.deleteFrom('sign_up').where('email', '=', email).execute();
}

const spent = () => linkSpent('Sign in if you have confirmed before; otherwise sign up again.');

export function createSignUps(db: Database, mailer: Mailer, passwords: Passwords, publicUrl: string) {
  const isOpen = async (token: string) =>
    (await db
      .selectFrom('sign_up')
      .select('email')
      .where('token_hash', '=', hashOfToken(token))
      .where('expires_at', '>', new Date())
      .executeTakeFirst()) !== undefined;

  return {
    /**
     * Says the same whether the address is known or not; the mail tells its holder which. A token is kept for a known address too, and told
     * to nobody, so that both cost the same.
     */
    async ask(email: string): Promise<void> {
      const { token, hash } = makeToken();
      const known = await accountByEmail(db, email);
      await db.deleteFrom('sign_up').where('expires_at', '<', new Date()).execute();
      await db
        .insertInto('sign_up')
        .values({ token_hash: hash, email, expires_at: hoursFromNow(confirmHours) })
        .execute();
      mailer.send(known ? alreadyHereLetter(email, publicUrl) : confirmLetter(email, publicUrl, token));
    },

    /** Makes the account, its household and its ownership at once. @returns the account's id. @throws link-spent, already-confirmed */
    async confirm({ token, name, password, householdName }: NewHousehold): Promise<string> {
      // Looked up before the costly hash, so that made-up tokens cost the server nothing.
      if (!(await isOpen(token))) throw spent();
      const passwordHash = await passwords.hash(password);
      const { accountId, email } = await db.transaction().execute(async (change) => {
        const asked = await change
          .deleteFrom('sign_up')
          .where('token_hash', '=', hashOfToken(token))
          .where('expires_at', '>', new Date())
          .returningAll()
          .executeTakeFirst();
        if (!asked) throw spent();
        const accountId = await createAccount(change, { email: asked.email, name, passwordHash });
        if (!accountId)
          throw new DomainFailure(409, 'already-confirmed', 'This address has an account already.', 'Sign in, or set a new password.');
        await createHousehold(change, householdName, accountId);
        return { accountId, email: asked.email };
      });
      await forgetSignUps(db, email);
      return accountId;
    },
  };
}
