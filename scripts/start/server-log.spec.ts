import { expect, test } from 'vitest';
import { whatWentWrong } from './server-log.mjs';

const started = '{"level":30,"msg":"serving"}\n';

test('the last fatal entry, with its cause', () => {
  const log = `${started}{"level":50,"msg":"earlier"}\n{"level":60,"err":{"message":"connect ECONNREFUSED 127.0.0.1:1"},"msg":"could not start"}\n`;
  expect(whatWentWrong(log)).toBe('could not start: connect ECONNREFUSED 127.0.0.1:1');
});

test('an error nobody caught, all its lines and not the stack', () => {
  const log = `${started}/oriel/dist/server/main.js:12\n    throw new Error(x);\n    ^\n\nError: Oriel cannot start with these settings:\n  SMTP_URL: must look like smtp://host\nSee .env.example.\n    at readConfig (main.ts:1:1)\n`;
  expect(whatWentWrong(log)).toBe(
    'Oriel cannot start with these settings:\n  SMTP_URL: must look like smtp://host\nSee .env.example.',
  );
});

test('else the last lines', () => expect(whatWentWrong('one\ntwo')).toContain('one\ntwo'));
