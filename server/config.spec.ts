import { describe, expect, it } from 'vitest';
import { readConfig } from './config';

const least = { DATABASE_URL: 'postgres://oriel@localhost/oriel', SESSION_SECRET: 's'.repeat(32), STORAGE_DIR: '/s', WEB_DIR: '/w', ASSETS_DIR: '/a' };

describe('settings', () => {
  it('need little, and stay on this machine unless told otherwise', () => {
    expect(readConfig(least)).toMatchObject({ port: 4300, host: '127.0.0.1', publicUrl: 'http://localhost:4300', smtpUrl: null, https: 'off', trustProxy: 0, mailPage: 'local' });
  });

  it('give an https address with a certificate of our own, and drop the last stroke of a given one', () => {
    expect(readConfig({ ...least, HTTPS: 'self', PORT: '8443' }).publicUrl).toBe('https://localhost:8443');
    expect(readConfig({ ...least, PUBLIC_URL: 'https://oriel.example.org/' }).publicUrl).toBe('https://oriel.example.org');
  });

  it('that are empty count as left out', () => {
    expect(readConfig({ ...least, SMTP_URL: '', PORT: '' })).toMatchObject({ smtpUrl: null, port: 4300 });
  });

  it('that are wrong are all named at once, with what they should be', () => {
    const wrong = () => readConfig({ ...least, PORT: 'x', SESSION_SECRET: 'short', DATABASE_URL: 'mysql://x', SMTP_URL: 'http://x', PUBLIC_URL: 'nowhere' });
    for (const name of ['PORT', 'SESSION_SECRET', 'DATABASE_URL', 'SMTP_URL', 'PUBLIC_URL', '.env.example']) expect(wrong).toThrow(name);
    expect(wrong).toThrow('must look like postgres://');
  });

  it('that are missing are named as missing', () => {
    expect(() => readConfig({})).toThrow(/DATABASE_URL: is missing\n {2}SESSION_SECRET: is missing/);
  });

  it('security: a wrong setting is not repeated in the message, for it may be a secret', () => {
    expect(() => readConfig({ ...least, SESSION_SECRET: 'hush', DATABASE_URL: 'mysql://me:hush@x' })).not.toThrow(/hush/);
  });
});
