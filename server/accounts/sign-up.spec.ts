import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { countingPasswords } from '../testing/counting-passwords';
import { createTestApp, testPassword, type TestApp } from '../testing/test-app';
import { tokenIn } from '../testing/token-in';
import { createPasswords } from './passwords';

describe('signing up', () => {
  const passwords = countingPasswords(createPasswords(4));
  let app: TestApp;
  beforeAll(async () => void (app = await createTestApp({ passwords })));
  afterAll(() => app.close());

  const form = (email: string) => ({ email });
  const confirmation = (token: string) => ({ token, name: 'Ada', password: testPassword, householdName: 'Lark House' });
  const newest = async (email: string) => (await app.mailTo(email)).at(-1);

  it('opens a household by the mailed link, and is signed in', async () => {
    const browser = app.browser();
    expect((await browser.ask('post', '/api/accounts', form('ada@example.org'))).status).toBe(202);
    expect(await app.db.selectFrom('account').select('id').where('email', '=', 'ada@example.org').execute()).toEqual([]);

    const mail = await newest('ada@example.org');
    expect(mail?.subject).toBe('Confirm your address');
    expect(mail?.text).toContain(`${app.parts.config.publicUrl}/confirm#`);
    const answer = await browser.ask('post', '/api/accounts/confirmations', confirmation(tokenIn(mail)));
    expect(answer.status).toBe(200);
    expect(answer.body.account.memberships).toEqual([expect.objectContaining({ householdName: 'Lark House', role: 'owner' })]);
    expect((await browser.ask('get', '/api/me')).body.account.email).toBe('ada@example.org');
    expect((await browser.ask('patch', '/api/me', { name: 'Ada L.' })).status).toBe(200);
  });

  it('security: a confirmation works once', async () => {
    await app.browser().ask('post', '/api/accounts', form('once@example.org'));
    const token = tokenIn(await newest('once@example.org'));
    expect((await app.browser().ask('post', '/api/accounts/confirmations', confirmation(token))).status).toBe(200);
    const again = await app.browser().ask('post', '/api/accounts/confirmations', confirmation(token));
    expect(again.status).toBe(410);
    expect(again.body.code).toBe('link-spent');
  });

  it('security: two confirmations at the same moment make one account', async () => {
    await app.browser().ask('post', '/api/accounts', form('race@example.org'));
    await app.browser().ask('post', '/api/accounts', form('race@example.org'));
    const tokens = (await app.mailTo('race@example.org')).map(tokenIn);
    expect(tokens).toHaveLength(2);
    const answers = await Promise.all([...tokens, ...tokens].map((token) => app.browser().ask('post', '/api/accounts/confirmations', confirmation(token))));
    expect(answers.map(({ status }) => status).filter((status) => status === 200)).toHaveLength(1);
    expect(answers.every(({ status }) => [200, 409, 410].includes(status))).toBe(true);
    expect(await app.db.selectFrom('account').select('id').where('email', '=', 'race@example.org').execute()).toHaveLength(1);
    expect(await app.db.selectFrom('sign_up').select('email').where('email', '=', 'race@example.org').execute()).toHaveLength(0);
  });

  it('security: a confirmation expires after 24 hours', async () => {
    await app.browser().ask('post', '/api/accounts', form('late@example.org'));
    const { expires_at } = await app.db.selectFrom('sign_up').select('expires_at').where('email', '=', 'late@example.org').executeTakeFirstOrThrow();
    expect((expires_at.getTime() - Date.now()) / 3_600_000).toBeCloseTo(24, 1);
    await app.db.updateTable('sign_up').set({ expires_at: new Date(Date.now() - 1000) }).where('email', '=', 'late@example.org').execute();
    const answer = await app.browser().ask('post', '/api/accounts/confirmations', confirmation(tokenIn(await newest('late@example.org'))));
    expect(answer.status).toBe(410);
  });

  it('security: a known address gets the same answer for the same work, and its holder is told by mail', async () => {
    const { email, id } = await app.account();
    passwords.taken();
    const unknown = await app.browser().ask('post', '/api/accounts', form('stranger@example.org'));
    const workForUnknown = passwords.taken();
    const known = await app.browser().ask('post', '/api/accounts', form(email));
    expect(known.status).toBe(unknown.status);
    expect(known.body).toEqual(unknown.body);
    expect(passwords.taken()).toEqual(workForUnknown);
    expect(workForUnknown).toEqual({ hashes: 0, comparisons: 0 });
    const mail = await newest(email);
    expect(mail?.subject).toBe('You have an account already');
    expect(() => tokenIn(mail)).toThrow();
    const stored = await app.db.selectFrom('account').select('name').where('id', '=', id).executeTakeFirst();
    expect(stored?.name).toBe('Test person');
  });

  it('security: a made-up link costs no hashing', async () => {
    passwords.taken();
    const answer = await app.browser().ask('post', '/api/accounts/confirmations', confirmation('x'.repeat(43)));
    expect(answer.body.code).toBe('link-spent');
    expect(passwords.taken()).toEqual({ hashes: 0, comparisons: 0 });
  });

  it('security: the database does not keep the link', async () => {
    await app.browser().ask('post', '/api/accounts', form('kept@example.org'));
    const row = await app.db.selectFrom('sign_up').selectAll().where('email', '=', 'kept@example.org').executeTakeFirstOrThrow();
    const kept = JSON.stringify({ ...row, token_hash: row.token_hash.toString('base64url') });
    expect(kept).not.toContain(tokenIn(await newest('kept@example.org')));
  });

  it('says which field is wrong, in plain words', async () => {
    const asked = await app.browser().ask('post', '/api/accounts', { email: 'nowhere' });
    expect(asked.status).toBe(400);
    expect(asked.body.fields).toEqual({ email: 'Write an address like name@example.org' });
    await app.browser().ask('post', '/api/accounts', form('fields@example.org'));
    const token = tokenIn(await newest('fields@example.org'));
    const answer = await app.browser().ask('post', '/api/accounts/confirmations', { token, name: ' ', password: 'short', householdName: 'x'.repeat(121) });
    expect(answer.status).toBe(400);
    expect(answer.body.fields).toEqual({
      name: 'Give it a name',
      password: 'Use at least 10 characters',
      householdName: 'Use at most 120 characters',
    });
    expect((await app.browser().ask('post', '/api/accounts/confirmations', confirmation(token))).status, 'the link is not spent by a form that was not right').toBe(200);
  });
});
