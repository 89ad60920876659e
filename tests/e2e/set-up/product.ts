import { randomBytes } from 'node:crypto';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pg from 'pg';
import { buildProduct, productBuilt } from '../../../scripts/build/product.mjs';
import { freePort } from '../../../scripts/free-port.mjs';
import { startPostgres } from '../../../scripts/postgres.mjs';
import { inProject } from '../../../scripts/project.mjs';
import { startServer } from '../../../scripts/start/server.mjs';

/** The built product, demo and all, on a free port with a database and a storage folder of its own. */
export interface Product {
  readonly url: string;
  /** Its own database and folder of files, for tests that put more into it than can be sent. */
  readonly databaseUrl: string;
  readonly storageDir: string;
  /** Ends the server as a power cut would. */
  kill(): Promise<void>;
  /** Starts it again, on the same port and with the same data. */
  restart(): Promise<void>;
  /** Stops everything and leaves nothing behind. */
  stop(): Promise<void>;
}

/** Builds the product where its sources have changed, and starts it. */
export async function startProduct(): Promise<Product> {
  if (!productBuilt()) await buildProduct();

  const given = process.env['TEST_DATABASE_URL'];
  const postgres = given
    ? { url: given, stop: () => Promise.resolve() }
    : await startPostgres({ dataDir: inProject('.oriel', 'test-postgres'), durable: false });
  const database = `oriel_e2e_${randomBytes(6).toString('hex')}`;
  await asAdmin(postgres.url, `create database ${database}`);
  const databaseUrl = new URL(postgres.url);
  databaseUrl.pathname = `/${database}`;

  const storage = await mkdtemp(join(tmpdir(), 'oriel-e2e-'));
  const port = await freePort();
  const clean = async () => {
    await asAdmin(postgres.url, `drop database ${database} with (force)`);
    await postgres.stop();
    await rm(storage, { recursive: true, force: true });
  };
  const settings = {
    ...process.env,
    NODE_ENV: 'production',
    PORT: String(port),
    HOST: '127.0.0.1',
    HTTPS: 'off',
    DATABASE_URL: databaseUrl.href,
    SESSION_SECRET: randomBytes(48).toString('base64url'),
    STORAGE_DIR: storage,
    WEB_DIR: inProject('dist', 'web'),
    ASSETS_DIR: inProject('assets'),
    DEMO: 'on',
    PUBLIC_URL: '',
    SMTP_URL: '',
  };
  const start = () => startServer({ settings, logFile: inProject('.oriel', 'e2e-server.log') });
  let server = await start().catch(async (error: unknown) => {
    await clean();
    throw error;
  });
  return {
    url: `http://localhost:${port}`,
    databaseUrl: databaseUrl.href,
    storageDir: storage,
    kill: async () => void (await server.kill()),
    restart: async () => {
      server = await start();
    },
    stop: async () => {
      await server.stop();
      await clean();
    },
  };
}

async function asAdmin(url: string, statement: string): Promise<void> {
  const admin = new pg.Client({ connectionString: url });
  await admin.connect();
  await admin.query(statement).finally(() => admin.end());
}
