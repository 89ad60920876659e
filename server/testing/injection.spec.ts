import { sql } from 'kysely';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, testPassword, type SignedIn, type TestApp } from './test-app';
import { tokenIn } from './token-in';

/** What breaks careless programs: in SQL, in patterns, in JSON paths, in templates, in HTML, in headers, in shells and in paths. */
const harmless = [
  `'; drop table account; --`,
  `" or "1"="1`,
  `Robert'); delete from household; --`,
  `$1 $$ :name ? {0}`,
  `100% _under_ \\ back\\slash`,
  `{{7*7}} \${7*7} <%= 7*7 %>`,
  `<script>alert(1)</script>`,
  `"><img src=x onerror=alert(1)>`,
  `../../etc/passwd`,
  `$(id); \`id\` | id`,
  `=cmd|'/c calc'!A1`,
  `__proto__`,
  `ω 窓 🪟 \u202Egnp.exe`,
];
/** What no name may hold, or no database can. */
const refused = ['a\0b', 'a\ud800b', 'a\r\nBcc: everyone@example.org', 'a\u001b[2Jb'];

describe('security: hostile text', () => {
  let app: TestApp;
  let owner: SignedIn;
  let householdId: string;
  beforeAll(async () => {
    app = await createTestApp();
    householdId = (await app.household('Lark House')).id;
    owner = await app.signedIn('owner', householdId);
  });
  afterAll(async () => {
    const { rows } = await sql<{ count: string }>`select count(*) from account`.execute(app.db);
    expect(Number(rows[0].count)).toBeGreaterThan(1);
    await app.close();
  });

  const at = () => `/api/households/${householdId}`;

  it.each(harmless)('is kept as it is in the names of people and households, and in mail: %s', async (text) => {
    expect((await owner.browser.ask('patch', '/api/me', { name: text })).body.account.name).toBe(text);
    expect((await owner.browser.ask('patch', at(), { name: text })).body.household.name).toBe(text);
    const made = await owner.browser.ask('post', '/api/households', { name: text });
    expect(made.body.household.name).toBe(text);

    const email = `guest${harmless.indexOf(text)}@example.org`;
    await owner.browser.ask('post', `${at()}/invitations`, { email, role: 'viewer' });
    const [mail] = await app.mailTo(email);
    expect(mail.subject).toBe(`${text} invites you to ${text}`);
    expect(mail.html).not.toMatch(/<script|<img/);
    const token = tokenIn(mail);
    expect((await app.browser().ask('post', '/api/invitations/reading', { token })).body.householdName).toBe(text);

    const guest = await app.browser().ask('post', '/api/invitations/acceptance', { token, newAccount: { name: text, password: testPassword } });
    expect(guest.body.account.name).toBe(text);
  });

  it.each(harmless)('finds nothing and breaks nothing in a search, an address or a cursor: %s', async (text) => {
    const query = encodeURIComponent(text);
    const found = await owner.browser.ask('get', `${at()}/photos?search=${query}`);
    expect(found.status).toBe(200);
    expect(found.body.photos).toEqual([]);
    expect((await owner.browser.ask('get', `${at()}/photos?after=${query}`)).status).toBeLessThan(500);
    for (const path of [`/api/households/${query}`, `/api/photos/${query}`, `/api/scenes/${query}`]) expect((await owner.browser.ask('get', path)).status).toBe(404);
  });

  it.each(harmless)('is an ordinary password: %s', async (text) => {
    const { email } = await app.account();
    const password = `${text} and more`;
    const browser = await app.signIn(email);
    expect((await browser.ask('put', '/api/me/password', { current: testPassword, next: password })).status).toBe(200);
    expect((await app.browser().ask('post', '/api/session', { email, password })).status).toBe(200);
  });

  it.each(harmless)('signs nobody in as an address or a token: %s', async (text) => {
    const stranger = app.browser();
    expect((await stranger.ask('post', '/api/session', { email: text, password: text })).status).toBe(400);
    expect((await stranger.ask('post', '/api/session', { email: owner.email, password: text })).status).toBe(422);
    const token = text.padEnd(45, ' ').slice(0, 60);
    const holder = { name: 'A', password: testPassword, householdName: 'B' };
    for (const path of ['/api/accounts/confirmations', '/api/invitations/reading']) expect((await stranger.ask('post', path, { token, ...holder })).status).toBe(410);
  });

  it.each(refused)('that cannot be kept, or makes two lines of one, is refused in plain words: %j', async (text) => {
    const name = await owner.browser.ask('patch', '/api/me', { name: text });
    expect(name.status).toBe(400);
    expect(name.body).toMatchObject({ code: 'not-understood', remedy: expect.any(String) });
    expect((await owner.browser.ask('patch', at(), { name: text })).status).toBe(400);
    const searched = await owner.browser.ask('get', `${at()}/photos?search=${text.includes('\ud800') ? '%ED%A0%80' : encodeURIComponent(text)}`);
    expect(searched.status).toBeLessThan(500);
  });

  it('of the wrong shape is refused: objects for strings, lists, too much, no JSON', async () => {
    for (const body of [{ name: { $gt: '' } }, { name: ['a'] }, { name: 7 }, {}, { name: null }])
      expect((await owner.browser.ask('patch', '/api/me', body)).status).toBe(400);
    const raw = (text: string) => owner.browser.prepare('patch', '/api/me').set('Content-Type', 'application/json').send(text);
    expect((await raw('{"name":')).status).toBe(400);
    expect((await raw('null')).status).toBe(400);
    expect((await raw(JSON.stringify({ name: 'x'.repeat(2_000_000) }))).status).toBe(413);
    expect((await raw('{"name":"A","__proto__":{"isAdmin":true}}')).status).toBe(200);
    expect(({} as { isAdmin?: boolean }).isAdmin).toBeUndefined();
  });

  it('in the body of a form is not taken for JSON', async () => {
    const answer = await owner.browser.prepare('patch', '/api/me').type('form').send('name=Mallory');
    expect(answer.status).toBe(400);
  });
});
