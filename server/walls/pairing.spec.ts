import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { PairingCode } from '@oriel/shared/contracts/wall-pairing';
import type { Wall } from '@oriel/shared/contracts/walls';
import { hashOfToken } from '../http/secret-token';
import { usualLimits } from '../http/limits';
import type { Browser } from '../testing/browser';
import { createTestApp, type SignedIn, type TestApp } from '../testing/test-app';
import { forgetExpiredPairings } from './pairing';

let app: TestApp;
let householdId: string;
let tuner: SignedIn;
beforeAll(async () => {
  app = await createTestApp();
  householdId = (await app.household()).id;
  tuner = await app.signedIn('tuner', householdId);
});
afterAll(() => app.close());

const create = async (): Promise<Wall> =>
  (await tuner.browser.ask('post', `/api/households/${householdId}/walls`, { name: 'A wall' })).body.wall;
const read = async (id: string): Promise<Wall> => (await tuner.browser.ask('get', `/api/walls/${id}`)).body.wall;
const ask = async (screen: Browser): Promise<{ code: string; claim: string; expiresAt: string }> => {
  const answer = await screen.ask('post', '/api/pairings');
  expect(answer.status, answer.text).toBe(200);
  return answer.body;
};
const claim = (screen: Browser, secret: string) => screen.ask('post', '/api/pairings/claims', { claim: secret });
const enter = (wallId: string, code: string, who = tuner) =>
  who.browser.ask('post', `/api/walls/${wallId}/pairing`, { code });
const shows = (screen: Browser) => screen.ask('get', '/api/wall');
const pair = async (wallId: string): Promise<Browser> => {
  const screen = app.browser();
  const { code, claim: secret } = await ask(screen);
  expect((await enter(wallId, code)).status).toBe(200);
  expect((await claim(screen, secret)).body).toEqual({ state: 'paired' });
  return screen;
};
const letExpire = (secret: string) =>
  app.db
    .updateTable('pairing')
    .set({ expires_at: new Date(Date.now() - 1000) })
    .where('claim_hash', '=', hashOfToken(secret))
    .execute();

