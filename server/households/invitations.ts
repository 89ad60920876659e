import type { Invitation } from '@oriel/shared/contracts/households';
import type { Role } from '@oriel/shared/contracts/role';
import { createAccount } from '../accounts/account-store';
import { hashOfToken, hoursFromNow, makeToken } from '../http/secret-token';
import type { Passwords } from '../accounts/passwords';
import { forgetSignUps, linkSpent } from '../accounts/sign-up';
import type { Database } from '../database/database';
import { DomainFailure, signInFirst } from '../http/failure';
import type { Mailer } from '../mail/mailer';
import { invitationLetter } from './household-letters';
import { addMember } from './household-store';

const invitationHours = 7 * 24;
const spent = () => linkSpent('Ask whoever invited you for a new invitation.');

export interface Inviting {
  readonly householdId: string;
  readonly invitedBy: string;
  readonly email: string;
  readonly role: Role;
}
export interface NewHolder {
  readonly name: string;
  readonly password: string;
}

const pending = (db: Database) =>
  db
    .selectFrom('invitation')
    .innerJoin('household', 'household.id', 'invitation.household_id')
    .innerJoin('account', 'account.id', 'invitation.invited_by')
    .where('invitation.expires_at', '>', new Date());

export function createInvitations(db: Database, mailer: Mailer, passwords: Passwords, publicUrl: string) {
  const byToken = (token: string) =>
    pending(db)
      .select(['invitation.email', 'invitation.role', 'household.name as householdName', 'account.name as invitedBy'])
      .where('invitation.token_hash', '=', hashOfToken(token))
      .executeTakeFirst();

  const list = async (householdId: string): Promise<Invitation[]> => {
    const rows = await pending(db)
      .select(['invitation.id', 'invitation.email', 'invitation.role', 'account.name as invitedBy', 'invitation.expires_at'])
      .where('invitation.household_id', '=', householdId)
      .orderBy('invitation.email')
      .execute();
    return rows.map(({ expires_at, ...row }) => ({ ...row, expiresAt: expires_at.toISOString() }));
  };

  return {
    list,

    /** Inviting an address again replaces what was mailed before. @throws already-member */
    async invite({ householdId, invitedBy, email, role }: Inviting): Promise<void> {
      const member = await db
        .selectFrom('membership')
        .innerJoin('account', 'account.id', 'membership.account_id')
        .select('account.id')
        .where('membership.household_id', '=', householdId)
        .where('account.email', '=', email)
        .executeTakeFirst();
      if (member) throw new DomainFailure(409, 'already-member', `${email} is a member already.`, 'Change the role in the list of members.');

      const { token, hash } = makeToken();
      const fresh = { token_hash: hash, role, invited_by: invitedBy, expires_at: hoursFromNow(invitationHours) };
      await db
        .insertInto('invitation')
        .values({ household_id: householdId, email, ...fresh })
        .onConflict((conflict) => conflict.columns(['household_id', 'email']).doUpdateSet(fresh))
        .execute();
      const words = await byToken(token);
      if (words) mailer.send(invitationLetter({ to: email, ...words }, publicUrl, token));
    },

    async withdraw(householdId: string, invitationId: string): Promise<void> {
      await db.deleteFrom('invitation').where('household_id', '=', householdId).where('id', '=', invitationId).execute();
    },

    /** @throws link-spent */
    async read(token: string) {
      const invitation = await byToken(token);
      if (!invitation) throw spent();
      const account = await db.selectFrom('account').select('id').where('email', '=', invitation.email).executeTakeFirst();
      return { ...invitation, hasAccount: account !== undefined };
    },

    /**
     * Joins as the signed-in account, if the invitation is for its address, or as a new account: holding the mailed token proves the
     * address. Whoever is a member by now keeps the role they have.
     * @returns who joined, and whether they had to be made.
     * @throws link-spent, other-address, has-account, signed-out
     */
    async accept(token: string, signedInId: string | null, holder: NewHolder | undefined) {
      // Looked up before the costly hash, so that made-up tokens cost the server nothing.
      if (!(await byToken(token))) throw spent();
      const passwordHash = holder && !signedInId ? await passwords.hash(holder.password) : null;
      const { email, ...joined } = await db.transaction().execute(async (change) => {
        const invitation = await spend(change, token);
        const accountId = signedInId
          ? await holdToAddress(change, signedInId, invitation.email)
          : await makeAccount(change, invitation.email, holder?.name, passwordHash);
        await addMember(change, invitation.household_id, accountId, invitation.role);
        return { accountId, email: invitation.email, householdId: invitation.household_id, isNew: !signedInId };
      });
      if (joined.isNew) await forgetSignUps(db, email);
      return joined;
    },
  };
}

/** Takes the invitation out of the world, so that it works once. @throws link-spent */
async function spend(db: Database, token: string) {
  const invitation = await db
    .deleteFrom('invitation')
    .where('token_hash', '=', hashOfToken(token))
    .where('expires_at', '>', new Date())
    .returning(['household_id', 'email', 'role'])
    .executeTakeFirst();
  if (!invitation) throw spent();
  return invitation;
}

async function holdToAddress(db: Database, accountId: string, email: string): Promise<string> {
  const account = await db.selectFrom('account').select('email').where('id', '=', accountId).executeTakeFirst();
  if (!account) throw signInFirst();
  if (account.email !== email)
    throw new DomainFailure(409, 'other-address', `This invitation is for ${email}, and you are signed in as ${account.email}.`, 'Sign out and open the link again, or ask for an invitation to your own address.');
  return accountId;
}

async function makeAccount(db: Database, email: string, name: string | undefined, passwordHash: string | null): Promise<string> {
  if (name === undefined || passwordHash === null) throw signInFirst();
  const accountId = await createAccount(db, { email, name, passwordHash });
  if (!accountId) throw new DomainFailure(409, 'has-account', 'This address has an account already.', 'Sign in with it, then open the link again.');
  return accountId;
}
