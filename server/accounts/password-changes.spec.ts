import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, testPassword, type TestApp } from '../testing/test-app';
import { tokenIn } from '../testing/token-in';

const next = 'cornice and sill';

describe('changing the password', () => {
  let app: TestApp;
  beforeAll(async () => void (app = await createTestApp()));
  afterAll(() => app.close());

  const signInStatus = async (email: string, password: string) => (await app.browser().ask('post', '/api/session', { email, password })).status;
  const askReset = async (email: string) => {
    await app.browser().ask('post', '/api/password-resets', { email });
    return tokenIn((await app.mailTo(email)).at(-1));
  };
  const redeem = (token: string, password = next) => app.browser().ask('post', '/api/password-resets/redemptions', { token, password });

  it('replaces it, keeps this browser and signs out the others', async () => {
    const { email } = await app.account();
    const [here, there] = [await app.signIn(email), await app.signIn(email)];
    expect((await here.ask('put', '/api/me/password', { current: testPassword, next })).status).toBe(200);
    expect((await here.ask('get', '/api/me')).body.account.email).toBe(email);
    expect((await there.ask('get', '/api/me')).body.account).toBeNull();
    expect(await signInStatus(email, testPassword)).toBe(422);
    expect(await signInStatus(email, next)).toBe(200);
    expect((await app.mailTo(email)).at(-1)?.subject).toBe('Your password was changed');
  });

  it('security: asks for the present one, and changes nothing without it', async () => {
    const { email, browser } = await app.signedIn(null);
    const answer = await browser.ask('put', '/api/me/password', { current: 'not this one', next });
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ code: 'wrong-password', fields: { current: expect.any(String) } });
    expect(await signInStatus(email, testPassword)).toBe(200);
  });

  it('sets a new one by mail and signs out everywhere', async () => {
    const { email } = await app.account();
    const browser = await app.signIn(email);
    expect((await redeem(await askReset(email))).status).toBe(200);
    expect((await browser.ask('get', '/api/me')).body.account).toBeNull();
    expect(await signInStatus(email, testPassword)).toBe(422);
    expect(await signInStatus(email, next)).toBe(200);
  });

  it('leaves a signed-in browser that redeems the link able to go on', async () => {
    const { email, browser } = await app.signedIn(null);
    const token = await askReset(email);
    expect((await browser.ask('post', '/api/password-resets/redemptions', { token, password: next })).status).toBe(200);
    expect((await browser.ask('post', '/api/session', { email, password: next })).status).toBe(200);
  });

  it('security: a reset works once, also when used twice at the same moment', async () => {
    const { email } = await app.account();
    const token = await askReset(email);
    const answers = await Promise.all([redeem(token, 'first of the two'), redeem(token, 'second of the two')]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 410]);
    expect((await redeem(token)).status).toBe(410);
  });

  it('security: a reset spends every other link of that account', async () => {
    const { email } = await app.account();
    const [earlier, later] = [await askReset(email), await askReset(email)];
    expect((await redeem(later)).status).toBe(200);
    expect((await redeem(earlier, 'another one yet')).status).toBe(410);
    expect(await signInStatus(email, next)).toBe(200);
  });

  it('security: a reset expires after an hour', async () => {
    const { email, id } = await app.account();
    const token = await askReset(email);
    const kept = app.db.selectFrom('password_reset').select('expires_at').where('account_id', '=', id);
    expect(((await kept.executeTakeFirstOrThrow()).expires_at.getTime() - Date.now()) / 60_000).toBeCloseTo(60, 0);
    await app.db.updateTable('password_reset').set({ expires_at: new Date(Date.now() - 1000) }).where('account_id', '=', id).execute();
    expect((await redeem(token)).status).toBe(410);
    expect(await signInStatus(email, testPassword)).toBe(200);
  });

  it('security: asking tells nobody whether an address is known, and mails nobody who is not', async () => {
    const { email } = await app.account();
    const known = await app.browser().ask('post', '/api/password-resets', { email });
    const unknown = await app.browser().ask('post', '/api/password-resets', { email: 'nobody@example.org' });
    expect(known.status).toBe(202);
    expect(unknown.status).toBe(known.status);
    expect(unknown.body).toEqual(known.body);
    expect(await app.mailTo('nobody@example.org')).toEqual([]);
  });
});
