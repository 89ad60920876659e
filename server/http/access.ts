import * as z from 'zod';
import type { Access, Owned } from '@oriel/shared/contracts/route';
import type { Role } from '@oriel/shared/contracts/role';
import type { Database } from '../database/database';
import { notFound, notYourRole, signInFirst } from './failure';

/** Who asks, once the access rule of the route has let them through. */
export interface Asker {
  /** Null only on routes for anyone. */
  readonly accountId: string | null;
  /** The household that owns the thing named in the address, and the asker's role there; null on other routes. */
  readonly member: { readonly householdId: string; readonly role: Role } | null;
}

const Uuid = z.uuid();
const tableOf = { photo: 'photo', scene: 'scene', image: 'layer_image', wall: 'wall', run: 'run' } as const;

async function owningHousehold(db: Database, of: Owned, id: string): Promise<string | null> {
  if (of === 'household') return id;
  const row = await db.selectFrom(tableOf[of]).select('household_id').where('id', '=', id).executeTakeFirst();
  return row?.household_id ?? null;
}

/**
 * The one place where roles are enforced. @throws signed-out (401) for a stranger, not-found (404) for someone outside the household,
 * not-your-role (403) for a member whose role does not reach.
 */
export async function admit(
  db: Database,
  access: Access,
  accountId: string | null,
  params: Record<string, unknown>,
): Promise<Asker> {
  if (access.kind === 'anyone') return { accountId, member: null };
  if (!accountId) throw signInFirst();
  if (access.kind === 'signed-in') return { accountId, member: null };

  const id = Uuid.safeParse(params[`${access.of}Id`]);
  const householdId = id.success ? await owningHousehold(db, access.of, id.data) : null;
  if (!householdId) throw notFound();
  const membership = await db
    .selectFrom('membership')
    .select('role')
    .where('household_id', '=', householdId)
    .where('account_id', '=', accountId)
    .executeTakeFirst();
  if (!membership) throw notFound();
  if (!access.roles.includes(membership.role)) throw notYourRole();
  return { accountId, member: { householdId, role: membership.role } };
}
