import type { ViewerScale } from '@oriel/shared/contracts/viewer-scales';
import type { Database } from '../database/database';

export function viewerScales(db: Database) {
  /** By name. */
  async function list(householdId: string): Promise<ViewerScale[]> {
    const rows = await db
      .selectFrom('viewer_scale')
      .selectAll()
      .where('household_id', '=', householdId)
      .orderBy('name')
      .orderBy('id')
      .execute();
    return rows.map((row) => ({
      id: row.id,
      name: row.name,
      ipdMm: row.ipd_mm,
      scaleFactor: row.scale_factor,
      measuredAt: row.measured_at.toISOString(),
    }));
  }

  return {
    list,

    async keep(
      householdId: string,
      { name, ipdMm, scaleFactor }: Omit<ViewerScale, 'id' | 'measuredAt'>,
    ): Promise<void> {
      const measured = { ipd_mm: JSON.stringify(ipdMm), scale_factor: scaleFactor, measured_at: new Date() };
      await db
        .insertInto('viewer_scale')
        .values({ household_id: householdId, name, ...measured })
        .onConflict((conflict) => conflict.columns(['household_id', 'name']).doUpdateSet(measured))
        .execute();
    },

    async remove(householdId: string, scaleId: string): Promise<void> {
      await db.deleteFrom('viewer_scale').where('household_id', '=', householdId).where('id', '=', scaleId).execute();
    },
  };
}
