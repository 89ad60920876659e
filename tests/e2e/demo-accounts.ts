import { readFileSync } from 'node:fs';
import type { Role } from '@oriel/shared/contracts/role';
import { inProject } from '../../scripts/project.mjs';

export interface DemoAccount {
  readonly email: string;
  readonly password: string;
  readonly role: Role;
}

/** The demo household's member with this role. */
export function demoAccount(role: Role): DemoAccount {
  const accounts = JSON.parse(readFileSync(inProject('assets', 'demo', 'accounts.json'), 'utf8')) as DemoAccount[];
  const found = accounts.find((account) => account.role === role);
  if (!found) throw new Error(`The demo has no account with the role ${role}.`);
  return found;
}
