import { pino } from 'pino';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, type TestApp } from '../testing/test-app';
import { startLocalSmtp, type LocalSmtp } from './local-smtp';
import { createMailPage } from './mail-page';
import { createMailer, smtpDelivery } from './mailer';

const log = pino({ level: 'silent' });

describe('mail on a machine without a mail server', () => {
  let smtp: LocalSmtp;
  let app: TestApp;
  beforeAll(async () => {
    smtp = await startLocalSmtp();
    const mailer = createMailer(smtpDelivery(smtp.url, 'Oriel <oriel@localhost>'), log);
    app = await createTestApp({ mailer, mailPage: createMailPage(smtp.messages, false) });
  });
  afterAll(async () => {
    await app.close();
    await smtp.close();
  });

  const page = (path: string, headers: Record<string, string> = {}) => app.browser().agent.get(path).set(headers);

  it('says what the page is for while there is none', async () => {
    expect((await page('/mail')).text).toContain('No mail yet');
  });

  it('travels over SMTP and is shown with links to follow', async () => {
    await app.browser().ask('post', '/api/accounts', { email: 'ada@example.org' });
    await app.parts.mailer.settled();
    const [message] = smtp.messages();
    expect(message).toMatchObject({ to: 'ada@example.org', from: 'Oriel <oriel@localhost>', subject: 'Confirm your address' });
    expect((await page('/mail')).text).toContain(`<a href="/mail/${message.id}">Confirm your address</a>`);
    const shown = (await page(`/mail/${message.id}`)).text;
    expect(shown).toMatch(/<a href="http:\/\/localhost:\d+\/confirm#[\w-]{43}">/);
    const set = await page(`/mail/${message.id}/set`);
    expect(set.text).toContain('Confirm and begin');
    expect(set.get('Content-Security-Policy')).toMatch(/sandbox/);
    expect(set.get('Content-Security-Policy')).toMatch(/default-src 'none'/);
  });

  it('says that a mail from before a restart is gone', async () => {
    const answer = await page('/mail/9999');
    expect(answer.status).toBe(404);
    expect(answer.text).toContain('This mail is gone');
  });

  it('tells the page where it is, but only to somebody at this machine', async () => {
    expect((await page('/api/me', { Host: 'localhost:4300' })).body.mailPage).toBe('/mail');
    expect((await page('/api/me', { Host: '192.168.1.20:4300' })).body.mailPage).toBeNull();
  });

  it.each([
    ['under a name that is not local (DNS rebinding)', { Host: 'evil.example' }],
    ['under an address of the network', { Host: '192.168.1.20:4300' }],
    ['through a proxy the settings do not name', { 'X-Forwarded-For': '192.168.1.30' }],
    ['through a proxy that claims to be local', { 'X-Forwarded-For': '127.0.0.1' }],
  ])('security: is not shown %s', async (_how, headers) => {
    for (const path of ['/mail', '/mail/1', '/mail/1/set']) expect((await page(path, headers)).status).toBe(404);
  });

  it('security: is not shown to another machine behind the named proxy', async () => {
    const behind = await createTestApp({ mailPage: createMailPage(smtp.messages, false), environment: { TRUST_PROXY: '1' } });
    const status = async (host: string) => (await behind.browser().agent.get('/mail').set({ 'X-Forwarded-For': host, Host: 'localhost' })).status;
    expect(await status('192.168.1.30')).toBe(404);
    expect(await status('127.0.0.1')).toBe(200);
    await behind.close();
  });

  it('security: shows hostile text as text', async () => {
    const mailer = createMailer(smtpDelivery(smtp.url, 'Oriel <oriel@localhost>'), log);
    mailer.send({ to: 'x@example.org', subject: '<script>alert(1)</script>', text: 'http://a"onmouseover="x <img src=x>', html: '<p>' });
    await mailer.settled();
    for (const path of ['/mail', `/mail/${smtp.messages()[0].id}`]) expect((await page(path)).text).not.toMatch(/<script|<img|"onmouseover/);
  });

  it('keeps the last 200', async () => {
    const mailer = createMailer(smtpDelivery(smtp.url, 'Oriel <oriel@localhost>'), log);
    for (let i = 0; i < 205; i++) {
      mailer.send({ to: 'x@example.org', subject: `Mail ${i}`, text: 'x', html: 'x' });
      if (i % 20 === 0) await mailer.settled();
    }
    await mailer.settled();
    expect(smtp.messages()).toHaveLength(200);
  });
});

describe('a mailer', () => {
  it('tries again, and gives up with a line in the log instead of failing the request', async () => {
    let tries = 0;
    const flaky = createMailer(() => (++tries < 3 ? Promise.reject(new Error('busy')) : Promise.resolve()), log, [1, 1]);
    flaky.send({ to: 'a@example.org', subject: 'A', text: 'a', html: 'a' });
    await flaky.settled();
    expect(tries).toBe(3);

    const logged: string[] = [];
    const dead = createMailer(() => Promise.reject(new Error('no such host')), pino({}, { write: (line: string) => logged.push(line) }), [1]);
    dead.send({ to: 'a@example.org', subject: 'A', text: 'a', html: 'a' });
    await dead.settled();
    expect(logged.join('')).toContain('a mail could not be sent');
  });
});
