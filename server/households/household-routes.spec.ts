import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Member } from '@oriel/shared/contracts/households';
import { createTestApp, type SignedIn, type TestApp } from '../testing/test-app';

describe('a household', () => {
  let app: TestApp;
  beforeAll(async () => void (app = await createTestApp()));
  afterAll(() => app.close());

  /** A household whose one owner is signed in. */
  async function owned(): Promise<SignedIn & { householdId: string; at: string }> {
    const owner = await app.signedIn(null);
    const { body } = await owner.browser.ask('post', '/api/households', { name: 'Lark House' });
    return { ...owner, householdId: body.household.id, at: `/api/households/${body.household.id}` };
  }
  const roles = (members: Member[]) => Object.fromEntries(members.map(({ accountId, role }) => [accountId, role]));

  it('is made with its maker as owner, renamed and read', async () => {
    const { browser, id, email, at } = await owned();
    expect((await browser.ask('patch', at, { name: 'Wren House' })).status).toBe(200);
    const { household } = (await browser.ask('get', at)).body;
    expect(household.name).toBe('Wren House');
    expect(household.members).toEqual([{ accountId: id, name: 'Test person', email, role: 'owner', joinedAt: expect.any(String) }]);
    expect((await browser.ask('get', '/api/me')).body.account.memberships[0].householdName).toBe('Wren House');
  });

  it('has roles that an owner changes, at once for the next request', async () => {
    const { browser, householdId, at } = await owned();
    const other = await app.signedIn('viewer', householdId);
    expect((await other.browser.ask('patch', at, { name: 'Mine' })).status).toBe(403);
    const changed = await browser.ask('patch', `${at}/members/${other.id}`, { role: 'owner' });
    expect(roles(changed.body.household.members)[other.id]).toBe('owner');
    expect((await other.browser.ask('patch', at, { name: 'Mine' })).status).toBe(200);
  });

  it('loses a member who is removed or leaves, at once', async () => {
    const { browser, householdId, at } = await owned();
    const [removed, leaving] = [await app.signedIn('designer', householdId), await app.signedIn('viewer', householdId)];
    expect((await browser.ask('delete', `${at}/members/${removed.id}`)).status).toBe(200);
    expect((await removed.browser.ask('get', at)).status).toBe(404);
    expect((await leaving.browser.ask('delete', `${at}/membership`)).status).toBe(200);
    expect((await leaving.browser.ask('get', at)).status).toBe(404);
    expect((await browser.ask('get', at)).body.household.members).toHaveLength(1);
  });

  it('keeps its last owner, whichever way they would go, and says why', async () => {
    const { browser, id, householdId, at } = await owned();
    await app.signedIn('designer', householdId);
    const refusals = [
      await browser.ask('delete', `${at}/membership`),
      await browser.ask('delete', `${at}/members/${id}`),
      await browser.ask('patch', `${at}/members/${id}`, { role: 'viewer' }),
    ];
    for (const { status, body } of refusals) expect({ status, code: body.code }).toEqual({ status: 409, code: 'last-owner' });
    expect((await browser.ask('patch', `${at}/members/${id}`, { role: 'owner' })).status).toBe(200);
    expect(roles((await browser.ask('get', at)).body.household.members)[id]).toBe('owner');
  });

  it('security: keeps one owner when its two owners go at the same moment', async () => {
    for (let round = 0; round < 10; round++) {
      const { browser, householdId, at } = await owned();
      const other = await app.signedIn('owner', householdId);
      const answers = await Promise.all([browser.ask('delete', `${at}/membership`), other.browser.ask('delete', `${at}/membership`)]);
      expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    }
  });

  it("security: an owner reaches no member of another household, nor another household's invitation", async () => {
    const [mine, theirs] = [await owned(), await owned()];
    const member = await app.signedIn('viewer', theirs.householdId);
    expect((await mine.browser.ask('patch', `${mine.at}/members/${member.id}`, { role: 'owner' })).status).toBe(404);
    expect((await mine.browser.ask('delete', `${mine.at}/members/${member.id}`)).status).toBe(404);
    const invited = await theirs.browser.ask('post', `${theirs.at}/invitations`, { email: 'guest@example.org', role: 'viewer' });
    await mine.browser.ask('delete', `${mine.at}/invitations/${invited.body.invitations[0].id}`);
    expect((await theirs.browser.ask('get', `${theirs.at}/invitations`)).body.invitations).toHaveLength(1);
  });
});
