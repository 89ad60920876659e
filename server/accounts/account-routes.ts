import * as contract from '@oriel/shared/contracts/accounts';
import type { Feature } from '../http/mount';
import type { Parts } from '../parts';
import { findAccount, readAccount } from './account-store';
import { createPasswordChanges } from './password-changes';
import { proveSignIn } from './sign-in';
import { createSignUps } from './sign-up';

export function accountRoutes({ connection: { db }, config, mailer, passwords, sessions, limits, mailPage }: Parts): Feature {
  const signUps = createSignUps(db, mailer, passwords, config.publicUrl);
  const changes = createPasswordChanges(db, mailer, passwords, sessions, config.publicUrl);

  return (mount) => {
    mount(contract.whoAmI, async ({ accountId, request }) => ({
      account: (accountId && (await findAccount(db, accountId))) || null,
      mailPage: mailPage?.isOpenTo(request) ? mailPage.address : null,
    }));

    mount(
      contract.signUp,
      async ({ body }) => {
        await signUps.ask(body.email);
        return {};
      },
      limits.mails,
    );
    mount(contract.confirmSignUp, async ({ body, request, response }) => {
      const accountId = await signUps.confirm(body);
      await sessions.begin(request, response, accountId);
      return { account: await readAccount(db, accountId) };
    });

    mount(
      contract.signIn,
      async ({ body, request, response }) => {
        const accountId = await proveSignIn(db, passwords, body.email, body.password);
        await sessions.begin(request, response, accountId);
        return { account: await readAccount(db, accountId) };
      },
      limits.passwords,
    );
    mount(contract.signOut, async ({ request, response }) => {
      await sessions.end(request, response);
      return {};
    });
    mount(contract.signOutEverywhere, async ({ accountId, request, response }) => {
      await sessions.endEverywhere(accountId);
      await sessions.end(request, response);
      return {};
    });

    mount(contract.rename, async ({ accountId, body }) => {
      await db.updateTable('account').set({ name: body.name }).where('id', '=', accountId).execute();
      return { account: await readAccount(db, accountId) };
    });
    mount(
      contract.changePassword,
      async ({ accountId, body, request }) => {
        await changes.change(accountId, request.sessionID, body.current, body.next);
        return {};
      },
      limits.ownPassword,
    );
    mount(
      contract.askPasswordReset,
      async ({ body }) => {
        await changes.ask(body.email);
        return {};
      },
      limits.mails,
    );
    mount(contract.resetPassword, async ({ body, request, response }) => {
      await changes.redeem(body.token, body.password);
      if (request.session.accountId) await sessions.end(request, response);
      return {};
    });
  };
}
