import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Role } from '@oriel/shared/contracts/role';
import { createPasswords } from '../accounts/passwords';
import { countingPasswords } from '../testing/counting-passwords';
import { createTestApp, testPassword, type SignedIn, type TestApp } from '../testing/test-app';
import { tokenIn } from '../testing/token-in';

describe('an invitation', () => {
  const passwords = countingPasswords(createPasswords(4));
  let app: TestApp;
  let owner: SignedIn;
  let householdId: string;
  let at: string;
  beforeAll(async () => {
    app = await createTestApp({ passwords });
    householdId = (await app.household('Lark House')).id;
    owner = await app.signedIn('owner', householdId);
    at = `/api/households/${householdId}/invitations`;
  });
  afterAll(() => app.close());

  let guests = 0;
  const stranger = () => `guest${++guests}@example.org`;
  async function invite(email: string, role: Role = 'designer'): Promise<string> {
    const answer = await owner.browser.ask('post', at, { email, role });
    if (answer.status !== 200) throw new Error(answer.text);
    return tokenIn((await app.mailTo(email)).at(-1));
  }
  const roleOf = async (accountId: string) =>
    (await app.db.selectFrom('membership').select('role').where('household_id', '=', householdId).where('account_id', '=', accountId).executeTakeFirst())?.role;
  const accept = (token: string, newAccount?: object, browser = app.browser()) => browser.ask('post', '/api/invitations/acceptance', { token, newAccount });
  const newcomer = { name: 'Grace', password: testPassword };

  it('is mailed, and says to its holder where to, by whom and as what', async () => {
    const email = stranger();
    const token = await invite(email, 'tuner');
    const mail = (await app.mailTo(email)).at(-1)!;
    expect(mail.subject).toBe('Test person invites you to Lark House');
    expect(mail.text).toContain('as a tuner');
    expect((await app.browser().ask('post', '/api/invitations/reading', { token })).body).toEqual({
      householdName: 'Lark House',
      invitedBy: 'Test person',
      role: 'tuner',
      email,
      hasAccount: false,
    });
    const listed = (await owner.browser.ask('get', at)).body.invitations.find((invitation: { email: string }) => invitation.email === email);
    expect(listed).toMatchObject({ role: 'tuner', invitedBy: 'Test person' });
    expect((Date.parse(listed.expiresAt) - Date.now()) / 86_400_000).toBeCloseTo(7, 1);
  });

  it('makes an account for someone new, signed in, in that household alone', async () => {
    const email = stranger();
    const browser = app.browser();
    const answer = await accept(await invite(email), newcomer, browser);
    expect(answer.status).toBe(200);
    expect(answer.body.householdId).toBe(householdId);
    expect(answer.body.account).toMatchObject({ email, name: 'Grace', memberships: [{ householdId, role: 'designer' }] });
    expect((await browser.ask('get', '/api/me')).body.account.email).toBe(email);
    expect((await browser.ask('patch', '/api/me', { name: 'Grace H.' })).status).toBe(200);
    await expect(app.signIn(email)).resolves.toBeDefined();
  });

  it('adds a household to the account of someone signed in', async () => {
    const guest = await app.signedIn('owner');
    const token = await invite(guest.email, 'viewer');
    expect((await app.browser().ask('post', '/api/invitations/reading', { token })).body.hasAccount).toBe(true);
    const answer = await accept(token, undefined, guest.browser);
    expect(answer.status).toBe(200);
    expect(answer.body.account.memberships).toHaveLength(2);
    expect(await roleOf(guest.id)).toBe('viewer');
  });

  it('asks the holder of an account to sign in, and stays good until they have', async () => {
    const guest = await app.account();
    const token = await invite(guest.email);
    expect((await accept(token)).body.code).toBe('signed-out');
    expect((await accept(token, newcomer)).body.code).toBe('has-account');
    expect((await accept(token, undefined, await app.signIn(guest.email))).status).toBe(200);
    expect(await roleOf(guest.id)).toBe('designer');
  });

  it('security: is for its address alone', async () => {
    const thief = await app.signedIn(null);
    const token = await invite(stranger(), 'owner');
    const answer = await accept(token, undefined, thief.browser);
    expect(answer.status).toBe(409);
    expect(answer.body.code).toBe('other-address');
    expect((await accept(token, newcomer, thief.browser)).body.code).toBe('other-address');
    expect(await roleOf(thief.id)).toBeUndefined();
    expect((await accept(token, newcomer)).status).toBe(200);
  });

  it('security: works once, also when used twice at the same moment', async () => {
    const token = await invite(stranger());
    const answers = await Promise.all([accept(token, newcomer), accept(token, newcomer)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 410]);
    expect((await app.browser().ask('post', '/api/invitations/reading', { token })).status).toBe(410);
  });

  it('security: expires after seven days', async () => {
    const email = stranger();
    const token = await invite(email);
    await app.db.updateTable('invitation').set({ expires_at: new Date(Date.now() - 1000) }).where('email', '=', email).execute();
    expect((await accept(token, newcomer)).status).toBe(410);
    expect((await owner.browser.ask('get', at)).body.invitations.map((invitation: { email: string }) => invitation.email)).not.toContain(email);
  });

  it('replaces the one before when the address is invited again', async () => {
    const email = stranger();
    const first = await invite(email, 'owner');
    const second = await invite(email, 'viewer');
    expect((await accept(first, newcomer)).status).toBe(410);
    const answer = await accept(second, newcomer);
    expect(answer.body.account.memberships[0].role).toBe('viewer');
  });

  it('is worth nothing once withdrawn', async () => {
    const email = stranger();
    const token = await invite(email);
    const { invitations } = (await owner.browser.ask('get', at)).body;
    const { id } = invitations.find((invitation: { email: string }) => invitation.email === email);
    const left = (await owner.browser.ask('delete', `${at}/${id}`)).body.invitations;
    expect(left.map((invitation: { email: string }) => invitation.email)).not.toContain(email);
    expect((await accept(token, newcomer)).status).toBe(410);
  });

  it('is refused for a member, and takes no role from one who became a member meanwhile', async () => {
    const member = await app.signedIn('tuner', householdId);
    const refused = await owner.browser.ask('post', at, { email: member.email, role: 'viewer' });
    expect({ status: refused.status, code: refused.body.code }).toEqual({ status: 409, code: 'already-member' });

    const guest = await app.signedIn(null);
    const token = await invite(guest.email, 'viewer');
    await app.db.insertInto('membership').values({ household_id: householdId, account_id: guest.id, role: 'owner' }).execute();
    expect((await accept(token, undefined, guest.browser)).status).toBe(200);
    expect(await roleOf(guest.id)).toBe('owner');
  });

  it('security: a made-up token costs no password work and tells nothing', async () => {
    passwords.taken();
    const answer = await accept('A'.repeat(43), newcomer);
    expect(passwords.taken()).toEqual({ hashes: 0, comparisons: 0 });
    expect(answer.status).toBe(410);
    expect(answer.body.code).toBe('link-spent');
  });
});