describe('pairing', () => {
  it('goes from a code on the screen to a credential that shows the wall', async () => {
    const wall = await create();
    const screen = app.browser();
    const { code, claim: secret, expiresAt } = await ask(screen);
    expect(PairingCode.parse(code)).toBe(code);
    expect(Date.parse(expiresAt) - Date.now()).toBeGreaterThan(9.9 * 60_000);
    expect(Date.parse(expiresAt) - Date.now()).toBeLessThanOrEqual(10 * 60_000);
    expect((await claim(screen, secret)).body).toEqual({ state: 'waiting' });
    expect((await shows(screen)).body.code).toBe('not-paired');

    const typed = `${code.slice(0, 3)} ${code.slice(3)}`.toLowerCase();
    const entered = await enter(wall.id, typed);
    expect(entered.body.wall).toMatchObject({ id: wall.id, pairedAt: null });
    expect((await claim(screen, secret)).body).toEqual({ state: 'paired' });
    expect((await shows(screen)).body).toMatchObject({ wallId: wall.id, setUp: wall.setUp, revision: 1, scene: null });
    const { pairedAt, heardAt } = await read(wall.id);
    expect(Date.now() - Date.parse(pairedAt!)).toBeLessThan(10_000);
    expect(Date.parse(heardAt!)).toBeGreaterThanOrEqual(Date.parse(pairedAt!));
  });

  it('keeps the credential from scripts and other sites, for a year, renewed whenever the screen asks', async () => {
    const screen = await pair((await create()).id);
    const [cookie] = (await shows(screen)).get('Set-Cookie')!.filter((line) => line.startsWith('oriel-wall='));
    for (const attribute of ['HttpOnly', 'SameSite=Strict', 'Path=/', 'Max-Age=31536000'])
      expect(cookie).toContain(attribute);
  });

  it('over https nails the credential to the host', async () => {
    const secure = await createTestApp({
      beside: app,
      environment: { PUBLIC_URL: 'https://oriel.example', HTTPS: 'self', TRUST_PROXY: '1' },
    });
    const wall = await create();
    const over = { 'X-Forwarded-Proto': 'https' };
    const agent = secure.browser().agent;
    const first = await agent.get('/api/me').set(over);
    const token = /XSRF-TOKEN=([^;]+)/.exec(first.get('Set-Cookie')!.join())![1];
    const post = (path: string, body: object) =>
      secure
        .browser()
        .agent.post(path)
        .set({ ...over, Cookie: `XSRF-TOKEN=${token}`, 'X-XSRF-TOKEN': token })
        .send(body);
    const { code, claim: secret } = (await post('/api/pairings', {})).body;
    await enter(wall.id, code);
    const claimed = await post('/api/pairings/claims', { claim: secret });
    expect(claimed.body, claimed.text).toEqual({ state: 'paired' });
    const cookie = claimed.get('Set-Cookie')!.find((line) => line.startsWith('__Host-oriel-wall='))!;
    expect(cookie).toMatch(/Secure/);
    expect(cookie).not.toMatch(/Domain/);
    await secure.close();
  });

  it('is over after ten minutes, whether or not the code was entered in time', async () => {
    const wall = await create();
    const screen = app.browser();
    const late = await ask(screen);
    await letExpire(late.claim);
    const answer = await enter(wall.id, late.code);
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ code: 'code-unknown', fields: { code: expect.any(String) } });
    expect((await claim(screen, late.claim)).body).toEqual({ state: 'expired' });

    const unclaimed = await ask(screen);
    await enter(wall.id, unclaimed.code);
    await letExpire(unclaimed.claim);
    expect((await claim(screen, unclaimed.claim)).body).toEqual({ state: 'expired' });
    await forgetExpiredPairings(app.db);
    const left = await app.db.selectFrom('pairing').select('code').where('expires_at', '<', new Date()).execute();
    expect(left).toEqual([]);
  });

  it('leaves the screen time to claim a code that was entered at the last moment', async () => {
    const wall = await create();
    const screen = app.browser();
    const { code, claim: secret } = await ask(screen);
    await app.db
      .updateTable('pairing')
      .set({ expires_at: new Date(Date.now() + 500) })
      .where('code', '=', code)
      .execute();
    expect((await enter(wall.id, code)).status).toBe(200);
    await new Promise((resolve) => setTimeout(resolve, 600));
    expect((await claim(screen, secret)).body).toEqual({ state: 'paired' });
  });

  it('again replaces the screen, which stays in until the new one is', async () => {
    const wall = await create();
    const [first, second] = [await pair(wall.id), app.browser()];
    const { code, claim: secret } = await ask(second);
    await enter(wall.id, code);
    expect((await shows(first)).status).toBe(200);
    await claim(second, secret);
    expect((await shows(first)).body.code).toBe('not-paired');
    expect((await shows(second)).body.wallId).toBe(wall.id);
  });

  it('of two screens whose codes were entered for one wall counts the last', async () => {
    const wall = await create();
    const [a, b] = [app.browser(), app.browser()];
    const [first, second] = [await ask(a), await ask(b)];
    await enter(wall.id, first.code);
    await enter(wall.id, second.code);
    expect((await claim(a, first.claim)).body).toEqual({ state: 'expired' });
    expect((await claim(b, second.claim)).body).toEqual({ state: 'paired' });
  });
});

