import { existsSync, readFileSync } from 'node:fs';
import { networkInterfaces } from 'node:os';
import { join } from 'node:path';

/**
 * What `npm start` says once Oriel is ready: where it is, and who can sign in to try it.
 * @param {NodeJS.ProcessEnv} settings @param {string} elapsed
 */
export function greeting(settings, elapsed) {
  const scheme = settings.HTTPS === 'self' ? 'https' : 'http';
  const address = settings.PUBLIC_URL ?? `${scheme}://localhost:${settings.PORT}`;
  return [
    '',
    `  Oriel is ready, after ${elapsed}.`,
    '',
    `  ${address}`,
    ...elsewhere(settings, scheme),
    ...demoAccounts(settings),
    '',
    '  Ctrl-C stops it.',
    '',
  ].join('\n');
}

/** The addresses other machines can use, where the server listens to them at all. */
function elsewhere({ HOST, PORT }, scheme) {
  if (HOST !== '0.0.0.0' && HOST !== '::') return [];
  const own = Object.values(networkInterfaces())
    .flat()
    .filter(({ family, internal }) => family === 'IPv4' && !internal);
  const note = scheme === 'http' ? '   (no camera there: that needs HTTPS=self)' : '';
  return own.map(({ address }) => `  ${scheme}://${address}:${PORT}${note}`);
}

function demoAccounts({ DEMO, ASSETS_DIR }) {
  const file = join(ASSETS_DIR, 'demo', 'accounts.json');
  if (DEMO === 'off' || !existsSync(file)) return [];
  const accounts = JSON.parse(readFileSync(file, 'utf8'));
  const width = Math.max(...accounts.map(({ email }) => email.length));
  const onePassword = new Set(accounts.map(({ password }) => password)).size === 1;
  const line = ({ email, password, role }) =>
    `    ${email.padEnd(width)}   ${onePassword ? role : `${password}   ${role}`}`;
  const lead = onePassword
    ? `  To try it, sign in with the password “${accounts[0].password}” as`
    : '  To try it, sign in as';
  return ['', lead, ...accounts.map(line)];
}
