import { sql, type Selectable } from 'kysely';
import type { Photo } from '@oriel/shared/contracts/photos';
import type { Database } from '../database/database';
import { saverOf } from '../database/revisions';
import type { Tables } from '../database/tables';
import { notFound } from '../http/failure';
import type { Cursor } from './cursor';
import { periodNamed } from './date-search';

export type PhotoRow = Selectable<Tables['photo']> & { uploader: string | null };

const photosOf = (db: Database, householdId: string) =>
  db
    .selectFrom('photo')
    .leftJoin('account', 'account.id', 'photo.uploaded_by')
    .selectAll('photo')
    .select('account.name as uploader')
    .where('photo.household_id', '=', householdId);

export const toPhoto = (row: PhotoRow): Photo => ({
  id: row.id,
  name: row.name,
  width: row.width,
  height: row.height,
  bytes: Number(row.bytes),
  mime: row.mime,
  hasAlpha: row.has_alpha,
  takenAt: row.taken_at.toISOString(),
  uploadedAt: row.uploaded_at.toISOString(),
  uploadedBy: saverOf({ saver: row.uploader }),
  state: row.state,
  problem: row.problem,
  placeholder: row.placeholder,
  binnedAt: row.binned_at?.toISOString() ?? null,
});

export interface PhotoFilter {
  readonly householdId: string;
  readonly bin: boolean;
  /** Part of the name, or a year or month. */
  readonly search: string;
}

const escapeLike = (text: string) => text.replace(/[\\%_]/g, (character) => `\\${character}`);

function filtered(db: Database, { householdId, bin, search }: PhotoFilter) {
  const query = photosOf(db, householdId).where('photo.binned_at', bin ? 'is not' : 'is', null);
  if (!search) return query;
  const period = periodNamed(search);
  return query.where((where) =>
    where.or([
      where('photo.name', 'ilike', `%${escapeLike(search)}%`),
      ...(period
        ? [where.and([where('photo.taken_at', '>=', period.from), where('photo.taken_at', '<', period.to)])]
        : []),
    ]),
  );
}

/** A page of photos, newest taken first, ties by id: a keyset, so that a page costs the same at any depth. */
export function pageOfPhotos(
  db: Database,
  filter: PhotoFilter,
  after: Cursor | null,
  limit: number,
): Promise<PhotoRow[]> {
  const page = filtered(db, filter).orderBy('photo.taken_at', 'desc').orderBy('photo.id', 'desc').limit(limit);
  if (!after) return page.execute();
  return page.where(sql<boolean>`(photo.taken_at, photo.id) < (${after.takenAt}, ${after.id}::uuid)`).execute();
}

export async function countPhotos(db: Database, filter: PhotoFilter): Promise<number> {
  const row = await filtered(db, filter)
    .clearSelect()
    .select((select) => select.fn.countAll<string>().as('count'))
    .executeTakeFirstOrThrow();
  return Number(row.count);
}

export const findPhotos = (db: Database, householdId: string, ids: readonly string[]): Promise<PhotoRow[]> =>
  photosOf(db, householdId).where('photo.id', 'in', ids).execute();

/** @throws not-found (404). */
export async function readPhoto(db: Database, householdId: string, photoId: string): Promise<PhotoRow> {
  const [row] = await findPhotos(db, householdId, [photoId]);
  if (!row) throw notFound();
  return row;
}

export const findPhotoByContent = (db: Database, householdId: string, sha256: string): Promise<PhotoRow | undefined> =>
  photosOf(db, householdId).where('photo.sha256', '=', sha256).executeTakeFirst();
