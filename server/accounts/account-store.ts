import type { Account } from '@oriel/shared/contracts/accounts';
import type { Database } from '../database/database';
import { signInFirst } from '../http/failure';

export interface NewAccount {
  readonly email: string;
  readonly name: string;
  readonly passwordHash: string;
}

/** Null when the address has an account already. */
export async function createAccount(db: Database, account: NewAccount): Promise<string | null> {
  const row = await db
    .insertInto('account')
    .values({ email: account.email.toLowerCase(), name: account.name, password_hash: account.passwordHash })
    .onConflict((conflict) => conflict.column('email').doNothing())
    .returning('id')
    .executeTakeFirst();
  return row?.id ?? null;
}

export const accountByEmail = (db: Database, email: string) =>
  db.selectFrom('account').select(['id', 'name', 'email', 'password_hash']).where('email', '=', email).executeTakeFirst();

/** The account as its holder sees it, with every household it belongs to. Undefined when it is gone. */
export async function findAccount(db: Database, accountId: string): Promise<Account | undefined> {
  const account = await db.selectFrom('account').select(['id', 'name', 'email']).where('id', '=', accountId).executeTakeFirst();
  if (!account) return undefined;
  const memberships = await db
    .selectFrom('membership')
    .innerJoin('household', 'household.id', 'membership.household_id')
    .select(['household.id as householdId', 'household.name as householdName', 'membership.role'])
    .where('membership.account_id', '=', accountId)
    .orderBy('household.name')
    .orderBy('household.id')
    .execute();
  return { ...account, memberships };
}

/** @throws signed-out when the account is gone. */
export async function readAccount(db: Database, accountId: string): Promise<Account> {
  const account = await findAccount(db, accountId);
  if (!account) throw signInFirst();
  return account;
}
