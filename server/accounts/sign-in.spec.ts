import { sql } from 'kysely';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { countingPasswords } from '../testing/counting-passwords';
import { createTestApp, testPassword, type TestApp } from '../testing/test-app';
import { createPasswords } from './passwords';

describe('signing in and out', () => {
  const passwords = countingPasswords(createPasswords(4));
  let app: TestApp;
  beforeAll(async () => void (app = await createTestApp({ passwords })));
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

  it('renames', async () => {
    const { browser } = await app.signedIn(null);
    expect((await browser.ask('patch', '/api/me', { name: '  Grace  ' })).body.account.name).toBe('Grace');
    expect((await browser.ask('get', '/api/me')).body.account.name).toBe('Grace');
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

  it('security: a session ended while it asks for something stays ended', async () => {
    const { browser, id } = await app.signedIn(null);
    const ofAccount = sql`sess ->> 'accountId' = ${id}`;
    // Due to be renewed by the next request, which is held up by a lock until the session is gone.
    await sql`update session set sess = jsonb_set(sess::jsonb, '{renewedAt}', '0') where ${ofAccount}`.execute(app.db);
    const heldUp = async () =>
      (await sql`select from pg_stat_activity where datname = current_database() and wait_event_type = 'Lock'`.execute(app.db)).rows.length;
    const { asked } = await app.db.transaction().execute(async (holding) => {
      await sql`lock table membership in access exclusive mode`.execute(holding);
      const asked = Promise.resolve(browser.ask('get', '/api/me'));
      await expect.poll(heldUp, { timeout: 10_000 }).toBe(1);
      await sql`delete from session where ${ofAccount}`.execute(holding);
      return { asked };
    });
    expect((await asked).body.account.id).toBe(id);
    expect((await browser.ask('get', '/api/me')).body.account).toBeNull();
  });

  it('security: an unknown address and a wrong password get the same answer for the same work', async () => {
    const { email } = await app.account();
    passwords.taken();
    const wrong = await app.browser().ask('post', '/api/session', { email, password: 'not this one' });
    const workForWrong = passwords.taken();
    const unknown = await app.browser().ask('post', '/api/session', { email: 'nobody@example.org', password: 'not this one' });
    expect(wrong.status).toBe(422);
    expect(wrong.body.code).toBe('wrong-sign-in');
    expect(unknown.status).toBe(wrong.status);
    expect({ ...unknown.body, reference: '' }).toEqual({ ...wrong.body, reference: '' });
    expect(passwords.taken()).toEqual(workForWrong);
    expect(workForWrong).toEqual({ hashes: 0, comparisons: 1 });
  });

  it('security: a session id known before the sign-in is worth nothing after it (session fixation)', async () => {
    const { email } = await app.account();
    const browser = await app.signIn(email);
    const before = browser.cookie('oriel')!;
    await browser.ask('post', '/api/session', { email, password: testPassword });
    expect(browser.cookie('oriel')).not.toBe(before);

    const thief = app.browser();
    expect((await thief.agent.get('/api/me').set('Cookie', `oriel=${before}`)).body.account).toBeNull();
    // An id the attacker made up, unsigned, is not taken over either.
    const planted = app.browser();
    planted.agent.jar.setCookie('oriel=s%3Aplanted.signature; path=/', '127.0.0.1');
    await planted.ask('post', '/api/session', { email, password: testPassword });
    expect(planted.cookie('oriel')).not.toContain('planted');
  });

  it('security: a session that was signed out is gone from the server, not only from the browser', async () => {
    const { browser } = await app.signedIn(null);
    const cookie = browser.cookie('oriel')!;
    await browser.ask('delete', '/api/session');
    expect((await app.browser().agent.get('/api/me').set('Cookie', `oriel=${cookie}`)).body.account).toBeNull();
  });

  it('security: the session cookie is out of reach of scripts and other sites', async () => {
    const { email } = await app.account();
    const browser = app.browser();
    const answer = await browser.ask('post', '/api/session', { email, password: testPassword });
    const cookie = answer.get('Set-Cookie')!.find((set) => set.startsWith('oriel='))!;
    expect(cookie).toMatch(/; HttpOnly/);
    expect(cookie).toMatch(/; SameSite=Lax/);
    expect(cookie).toMatch(/; Path=\//);
    expect(cookie).not.toMatch(/Domain=/i);
    const days = (Date.parse(/Expires=([^;]+)/.exec(cookie)![1]) - Date.now()) / 86_400_000;
    expect(days).toBeGreaterThan(29);
    expect(days).toBeLessThan(31);
  });

  it('security: ends a session 180 days after its sign-in, and renews one in use once a day', async () => {
    const { browser, id } = await app.signedIn(null);
    const dayMs = 86_400_000;
    const age = async (signedInDays: number, renewedDays: number) => {
      const times = { signedInAt: Date.now() - signedInDays * dayMs, renewedAt: Date.now() - renewedDays * dayMs };
      await sql`update session set sess = sess || ${JSON.stringify(times)}::jsonb where sess ->> 'accountId' = ${id}`.execute(app.db);
    };

    await age(100, 0.5);
    expect((await browser.ask('get', '/api/me')).get('Set-Cookie')).toBeUndefined();
    await age(100, 2);
    expect((await browser.ask('get', '/api/me')).get('Set-Cookie')).toEqual([expect.stringMatching(/^oriel=.*Expires=/)]);
    await age(181, 0.5);
    expect((await browser.ask('get', '/api/me')).body.account).toBeNull();
  });
});

describe('over https', () => {
  let app: TestApp;
  beforeAll(async () => void (app = await createTestApp({ environment: { PUBLIC_URL: 'https://oriel.example.org', TRUST_PROXY: '1' } })));
  afterAll(() => app.close());

  it('security: cookies are kept to https and to this host', async () => {
    const { email } = await app.account();
    const agent = app.browser().agent;
    const first = await agent.get('/api/me').set('X-Forwarded-Proto', 'https');
    const xsrf = first.get('Set-Cookie')![0];
    expect(xsrf).toMatch(/^XSRF-TOKEN=.*; Secure/);
    const proof = /XSRF-TOKEN=([^;]+)/.exec(xsrf)![1];
    const answer = await agent
      .post('/api/session')
      .set({ 'X-Forwarded-Proto': 'https', 'X-XSRF-TOKEN': proof, Cookie: `XSRF-TOKEN=${proof}` })
      .send({ email, password: testPassword });
    expect(answer.status).toBe(200);
    expect(answer.get('Set-Cookie')).toContainEqual(expect.stringMatching(/^__Host-oriel=.*; Path=\/; .*HttpOnly; Secure; SameSite=Lax/));
    expect(answer.get('Strict-Transport-Security')).toMatch(/max-age=\d+/);
  });

  it('says so when a request comes over http, instead of losing the session in silence', async () => {
    const answer = await app.browser().ask('get', '/api/me');
    expect(answer.status).toBe(400);
    expect(answer.body).toMatchObject({ code: 'not-https', remedy: 'Open https://oriel.example.org.' });
  });
});
