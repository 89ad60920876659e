import type { Role } from '@oriel/shared/contracts/role';
import { setLetter } from '../mail/letter';
import type { Mail } from '../mail/mailer';

export interface InvitationWords {
  readonly to: string;
  readonly householdName: string;
  readonly invitedBy: string;
  readonly role: Role;
}

/** What a role lets its holder do, to follow "you can". */
const reach: Record<Role, string> = {
  owner: 'do everything there, and invite others',
  designer: 'add photographs and make scenes',
  tuner: 'set up walls and the bench',
  viewer: 'look at its scenes and play them',
};

export const invitationLetter = ({ to, householdName, invitedBy, role }: InvitationWords, publicUrl: string, token: string): Mail =>
  setLetter({
    to,
    subject: `${invitedBy} invites you to ${householdName}`,
    paragraphs: [`${invitedBy} asks you to join the household ${householdName} on Oriel as ${role === 'owner' ? 'an' : 'a'} ${role}: you can ${reach[role]}.`],
    action: { label: 'See the invitation', href: `${publicUrl}/invitation#${token}` },
    note: 'The link works once, within seven days, for this address alone. If you do not know who this is, do nothing.',
  });
