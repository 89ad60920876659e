import * as z from 'zod';
import type { Access, Owned } from '@oriel/shared/contracts/route';
import type { Role } from '@oriel/shared/contracts/role';
import type { Database } from '../database/database';
import { notFound, notPaired, notYourRole, signInFirst } from './failure';
import { hashOfToken } from './secret-token';

/** What a request shows of who asks. */
export interface Shown {
  readonly accountId: string | null;
  readonly wallCredential: string | null;
}

/** Who asks, once the access rule of the route has let them through. */
export interface Asker {
  /** Null on routes for anyone, for strangers, and on routes for walls. */
  readonly accountId: string | null;
  /** The household that owns the thing named in the address, and the asker's role there; null on other routes. */
  readonly member: { readonly householdId: string; readonly role: Role } | null;
  /** The wall whose screen asks; null on other routes than those for walls. */
  readonly wall: { readonly id: string; readonly householdId: string } | null;
}

const Uuid = z.uuid();
const tableOf = { photo: 'photo', scene: 'scene', image: 'layer_image', wall: 'wall', run: 'run' } as const;

async function owningHousehold(db: Database, of: Owned, id: string): Promise<string | null> {
  if (of === 'household') return id;
  const row = await db.selectFrom(tableOf[of]).select('household_id').where('id', '=', id).executeTakeFirst();
  return row?.household_id ?? null;
}

/** The wall whose screen holds this credential; undefined where none does. */
export async function wallOfScreen(db: Database, credential: string | null) {
  if (!credential) return undefined;
  return db
    .selectFrom('wall')
    .select(['id', 'household_id'])
    .where('credential_hash', '=', hashOfToken(credential))
    .executeTakeFirst();
}

async function admitScreen(db: Database, credential: string | null): Promise<Asker> {
  const wall = await wallOfScreen(db, credential);
  if (!wall) throw notPaired();
  return { accountId: null, member: null, wall: { id: wall.id, householdId: wall.household_id } };
}

/**
 * The one place where roles are enforced. @throws signed-out (401) for a stranger, not-found (404) for someone outside the household,
 * not-your-role (403) for a member whose role does not reach, not-paired (401) for whoever is not a wall's own screen.
 */
export async function admit(
  db: Database,
  access: Access,
  { accountId, wallCredential }: Shown,
  params: Record<string, unknown>,
): Promise<Asker> {
  if (access.kind === 'wall') return admitScreen(db, wallCredential);
  if (access.kind === 'anyone') return { accountId, member: null, wall: null };
  if (!accountId) throw signInFirst();
  if (access.kind === 'signed-in') return { accountId, member: null, wall: null };

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
  return { accountId, member: { householdId, role: membership.role }, wall: null };
}
