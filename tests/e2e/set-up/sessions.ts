import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { request } from '@playwright/test';
import { signIn } from '@oriel/shared/contracts/accounts';
import { type Role, everyRole } from '@oriel/shared/contracts/role';
import { demoAccount } from '../demo-accounts';

/** Where the cookies of the demo's member with this role are kept, once `keepSessions` has signed them in. */
export const sessionFile = (role: Role): string => join(process.env['ORIEL_SESSIONS']!, `${role}.json`);

/** Signs in each of the demo's members, once for all tests: a password is made to be slow to check. */
export async function keepSessions(url: string): Promise<{ forget: () => Promise<void> }> {
  const folder = await mkdtemp(join(tmpdir(), 'oriel-e2e-sessions-'));
  process.env['ORIEL_SESSIONS'] = folder;
  await Promise.all(everyRole.map((role) => keepSession(url, role)));
  return { forget: () => rm(folder, { recursive: true, force: true }) };
}

async function keepSession(url: string, role: Role): Promise<void> {
  const browser = await request.newContext({ baseURL: url });
  const { email, password } = demoAccount(role);
  await browser.get('/api/me');
  const { cookies } = await browser.storageState();
  const token = cookies.find(({ name }) => name === 'XSRF-TOKEN')?.value ?? '';
  const reply = await browser.post(signIn.path, { data: { email, password }, headers: { 'X-XSRF-TOKEN': decodeURIComponent(token) } });
  if (!reply.ok()) throw new Error(`The demo's ${role} could not sign in: ${reply.status()} ${await reply.text()}`);
  await browser.storageState({ path: sessionFile(role) });
  await browser.dispose();
}
