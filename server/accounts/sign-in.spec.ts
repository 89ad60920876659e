import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, testPassword, type TestApp } from '../testing/test-app';

describe('signing in and out', () => {
  let app: TestApp;
  beforeAll(async () => void (app = await createTestApp()));
  afterAll(() => app.close());

  it('signs in, says who is there, and signs out without a reload in between', async () => {
    const { email, id } = await app.account('Ada');
    const browser = app.browser();
    expect((await browser.ask('get', '/api/me')).body).toEqual({ account: null, mailPage: null });

    const answer = await browser.ask('post', '/api/session', { email: ` ${email.toUpperCase()} `, password: testPassword });
    expect(answer.status).toBe(200);
    expect(answer.body.account).toEqual({ id, email, name: 'Ada', memberships: [] });
    expect((await browser.ask('get', '/api/me')).body.account.id).toBe(id);

    expect((await browser.ask('delete', '/api/session')).status).toBe(200);
    expect((await browser.ask('get', '/api/me')).body.account).toBeNull();
    expect((await browser.ask('post', '/api/session', { email, password: testPassword })).status).toBe(200);
  });

  it('writes no session for a stranger', async () => {
    const before = await app.db.selectFrom('session').select('sid').execute();
    const answer = await app.browser().ask('get', '/api/me');
    expect(await app.db.selectFrom('session').select('sid').execute()).toHaveLength(before.length);
    expect(answer.get('Set-Cookie')).toEqual([expect.stringMatching(/^XSRF-TOKEN=/)]);
  });

  it('signs out everywhere', async () => {
    const { email } = await app.account();
    const [here, there] = [await app.signIn(email), await app.signIn(email)];
    expect((await here.ask('delete', '/api/sessions')).status).toBe(200);
    expect((await here.ask('get', '/api/me')).body.account).toBeNull();
    expect((await there.ask('get', '/api/me')).body.account).toBeNull();
  });
});
