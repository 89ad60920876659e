import { randomUUID } from 'node:crypto';
import { join } from 'node:path';
import type { SceneDocument } from '@oriel/shared/contracts/scenes';
import { placeTrimmedIn } from '@oriel/shared/projection/cover-glass';
import { accountByEmail, createAccount } from '../accounts/account-store';
import type { Database } from '../database/database';
import { once } from '../database/once';
import { addMember, createHousehold } from '../households/household-store';
import type { Parts } from '../parts';
import { photoService } from '../photos/photo-service';
import { sceneService, type SceneService } from '../scenes/scene-service';
import type { Storage } from '../storage/storage';
import { bringIn } from './bring-in';
import { readDemoFiles, type DemoAccount, type DemoFiles, type DemoScene } from './demo-files';
import { hangDemoWall } from './demo-wall';

const householdName = 'The Aldermoor house';

type Members = ReadonlyMap<DemoAccount['role'], string>;

/**
 * Loads a household of our own invention, once in the life of the database, through the same services that people's uploads go through.
 * What its people then change or throw away stays changed. Cut off halfway, the next start begins where it ended.
 */
export async function loadDemo(parts: Parts): Promise<void> {
  const { config, connection } = parts;
  const folder = join(config.assetsDir, 'demo');
  const files = await readDemoFiles(folder);
  await once(connection.db, 'demo loaded', () => loadHousehold(parts, folder, files));
  await once(connection.db, 'demo wall loaded', () => hangDemoWall(connection.db, householdName, files.accounts));
}

async function loadHousehold(
  { connection: { db }, storage, jobs, layerFiles, passwords, log }: Parts,
  folder: string,
  files: DemoFiles,
): Promise<void> {
  const members = await demoMembers(db, files.accounts, passwords.hash);
  const householdId = await demoHousehold(db, members);
  const asker = { householdId, accountId: members.get('designer') ?? members.get('owner')! };
  const photos = photoService(db, storage, jobs);
  for (const path of files.photos) await bringIn(storage, path, (file) => photos.receive(file, asker));

  const scenes = sceneService(db, storage, layerFiles);
  const known = await sceneNames(db, householdId);
  for (const scene of [...files.scenes].reverse())
    if (!known.has(scene.name)) await scenes.add(await documentOf(scene, folder, householdId, scenes, storage), asker);
  log.info({ photos: files.photos.length, scenes: files.scenes.length }, 'the demo household is loaded');
}

/** Binned ones too. */
async function sceneNames(db: Database, householdId: string): Promise<Set<string>> {
  const rows = await db.selectFrom('scene').select('document').where('household_id', '=', householdId).execute();
  return new Set(rows.map(({ document }) => document.name));
}

async function demoMembers(
  db: Database,
  accounts: readonly DemoAccount[],
  hash: (password: string) => Promise<string>,
): Promise<Members> {
  const members = new Map<DemoAccount['role'], string>();
  for (const { name, email, password, role } of accounts) {
    const known = (await accountByEmail(db, email))?.id;
    const id = known ?? (await createAccount(db, { name, email, passwordHash: await hash(password) }));
    if (id) members.set(role, id);
  }
  return members;
}

async function demoHousehold(db: Database, members: Members): Promise<string> {
  const ownerId = members.get('owner')!;
  const known = await db
    .selectFrom('household')
    .innerJoin('membership', 'membership.household_id', 'household.id')
    .select('household.id')
    .where('household.name', '=', householdName)
    .where('membership.account_id', '=', ownerId)
    .executeTakeFirst();
  const householdId = known?.id ?? (await createHousehold(db, householdName, ownerId));
  for (const [role, accountId] of members) await addMember(db, householdId, accountId, role);
  return householdId;
}

async function documentOf(
  { layers, ...scene }: DemoScene,
  folder: string,
  householdId: string,
  scenes: SceneService,
  storage: Storage,
): Promise<SceneDocument> {
  const document: SceneDocument = { ...scene, layers: [] };
  for (const { file, placed, ...layer } of layers) {
    const { image } = await bringIn(storage, join(folder, file), (received) =>
      scenes.imageFromFile(householdId, received),
    );
    document.layers.push({ ...layer, id: randomUUID(), image, placed: placeTrimmedIn(placed, image) });
  }
  return document;
}
