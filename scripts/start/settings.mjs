import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { inProject, root, stateFolder } from '../project.mjs';

/**
 * The server's settings: the environment first, then .env, then what `npm start` puts in their place. DATABASE_URL is left out
 * where nobody set it. The server itself checks them all.
 * @returns {NodeJS.ProcessEnv}
 */
export function readSettings() {
  const envFile = inProject('.env');
  // Variables set already are kept; Node reads the file as dotenv does.
  if (existsSync(envFile)) process.loadEnvFile(envFile);
  const given = Object.fromEntries(Object.entries(process.env).filter(([, value]) => value !== ''));
  return {
    NODE_ENV: 'production',
    PORT: '4300',
    HOST: '127.0.0.1',
    HTTPS: 'off',
    TLS_DIR: inProject('.oriel', 'tls'),
    WEB_DIR: inProject('dist', 'web'),
    ASSETS_DIR: inProject('assets'),
    ...given,
    STORAGE_DIR: resolve(root, given.STORAGE_DIR ?? '.oriel/storage'),
    SESSION_SECRET: given.SESSION_SECRET ?? ownSecret(),
  };
}

/** Made once and kept for its owner alone, so that people stay signed in over a restart. */
function ownSecret() {
  const file = inProject('.oriel', 'session-secret');
  if (existsSync(file)) return readFileSync(file, 'utf8');
  mkdirSync(stateFolder, { recursive: true });
  const secret = randomBytes(48).toString('base64url');
  writeFileSync(file, secret, { mode: 0o600 });
  return secret;
}
