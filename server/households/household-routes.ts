import * as contract from '@oriel/shared/contracts/households';
import { readAccount } from '../accounts/account-store';
import type { Feature } from '../http/mount';
import type { Parts } from '../parts';
import { createHousehold, readHousehold, renameHousehold } from './household-store';
import { createInvitations } from './invitations';
import { changeRole, removeMember } from './members';

export function householdRoutes({ connection: { db }, config, mailer, passwords, sessions, limits }: Parts): Feature {
  const invitations = createInvitations(db, mailer, passwords, config.publicUrl);
  const household = async (householdId: string) => ({ household: await readHousehold(db, householdId) });
  const invitationsOf = async (householdId: string) => ({ invitations: await invitations.list(householdId) });

  return (mount) => {
    mount(contract.createHousehold, async ({ accountId, body }) => {
      const householdId = await db.transaction().execute((change) => createHousehold(change, body.name, accountId));
      return household(householdId);
    });
    mount(contract.readHousehold, ({ householdId }) => household(householdId));
    mount(contract.renameHousehold, async ({ householdId, body }) => {
      await renameHousehold(db, householdId, body.name);
      return household(householdId);
    });

    mount(contract.changeRole, async ({ householdId, params, body }) => {
      await changeRole(db, householdId, params.accountId, body.role);
      return household(householdId);
    });
    mount(contract.removeMember, async ({ householdId, params }) => {
      await removeMember(db, householdId, params.accountId);
      return household(householdId);
    });
    mount(contract.leaveHousehold, async ({ householdId, accountId }) => {
      await removeMember(db, householdId, accountId);
      return {};
    });

    mount(contract.listInvitations, ({ householdId }) => invitationsOf(householdId));
    mount(
      contract.invite,
      async ({ householdId, accountId, body }) => {
        await invitations.invite({ householdId, invitedBy: accountId, ...body });
        return invitationsOf(householdId);
      },
      limits.mails,
    );
    mount(contract.withdrawInvitation, async ({ householdId, params }) => {
      await invitations.withdraw(householdId, params.invitationId);
      return invitationsOf(householdId);
    });

    mount(contract.readInvitation, ({ body }) => invitations.read(body.token));
    mount(contract.acceptInvitation, async ({ accountId, body, request, response }) => {
      const joined = await invitations.accept(body.token, accountId || null, body.newAccount);
      if (joined.isNew) await sessions.begin(request, response, joined.accountId);
      return { account: await readAccount(db, joined.accountId), householdId: joined.householdId };
    });
  };
}