describe('security: the credential of a screen', () => {
  it('is handed out once: the same claim again brings nothing', async () => {
    const wall = await create();
    const [screen, thief] = [app.browser(), app.browser()];
    const { code, claim: secret } = await ask(screen);
    await enter(wall.id, code);
    const both = await Promise.all([claim(screen, secret), claim(thief, secret)]);
    expect(both.map(({ body }) => body.state).sort()).toEqual(['expired', 'paired']);
    const again = await claim(app.browser(), secret);
    expect(again.body).toEqual({ state: 'expired' });
    expect(again.get('Set-Cookie')?.some((line) => line.startsWith('oriel-wall')) ?? false).toBe(false);
  });

  it('ends at once when the wall is unpaired or removed, and what was entered but not claimed with it', async () => {
    const wall = await create();
    const screen = await pair(wall.id);
    const answer = await tuner.browser.ask('delete', `/api/walls/${wall.id}/pairing`);
    expect(answer.body.wall).toMatchObject({ pairedAt: null, heardAt: null, report: null });
    expect((await shows(screen)).body.code).toBe('not-paired');

    const next = app.browser();
    const { code, claim: secret } = await ask(next);
    await enter(wall.id, code);
    await tuner.browser.ask('delete', `/api/walls/${wall.id}/pairing`);
    expect((await claim(next, secret)).body).toEqual({ state: 'expired' });

    const last = await pair(wall.id);
    await tuner.browser.ask('delete', `/api/walls/${wall.id}`);
    expect((await shows(last)).body.code).toBe('not-paired');
  });

  it('is kept as a hash only, as the claim is, and never logged', async () => {
    const wall = await create();
    const screen = app.browser();
    const { code, claim: secret } = await ask(screen);
    const { claim_hash } = await app.db
      .selectFrom('pairing')
      .select('claim_hash')
      .where('code', '=', code)
      .executeTakeFirstOrThrow();
    expect(claim_hash.equals(hashOfToken(secret))).toBe(true);
    await enter(wall.id, code);
    await claim(screen, secret);
    const credential = screen.cookie('oriel-wall')!;
    expect(Buffer.from(credential, 'base64url')).toHaveLength(32);
    const row = await app.db.selectFrom('wall').selectAll().where('id', '=', wall.id).executeTakeFirstOrThrow();
    expect(row.credential_hash!.equals(hashOfToken(credential))).toBe(true);
    expect(JSON.stringify(row)).not.toContain(credential);
    for (const hidden of [credential, secret]) expect(app.log()).not.toContain(hidden);
  });

  it('opens nothing but its own wall, and does not sign its holder in', async () => {
    const [mine, other] = [await create(), await create()];
    const screen = await pair(mine.id);
    expect((await screen.ask('get', '/api/me')).body.account).toBeNull();
    for (const path of [
      `/api/walls/${mine.id}`,
      `/api/walls/${other.id}`,
      `/api/households/${householdId}/walls`,
      `/api/households/${householdId}/photos`,
    ])
      expect((await screen.ask('get', path)).body.code).toBe('signed-out');
    expect((await shows(screen)).body.wallId).toBe(mine.id);
  });

  it.each(['', 'x', 'a'.repeat(43), `' or 1=1 --`, '%00'])('cannot be made up: %j', async (made) => {
    await pair((await create()).id);
    const answer = await app.browser().agent.get('/api/wall').set('Cookie', `oriel-wall=${made}`);
    expect([answer.status, answer.body.code]).toEqual([401, 'not-paired']);
  });

  it('lets nobody report from another site: the proof is bound to the credential', async () => {
    const wall = await create();
    const screen = await pair(wall.id);
    const stranger = app.browser();
    await stranger.ask('get', '/api/me');
    const report = {
      at: new Date().toISOString(),
      framesPerS: 1,
      trackedPerS: 1,
      ladderStep: 0,
      ladderWords: '',
      renderer: '',
      tracking: '',
      latencyMs: null,
      temperatureC: null,
      lastError: null,
    };
    const credential = `oriel-wall=${screen.cookie('oriel-wall')!}`;
    const send = (headers: Record<string, string>) =>
      app
        .browser()
        .agent.post('/api/wall/reports')
        .set(headers)
        .send({ reports: [report] });
    const token = stranger.cookie('XSRF-TOKEN')!;
    expect((await send({ Cookie: credential })).body.code).toBe('stale-page');
    expect((await send({ Cookie: `${credential}; XSRF-TOKEN=${token}`, 'X-XSRF-TOKEN': token })).body.code).toBe(
      'stale-page',
    );
    expect((await read(wall.id)).report).toBeNull();
    expect((await screen.ask('post', '/api/wall/reports', { reports: [report] })).status).toBe(200);
    expect(
      (await screen.prepare('post', '/api/wall/reports', { reports: [report] }).set('Sec-Fetch-Site', 'cross-site'))
        .body.code,
    ).toBe('other-site');
  });

  it('goes on working when somebody signs in and out on the same screen', async () => {
    const wall = await create();
    const screen = await pair(wall.id);
    const report = {
      at: new Date().toISOString(),
      framesPerS: 1,
      trackedPerS: 1,
      ladderStep: 0,
      ladderWords: '',
      renderer: '',
      tracking: '',
      latencyMs: null,
      temperatureC: null,
      lastError: null,
    };
    const send = () => screen.ask('post', '/api/wall/reports', { reports: [report] });
    await screen.ask('post', '/api/session', { email: tuner.email, password: 'plaster ink brass' });
    expect((await send()).status).toBe(200);
    await screen.ask('delete', '/api/session');
    expect((await send()).status).toBe(200);
    expect((await screen.ask('get', '/api/me')).body.account).toBeNull();
  });
});

