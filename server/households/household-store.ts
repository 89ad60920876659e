import type { Household } from '@oriel/shared/contracts/households';
import type { Role } from '@oriel/shared/contracts/role';
import type { Database } from '../database/database';
import { notFound } from '../http/failure';

export async function addMember(db: Database, householdId: string, accountId: string, role: Role): Promise<void> {
  await db
    .insertInto('membership')
    .values({ household_id: householdId, account_id: accountId, role })
    .onConflict((conflict) => conflict.columns(['household_id', 'account_id']).doNothing())
    .execute();
}

/** A new household with its first owner. @returns its id. */
export async function createHousehold(db: Database, name: string, ownerId: string): Promise<string> {
  const { id } = await db.insertInto('household').values({ name }).returning('id').executeTakeFirstOrThrow();
  await addMember(db, id, ownerId, 'owner');
  return id;
}

/** Members by name. @throws not-found */
export async function readHousehold(db: Database, householdId: string): Promise<Household> {
  const household = await db.selectFrom('household').select(['id', 'name']).where('id', '=', householdId).executeTakeFirst();
  if (!household) throw notFound();
  const members = await db
    .selectFrom('membership')
    .innerJoin('account', 'account.id', 'membership.account_id')
    .select(['account.id as accountId', 'account.name', 'account.email', 'membership.role', 'membership.joined_at'])
    .where('membership.household_id', '=', householdId)
    .orderBy('account.name')
    .orderBy('account.id')
    .execute();
  return { ...household, members: members.map(({ joined_at, ...member }) => ({ ...member, joinedAt: joined_at.toISOString() })) };
}

export async function renameHousehold(db: Database, householdId: string, name: string): Promise<void> {
  await db.updateTable('household').set({ name }).where('id', '=', householdId).execute();
}
