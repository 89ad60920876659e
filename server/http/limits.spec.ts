import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, testPassword, type TestApp } from '../testing/test-app';
import { usualLimits } from './limits';

const windowMs = 15 * 60_000;

describe('limits', () => {
  let app: TestApp;
  beforeAll(async () => {
    app = await createTestApp({
      environment: { TRUST_PROXY: '1' },
      limits: {
        ...usualLimits,
        passwordsByAccount: { tries: 3, windowMs },
        passwordsByAddress: { tries: 8, windowMs },
        mailsByAccount: { tries: 2, windowMs },
        mailsByAddress: { tries: 5, windowMs },
      },
    });
  });
  afterAll(() => app.close());

  let hosts = 0;
  /** Asks from a network address of its own unless told otherwise. */
  async function from(path: string, body: object, host = `192.0.2.${++hosts}`) {
    const browser = app.browser();
    await browser.ask('get', '/api/me');
    return browser.prepare('post', path, body).set('X-Forwarded-For', host);
  }
  const signIn = (email: string, password: string, host?: string) => from('/api/session', { email, password }, host);

  it('security: passwords of one account can be tried so often, from wherever, however it is written', async () => {
    const { email } = await app.account();
    for (let i = 0; i < 3; i++) expect((await signIn(i % 2 ? email.toUpperCase() : ` ${email}`, 'wrong')).status).toBe(422);
    const refused = await signIn(email, testPassword);
    expect(refused.status).toBe(429);
    expect(refused.body).toMatchObject({ code: 'too-many-tries', remedy: 'Wait 15 minutes and try again.' });
    expect(Number(refused.get('Retry-After'))).toBeGreaterThan(windowMs / 1000 - 60);
    expect(Number(refused.get('Retry-After'))).toBeLessThanOrEqual(windowMs / 1000);
  });

  it('security: an address nobody has is limited alike', async () => {
    for (let i = 0; i < 3; i++) expect((await signIn('nobody@example.org', 'wrong')).status).toBe(422);
    expect((await signIn('nobody@example.org', 'wrong')).status).toBe(429);
  });

  it('security: one network address cannot try account after account', async () => {
    for (let i = 0; i < 8; i++) expect((await signIn(`guess${i}@example.org`, 'wrong', '198.51.100.9')).status).toBe(422);
    expect((await signIn('guess9@example.org', 'wrong', '198.51.100.9')).status).toBe(429);
    expect((await signIn('guess9@example.org', 'wrong', '198.51.100.10')).status).toBe(422);
  });

  it('does not count signing in with the right password', async () => {
    const { email } = await app.account();
    const counted = async () => Number((await app.db.selectFrom('tries').select(({ fn }) => fn.sum<string>('count').as('all')).executeTakeFirstOrThrow()).all);
    const before = await counted();
    for (let i = 0; i < 6; i++) {
      expect((await signIn(email, testPassword, '198.51.100.20')).status).toBe(200);
      // It is taken back once the answer is out.
      await expect.poll(counted, { timeout: 10_000 }).toBe(before);
    }
  });

  it('security: the present password cannot be guessed from a stolen session', async () => {
    const { browser } = await app.signedIn(null);
    // Naming an address, which the route does not ask for, starts no new count.
    const attempt = () => {
      const host = ++hosts;
      const guess = { current: 'wrong', next: 'cornice and sill', email: `x${host}@example.org` };
      return browser.prepare('put', '/api/me/password', guess).set('X-Forwarded-For', `192.0.2.${host}`);
    };
    for (let i = 0; i < 3; i++) expect((await attempt()).status).toBe(422);
    expect((await attempt()).status).toBe(429);
  });

  it("security: nobody's mailbox is flooded, by resets, sign-ups or both", async () => {
    const { email } = await app.account();
    const form = { email };
    expect((await from('/api/password-resets', { email })).status).toBe(202);
    expect((await from('/api/accounts', form)).status).toBe(202);
    expect((await from('/api/password-resets', { email })).status).toBe(429);
    expect((await from('/api/accounts', form)).status).toBe(429);
    expect(await app.mailTo(email)).toHaveLength(2);
  });

  it('security: one network address cannot send mail after mail', async () => {
    for (let i = 0; i < 5; i++) expect((await from('/api/password-resets', { email: `x${i}@example.org` }, '198.51.100.30')).status).toBe(202);
    expect((await from('/api/password-resets', { email: 'x9@example.org' }, '198.51.100.30')).status).toBe(429);
  });

  it('security: two servers on one database count together', async () => {
    const beside = await createTestApp({ beside: app, limits: { ...usualLimits, passwordsByAccount: { tries: 3, windowMs } } });
    const { email } = await app.account();
    for (let i = 0; i < 2; i++) expect((await signIn(email, 'wrong')).status).toBe(422);
    const browser = beside.browser();
    await browser.ask('get', '/api/me');
    const attempt = (password: string) => browser.ask('post', '/api/session', { email, password });
    expect((await attempt('wrong')).status).toBe(422);
    expect((await attempt(testPassword)).status).toBe(429);
    await beside.close();
  });

  it('security: a forged forwarding header does not help where the settings name no proxy', async () => {
    const direct = await createTestApp({ limits: { ...usualLimits, passwordsByAddress: { tries: 2, windowMs } } });
    const attempt = async (i: number) => {
      const browser = direct.browser();
      await browser.ask('get', '/api/me');
      return browser.prepare('post', '/api/session', { email: `y${i}@example.org`, password: 'wrong' }).set('X-Forwarded-For', `203.0.113.${i}`);
    };
    const statuses = [];
    for (let i = 0; i < 3; i++) statuses.push((await attempt(i)).status);
    await direct.close();
    expect(statuses).toEqual([422, 422, 429]);
  });
});
