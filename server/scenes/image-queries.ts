import type { Selectable } from 'kysely';
import type { LayerImage } from '@oriel/shared/contracts/scenes';
import type { Database } from '../database/database';
import type { Tables } from '../database/tables';

export type ImageRow = Pick<Selectable<Tables['layer_image']>, 'id' | 'sha256' | 'width' | 'height' | 'trim'>;

const columns = ['id', 'sha256', 'width', 'height', 'trim'] as const;
const toImage = ({ id, width, height, trim }: ImageRow): LayerImage => ({ id, width, height, trim });

/** The household's image of this content, which now counts as used; null when it has none. */
export async function reuseImage(db: Database, householdId: string, sha256: string): Promise<LayerImage | null> {
  const row = await db
    .updateTable('layer_image')
    .set({ unused_since: null })
    .where('household_id', '=', householdId)
    .where('sha256', '=', sha256)
    .returning(columns)
    .executeTakeFirst();
  return row ? toImage(row) : null;
}

/** The images of this household among those asked for, by id. */
export async function imagesById(
  db: Database,
  householdId: string,
  ids: readonly string[],
): Promise<Map<string, LayerImage>> {
  if (ids.length === 0) return new Map();
  const rows = await db
    .selectFrom('layer_image')
    .select(columns)
    .where('household_id', '=', householdId)
    .where('id', 'in', ids)
    .execute();
  return new Map(rows.map((row) => [row.id, toImage(row)]));
}

export const findImage = (db: Database, id: string): Promise<ImageRow | undefined> =>
  db.selectFrom('layer_image').select(columns).where('id', '=', id).executeTakeFirst();
