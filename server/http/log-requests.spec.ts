import { Writable } from 'node:stream';
import { pino } from 'pino';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { createTestApp, testPassword, type TestApp } from '../testing/test-app';
import { tokenIn } from '../testing/token-in';
import { plainError } from './log-requests';

describe('the log', () => {
  let app: TestApp;
  beforeAll(async () => void (app = await createTestApp()));
  afterAll(() => app.close());

  it('says method, path, status and a reference that the failure carries too', async () => {
    const answer = await app.browser().ask('get', '/api/households/none?search=secret');
    const lineOf = (reference: string) =>
      app
        .log()
        .split('\n')
        .map((text) => (text ? (JSON.parse(text) as { req?: object; res?: object }) : {}))
        .find(({ req }) => req && 'id' in req && req.id === reference);
    // The line is written once the answer is out, which may be after it has arrived.
    await vi.waitFor(() =>
      expect(lineOf(answer.body.reference)).toMatchObject({ req: { method: 'GET', path: '/api/households/none' }, res: { status: 401 } }),
    );
  });

  it('security: holds no password, token, cookie, query or mailed link, even at its most talkative', async () => {
    const secrets = new Set<string>([testPassword, 'cornice and sill']);
    const browser = app.browser();
    await browser.ask('post', '/api/accounts', { email: 'ada@example.org' });
    const token = tokenIn((await app.mailTo('ada@example.org')).at(-1));
    secrets.add(token);
    await browser.ask('post', '/api/accounts/confirmations', { token, name: 'Ada', password: testPassword, householdName: 'Lark House' });
    secrets.add(browser.cookie('oriel')!).add(browser.cookie('XSRF-TOKEN')!);
    await browser.ask('put', '/api/me/password', { current: testPassword, next: 'cornice and sill' });
    await browser.ask('post', '/api/password-resets', { email: 'ada@example.org' });
    const reset = tokenIn((await app.mailTo('ada@example.org')).at(-1));
    secrets.add(reset);
    await browser.ask('post', '/api/password-resets/redemptions', { token: `${reset}x`, password: 'cornice and sill' });
    await browser.ask('get', '/api/me?token=query-secret');
    secrets.add('query-secret');
    await browser.ask('post', '/api/session', { email: 'ada@example.org', password: 'cornice and sill' });
    secrets.add(browser.cookie('oriel')!);

    const log = app.log();
    expect(log.split('\n').length).toBeGreaterThan(8);
    for (const secret of secrets) {
      expect(log).not.toContain(secret);
      expect(log).not.toContain(encodeURIComponent(secret));
      expect(log).not.toContain(decodeURIComponent(secret));
    }
  });

  it('security: an error of the database is logged without the row it quotes', async () => {
    const lines: string[] = [];
    const log = pino({ serializers: { err: plainError } }, new Writable({ write: (chunk, _encoding, done) => (lines.push(String(chunk)), done()) }));
    const error = await app.db
      .insertInto('account')
      .values({ email: 'x@example.org', name: null as never, password_hash: '$2b$secret-hash' })
      .execute()
      .catch((thrown: unknown) => thrown);
    expect((error as { detail: string }).detail).toContain('secret-hash');
    log.error({ err: error }, 'unexpected failure');
    expect(lines.join('')).toContain('null value in column');
    expect(lines.join('')).not.toContain('secret-hash');
  });
});
