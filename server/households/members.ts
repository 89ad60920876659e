import type { Role } from '@oriel/shared/contracts/role';
import type { Database } from '../database/database';
import { DomainFailure, notFound } from '../http/failure';

/** Members of a household, so read that nobody else changes them until this change is done. */
const lockMembers = (change: Database, householdId: string) =>
  change
    .selectFrom('membership')
    .select(['account_id', 'role'])
    .where('household_id', '=', householdId)
    .orderBy('account_id')
    .forUpdate()
    .execute();

/** @throws not-found when the account is no member, last-owner when no other owner would be left. */
async function keepAnOwner(change: Database, householdId: string, accountId: string): Promise<void> {
  const members = await lockMembers(change, householdId);
  if (!members.some((member) => member.account_id === accountId)) throw notFound();
  if (!members.some((member) => member.role === 'owner' && member.account_id !== accountId))
    throw new DomainFailure(409, 'last-owner', 'A household needs an owner, and this is the last one.', 'Make another member an owner first.');
}

/** @throws not-found, last-owner */
export async function changeRole(db: Database, householdId: string, accountId: string, role: Role): Promise<void> {
  await db.transaction().execute(async (change) => {
    if (role === 'owner') await lockMembers(change, householdId);
    else await keepAnOwner(change, householdId, accountId);
    const changed = await change
      .updateTable('membership')
      .set({ role })
      .where('household_id', '=', householdId)
      .where('account_id', '=', accountId)
      .returning('account_id')
      .executeTakeFirst();
    if (!changed) throw notFound();
  });
}

/** @throws not-found, last-owner */
export async function removeMember(db: Database, householdId: string, accountId: string): Promise<void> {
  await db.transaction().execute(async (change) => {
    await keepAnOwner(change, householdId, accountId);
    await change.deleteFrom('membership').where('household_id', '=', householdId).where('account_id', '=', accountId).execute();
  });
}