describe('security: a code', () => {
  it('of a screen is nobody else’s once it was entered', async () => {
    const [mine, theirs] = [await create(), await create()];
    const screen = app.browser();
    const { code, claim: secret } = await ask(screen);
    expect((await enter(mine.id, code)).status).toBe(200);
    expect((await enter(theirs.id, code)).body.code).toBe('code-unknown');
    expect((await enter(mine.id, code)).status).toBe(200);
    await claim(screen, secret);
    expect((await shows(screen)).body.wallId).toBe(mine.id);
    expect((await enter(mine.id, code)).body.code).toBe('code-unknown');
  });

  it('cannot be guessed at length, whatever else is sent along, nor asked for or claimed without end', async () => {
    const limits = {
      ...usualLimits,
      codesTriedByAccount: { tries: 3, windowMs: 60_000 },
      codesAskedByAddress: { tries: 4, windowMs: 60_000 },
      claimsByAddress: { tries: 5, windowMs: 60_000 },
    };
    const limited = await createTestApp({ beside: app, limits });
    const guesser = await app.signedIn('tuner', householdId);
    const wall = await create();
    const on = await limited.signIn(guesser.email);
    const guess = (code: string, more = {}) => on.ask('post', `/api/walls/${wall.id}/pairing`, { code, ...more });
    for (let i = 0; i < 3; i++) expect((await guess('ABC234', { email: `x${i}@example.org` })).status).toBe(422);
    const { code } = await ask(app.browser());
    const refused = await guess(code, { email: 'new@example.org' });
    expect([refused.status, refused.body.code]).toEqual([429, 'too-many-tries']);

    // What the other server of this database was asked counts too.
    await app.db.deleteFrom('tries').execute();
    const screen = limited.browser();
    const asked = [];
    for (let i = 0; i < 5; i++) asked.push((await screen.ask('post', '/api/pairings')).status);
    expect(asked).toEqual([200, 200, 200, 200, 429]);
    const claims = [];
    for (let i = 0; i < 6; i++) claims.push((await claim(screen, 'x'.repeat(43))).status);
    expect(claims).toEqual([200, 200, 200, 200, 200, 429]);
    await limited.close();
  });

  it('allows what honest screens do: a claim every two seconds from four screens behind one address', () => {
    const { claimsByAddress, codesAskedByAddress } = usualLimits;
    expect((claimsByAddress.tries / claimsByAddress.windowMs) * 2000).toBeGreaterThan(4);
    expect((codesAskedByAddress.tries / codesAskedByAddress.windowMs) * 600_000).toBeGreaterThan(4);
  });
});
