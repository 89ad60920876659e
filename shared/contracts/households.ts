import * as z from 'zod';
import { Account } from './accounts';
import { Email, Id, Moment, Name, Password, Token } from './fields';
import { everyRole, ownerOnly, Role } from './role';
import { anyone, defineRoute, members, signedIn } from './route';

export const Member = z.object({ accountId: Id, name: z.string(), email: z.string(), role: Role, joinedAt: Moment });
export type Member = z.infer<typeof Member>;
export const Household = z.object({ id: Id, name: z.string(), members: z.array(Member) });
export type Household = z.infer<typeof Household>;
export const Invitation = z.object({ id: Id, email: z.string(), role: Role, invitedBy: z.string(), expiresAt: Moment });
export type Invitation = z.infer<typeof Invitation>;

const HouseholdParams = z.object({ householdId: Id });
const HouseholdReply = z.object({ household: Household });

export const createHousehold = defineRoute({
  method: 'POST',
  path: '/api/households',
  access: signedIn,
  body: z.object({ name: Name }),
  reply: HouseholdReply,
});
export const readHousehold = defineRoute({
  method: 'GET',
  path: '/api/households/:householdId',
  access: members('household', everyRole),
  params: HouseholdParams,
  reply: HouseholdReply,
});
export const renameHousehold = defineRoute({
  method: 'PATCH',
  path: '/api/households/:householdId',
  access: members('household', ownerOnly),
  params: HouseholdParams,
  body: z.object({ name: Name }),
  reply: HouseholdReply,
});

const MemberParams = z.object({ householdId: Id, accountId: Id });
export const changeRole = defineRoute({
  method: 'PATCH',
  path: '/api/households/:householdId/members/:accountId',
  access: members('household', ownerOnly),
  params: MemberParams,
  body: z.object({ role: Role }),
  reply: HouseholdReply,
});
export const removeMember = defineRoute({
  method: 'DELETE',
  path: '/api/households/:householdId/members/:accountId',
  access: members('household', ownerOnly),
  params: MemberParams,
  reply: HouseholdReply,
});
/** A member of any role goes of their own will; the last owner cannot. */
export const leaveHousehold = defineRoute({
  method: 'DELETE',
  path: '/api/households/:householdId/membership',
  access: members('household', everyRole),
  params: HouseholdParams,
});

const InvitationsReply = z.object({ invitations: z.array(Invitation) });
export const listInvitations = defineRoute({
  method: 'GET',
  path: '/api/households/:householdId/invitations',
  access: members('household', ownerOnly),
  params: HouseholdParams,
  reply: InvitationsReply,
});
export const invite = defineRoute({
  method: 'POST',
  path: '/api/households/:householdId/invitations',
  access: members('household', ownerOnly),
  params: HouseholdParams,
  body: z.object({ email: Email, role: Role }),
  reply: InvitationsReply,
});
export const withdrawInvitation = defineRoute({
  method: 'DELETE',
  path: '/api/households/:householdId/invitations/:invitationId',
  access: members('household', ownerOnly),
  params: z.object({ householdId: Id, invitationId: Id }),
  reply: InvitationsReply,
});

/** What a mailed invitation says to whoever holds it; `hasAccount` tells the page whether to ask for a sign-in or a new password. */
export const readInvitation = defineRoute({
  method: 'POST',
  path: '/api/invitations/reading',
  access: anyone,
  body: z.object({ token: Token }),
  reply: z.object({
    householdName: z.string(),
    invitedBy: z.string(),
    role: Role,
    email: z.string(),
    hasAccount: z.boolean(),
  }),
});
/** Joins: as the signed-in holder of that address, or with a new account made here (name and password given). */
export const acceptInvitation = defineRoute({
  method: 'POST',
  path: '/api/invitations/acceptance',
  access: anyone,
  body: z.object({ token: Token, newAccount: z.object({ name: Name, password: Password }).optional() }),
  reply: z.object({ account: Account, householdId: Id }),
});
