import * as z from 'zod';
import { Email, Id, Name, Password, Token } from './fields';
import { Role } from './role';
import { anyone, defineRoute, signedIn } from './route';

export const Membership = z.object({ householdId: Id, householdName: z.string(), role: Role });
export type Membership = z.infer<typeof Membership>;

export const Account = z.object({ id: Id, name: z.string(), email: z.string(), memberships: z.array(Membership) });
export type Account = z.infer<typeof Account>;

const AccountReply = z.object({ account: Account });

/** Who is asking; null for a stranger. `mailPage` is where this server shows the mail it did not send, if it has no mail server. */
export const whoAmI = defineRoute({
  method: 'GET',
  path: '/api/me',
  access: anyone,
  reply: z.object({ account: Account.nullable(), mailPage: z.string().nullable() }),
});

/**
 * Answers alike whether the address is known or not; the rest happens by mail. Name and password are only asked of whoever holds the mailed
 * link, so that nobody can prepare an account with a password of theirs for another's address.
 */
export const signUp = defineRoute({
  method: 'POST',
  path: '/api/accounts',
  access: anyone,
  body: z.object({ email: Email }),
  status: 202,
});
export const confirmSignUp = defineRoute({
  method: 'POST',
  path: '/api/accounts/confirmations',
  access: anyone,
  body: z.object({ token: Token, name: Name, password: Password, householdName: Name }),
  reply: AccountReply,
});

export const signIn = defineRoute({
  method: 'POST',
  path: '/api/session',
  access: anyone,
  body: z.object({ email: Email, password: z.string().min(1, 'Enter your password') }),
  reply: AccountReply,
});
export const signOut = defineRoute({ method: 'DELETE', path: '/api/session', access: signedIn });
export const signOutEverywhere = defineRoute({ method: 'DELETE', path: '/api/sessions', access: signedIn });

export const rename = defineRoute({
  method: 'PATCH',
  path: '/api/me',
  access: signedIn,
  body: z.object({ name: Name }),
  reply: AccountReply,
});
export const changePassword = defineRoute({
  method: 'PUT',
  path: '/api/me/password',
  access: signedIn,
  body: z.object({ current: z.string().min(1, 'Enter your present password'), next: Password }),
});
export const askPasswordReset = defineRoute({
  method: 'POST',
  path: '/api/password-resets',
  access: anyone,
  body: z.object({ email: Email }),
  status: 202,
});
export const resetPassword = defineRoute({
  method: 'POST',
  path: '/api/password-resets/redemptions',
  access: anyone,
  body: z.object({ token: Token, password: Password }),
});
