import { sql } from 'kysely';
import type { Database } from '../database/database';
import { DomainFailure } from '../http/failure';
import type { Mailer } from '../mail/mailer';
import { passwordChangedLetter, resetLetter } from './account-letters';
import { hashOfToken, hoursFromNow, makeToken } from '../http/secret-token';
import type { Passwords } from './passwords';
import type { Sessions } from './sessions';
import { linkSpent } from './sign-up';

const resetHours = 1;

export function createPasswordChanges(db: Database, mailer: Mailer, passwords: Passwords, sessions: Sessions, publicUrl: string) {
  const store = async (accountId: string, password: string) => {
    const { email } = await db
      .updateTable('account')
      .set({ password_hash: await passwords.hash(password) })
      .where('id', '=', accountId)
      .returning('email')
      .executeTakeFirstOrThrow();
    await db.deleteFrom('password_reset').where('account_id', '=', accountId).execute();
    mailer.send(passwordChangedLetter(email, publicUrl));
  };

  return {
    /** Replaces the password and signs out every other browser. @throws wrong-password */
    async change(accountId: string, sessionId: string, current: string, next: string): Promise<void> {
      const account = await db.selectFrom('account').select('password_hash').where('id', '=', accountId).executeTakeFirst();
      if (!(await passwords.matches(current, account?.password_hash ?? null)))
        throw new DomainFailure(422, 'wrong-password', 'This is not your present password.', 'Type it again, or sign out and set a new one by mail.', {
          fields: { current: 'This is not your present password' },
        });
      await store(accountId, next);
      await sessions.endElsewhere(accountId, sessionId);
    },

    /** One statement finds the account and keeps the token's hash, so that a known and an unknown address cost the same. */
    async ask(email: string): Promise<void> {
      const { token, hash } = makeToken();
      await db.deleteFrom('password_reset').where('expires_at', '<', new Date()).execute();
      const kept = await db
        .insertInto('password_reset')
        .columns(['token_hash', 'account_id', 'expires_at'])
        .expression(
          db
            .selectFrom('account')
            .select([sql<Buffer>`${hash}::bytea`.as('token_hash'), 'id', sql<Date>`${hoursFromNow(resetHours)}::timestamptz`.as('expires_at')])
            .where('email', '=', email),
        )
        .returning('account_id')
        .executeTakeFirst();
      if (kept) mailer.send(resetLetter(email, publicUrl, token));
    },

    /** Sets a new password by a mailed link, once, and signs out everywhere. @throws link-spent */
    async redeem(token: string, password: string): Promise<void> {
      const reset = await db
        .deleteFrom('password_reset')
        .where('token_hash', '=', hashOfToken(token))
        .where('expires_at', '>', new Date())
        .returning('account_id')
        .executeTakeFirst();
      if (!reset) throw linkSpent('Ask for a new link.');
      await store(reset.account_id, password);
      await sessions.endEverywhere(reset.account_id);
    },
  };
}
