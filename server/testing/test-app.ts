import { mkdtemp, rm, writeFile, mkdir } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Writable } from 'node:stream';
import type { Express } from 'express';
import { pino } from 'pino';
import type { Role } from '@oriel/shared/contracts/role';
import type { Route } from '@oriel/shared/contracts/route';
import { createAccount } from '../accounts/account-store';
import { createPasswords } from '../accounts/passwords';
import { createApp } from '../app';
import { readConfig } from '../config';
import { connect, type Database } from '../database/database';
import { listenForChanges } from '../events/changes';
import { addMember, createHousehold } from '../households/household-store';
import { usualLimits, type LimitSettings } from '../http/limits';
import { startJobs } from '../jobs/jobs';
import { createMailer, type Mail, type Mailer } from '../mail/mailer';
import { assemble, type Chosen, type Given, type Parts } from '../parts';
import { folderStorage } from '../storage/folder-storage';
import { startWork } from '../work';
import { Browser } from './browser';
import { createTestDatabase, type TestDatabase } from './test-database';

export const testPassword = 'plaster ink brass';

export interface TestAccount {
  readonly id: string;
  readonly email: string;
}
export interface SignedIn extends TestAccount {
  readonly browser: Browser;
}

export interface TestApp {
  readonly express: Express;
  readonly mounted: readonly Route[];
  readonly db: Database;
  readonly parts: Parts;
  /** What was logged, one JSON object a line. */
  log(): string;
  /** Every mail sent so far to an address, the newest last. */
  mailTo(email: string): Promise<readonly Mail[]>;
  browser(): Browser;
  /** A new account with testPassword, in no household. */
  account(name?: string): Promise<TestAccount>;
  /** A new household and its owner. */
  household(name?: string): Promise<{ readonly id: string; readonly ownerId: string }>;
  signIn(email: string): Promise<Browser>;
  /** A new account with that role in the household (null: in none), signed in. */
  signedIn(role: Role | null, householdId?: string): Promise<SignedIn>;
  close(): Promise<void>;
}

const manyTries = { tries: 10_000, windowMs: 60_000 };
const noLimits = Object.fromEntries(
  Object.keys(usualLimits).map((name) => [name, manyTries]),
) as unknown as LimitSettings;

interface Different extends Partial<Given>, Chosen {
  readonly environment?: Record<string, string>;
  /** Another server on the database and the storage folder of that one, which is to be closed after it. */
  readonly beside?: TestApp;
}

function sharedDatabase({ parts: { config } }: TestApp): TestDatabase {
  const connection = connect(config.databaseUrl, () => undefined);
  return { url: config.databaseUrl, connection, drop: () => connection.db.destroy() };
}

/** The whole server on a database, a storage folder and a mailbox of its own. Only the password cost and the limits are lower than in earnest. */
export async function createTestApp({ environment, beside, ...given }: Different = {}): Promise<TestApp> {
  const database = beside ? sharedDatabase(beside) : await createTestDatabase();
  const { db } = database.connection;
  const folder = await mkdtemp(join(tmpdir(), 'oriel-test-'));
  await mkdir(join(folder, 'web'));
  await writeFile(join(folder, 'web', 'index.html'), '<!doctype html><title>Oriel</title>');

  const logged: string[] = [];
  const log = pino(
    { level: 'debug' },
    new Writable({ write: (chunk, _encoding, done) => (logged.push(String(chunk)), done()) }),
  );
  const mails: Mail[] = [];
  const mailer: Mailer = createMailer((mail) => Promise.resolve(void mails.push(mail)), log);
  const config = readConfig({
    DATABASE_URL: database.url,
    SESSION_SECRET: 'a secret for tests, longer than thirty-two characters',
    STORAGE_DIR: beside?.parts.config.storageDir ?? join(folder, 'storage'),
    WEB_DIR: join(folder, 'web'),
    ASSETS_DIR: 'assets',
    ...environment,
  });
  const jobs = await startJobs(database.url, log);
  const changes = await listenForChanges(database.url, log);
  const parts = assemble({
    config,
    connection: database.connection,
    log,
    storage: await folderStorage(config.storageDir),
    jobs,
    changes,
    mailer,
    mailPage: null,
    draining: () => false,
    passwords: createPasswords(4),
    limits: noLimits,
    ...given,
  });
  await startWork(parts);
  const app = createApp(parts);

  return {
    ...app,
    db,
    parts,
    log: () => logged.join(''),
    mailTo: async (email) => {
      await parts.mailer.settled();
      return mails.filter((mail) => mail.to === email);
    },
    ...people(app.express, parts),
    close: async () => {
      await parts.mailer.settled();
      parts.eventStreams.endAll();
      await changes.stop();
      await jobs.stop();
      await parts.layerFiles.settled();
      await database.drop();
      await rm(folder, { recursive: true, force: true });
    },
  };
}

/** Makes accounts, households and their members, and signs them in. */
function people(express: Express, { connection: { db }, passwords }: Parts): Pick<TestApp, 'browser' | 'account' | 'household' | 'signIn' | 'signedIn'> {
  let made = 0;
  const browser = () => new Browser(express);
  const account = async (name = 'Test person'): Promise<TestAccount> => {
    const email = `person${++made}@example.org`;
    const id = await createAccount(db, { email, name, passwordHash: await passwords.hash(testPassword) });
    return { id: id!, email };
  };
  const household = async (name = 'Test household') => {
    const ownerId = (await account('Owner')).id;
    return { id: await createHousehold(db, name, ownerId), ownerId };
  };
  const signIn = async (email: string) => {
    const own = browser();
    const answer = await own.ask('post', '/api/session', { email, password: testPassword });
    if (answer.status !== 200) throw new Error(`could not sign in: ${answer.text}`);
    return own;
  };
  const signedIn = async (role: Role | null, householdId?: string): Promise<SignedIn> => {
    const person = await account();
    if (role) await addMember(db, householdId ?? (await household()).id, person.id, role);
    return { ...person, browser: await signIn(person.email) };
  };
  return { browser, account, household, signIn, signedIn };
}
