import { createHash } from 'node:crypto';
import { link, mkdir, readdir } from 'node:fs/promises';
import { join } from 'node:path';
import pg from 'pg';
import type { Product } from '../../e2e/set-up/product';

const blockOf = 500;
const dayMs = 24 * 3600 * 1000;
const yearsBack = 20;

interface Original {
  readonly id: string;
  readonly sha256: string;
}

/**
 * Makes so many photos of the household of those in it: rows of their own with dates over twenty years, thicker on some days than on others,
 * and names of their own for the same derivative files.
 */
export async function fillHousehold({ databaseUrl, storageDir }: Product, names: string, count: number): Promise<void> {
  const database = new pg.Client({ connectionString: databaseUrl });
  await database.connect();
  try {
    const { rows } = await database.query<Original>('select id, sha256 from photo where name like $1 order by name', [names]);
    if (rows.length === 0) throw new Error('No photo to make others of.');
    for (let i = 0; i < count; i += blockOf) await fillBlock(database, storageDir, rows, i, Math.min(count, i + blockOf));
    await database.query('analyze photo');
  } finally {
    await database.end();
  }
}

async function fillBlock(database: pg.Client, storageDir: string, originals: readonly Original[], from: number, until: number): Promise<void> {
  const copies = Array.from({ length: until - from }, (_, k) => {
    const i = from + k;
    const original = originals[(i * 7) % originals.length];
    // Bursts: a hundred photos share a day, as on a journey.
    const day = Math.floor(i / 100) * 73 + (i % 3);
    const taken = new Date(Date.now() - (day % (yearsBack * 365)) * dayMs - (i % 100) * 300_000);
    return { original, sha256: createHash('sha256').update(`copy ${i}`).digest('hex'), name: `IMG_${String(i).padStart(5, '0')}.jpg`, taken };
  });
  for (const { original, sha256 } of copies) await linkDerivatives(storageDir, original.sha256, sha256);
  await database.query(
    `insert into photo (household_id, sha256, name, mime, bytes, width, height, has_alpha, taken_at, uploaded_by, state, placeholder)
     select household_id, copy.sha256, copy.name, mime, bytes, width, height, has_alpha, copy.taken, uploaded_by, state, placeholder
     from photo join unnest($1::uuid[], $2::text[], $3::text[], $4::timestamptz[]) as copy (original, sha256, name, taken) on photo.id = copy.original`,
    [copies.map(({ original }) => original.id), copies.map(({ sha256 }) => sha256), copies.map(({ name }) => name), copies.map(({ taken }) => taken)],
  );
}

async function linkDerivatives(storageDir: string, from: string, to: string): Promise<void> {
  const [source, target] = [from, to].map((sha256) => join(storageDir, 'derivatives', sha256));
  await mkdir(target, { recursive: true });
  for (const file of await readdir(source)) await link(join(source, file), join(target, file));
}
