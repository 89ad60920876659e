import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, testPassword, type TestApp } from '../testing/test-app';

describe('proof that our own page asks', () => {
  let app: TestApp;
  beforeAll(async () => void (app = await createTestApp()));
  afterAll(() => app.close());

  const rename = { name: 'Renamed' };
  const nameOf = async (id: string) => (await app.db.selectFrom('account').select('name').where('id', '=', id).executeTakeFirstOrThrow()).name;

  it('security: without the header nothing is changed', async () => {
    const { browser, id } = await app.signedIn(null);
    const answer = await browser.agent.patch('/api/me').send(rename);
    expect(answer.status).toBe(403);
    expect(answer.body.code).toBe('stale-page');
    expect(await nameOf(id)).toBe('Test person');
  });

  it('security: a made-up token fails even when cookie and header agree', async () => {
    const { browser, id } = await app.signedIn(null);
    const forged = 'nonce.signature';
    const session = browser.cookie('oriel')!;
    const answer = await app
      .browser()
      .agent.patch('/api/me')
      .set({ Cookie: `oriel=${session}; XSRF-TOKEN=${forged}`, 'X-XSRF-TOKEN': forged })
      .send(rename);
    expect(answer.status).toBe(403);
    expect(await nameOf(id)).toBe('Test person');
  });

  it("security: the token of another session fails, and so does a stranger's", async () => {
    const [victim, attacker] = [await app.signedIn(null), await app.signedIn(null)];
    const stranger = app.browser();
    await stranger.ask('get', '/api/me');
    for (const token of [attacker.browser.cookie('XSRF-TOKEN')!, stranger.cookie('XSRF-TOKEN')!]) {
      const answer = await app
        .browser()
        .agent.patch('/api/me')
        .set({ Cookie: `oriel=${victim.browser.cookie('oriel')!}; XSRF-TOKEN=${token}`, 'X-XSRF-TOKEN': token })
        .send(rename);
      expect(answer.status).toBe(403);
    }
    expect(await nameOf(victim.id)).toBe('Test person');
  });

  it('security: the token from before a sign-in is worth nothing after it', async () => {
    const { email, id } = await app.account();
    const browser = app.browser();
    await browser.ask('get', '/api/me');
    const before = browser.cookie('XSRF-TOKEN')!;
    await browser.ask('post', '/api/session', { email, password: testPassword });
    expect(browser.cookie('XSRF-TOKEN')).not.toBe(before);
    expect((await browser.agent.patch('/api/me').set('X-XSRF-TOKEN', before).send(rename)).status).toBe(403);
    expect(await nameOf(id)).toBe('Test person');
  });

  it('hands out a fresh token with the refusal, so that trying again works', async () => {
    const { browser, id } = await app.signedIn(null);
    browser.agent.jar.setCookie('XSRF-TOKEN=stale; path=/', '127.0.0.1');
    expect((await browser.ask('patch', '/api/me', rename)).status).toBe(403);
    expect((await browser.ask('patch', '/api/me', rename)).status).toBe(200);
    expect(await nameOf(id)).toBe('Renamed');
  });

  it.each(['cross-site', 'same-site'])('security: a browser that calls the request %s is refused, token or not', async (site) => {
    const { browser } = await app.signedIn(null);
    const answer = await browser.prepare('patch', '/api/me', rename).set('Sec-Fetch-Site', site);
    expect(answer.status).toBe(403);
    expect(answer.body.code).toBe('other-site');
    expect((await browser.prepare('patch', '/api/me', rename).set('Sec-Fetch-Site', 'same-origin')).status).toBe(200);
  });

  it('security: only asking needs no proof', async () => {
    const { browser } = await app.signedIn(null);
    expect((await browser.agent.get('/api/me')).status).toBe(200);
    expect((await browser.agent.delete('/api/session')).status).toBe(403);
    expect((await browser.agent.put('/api/me/password').send({})).status).toBe(403);
  });
});
