import { sql } from 'kysely';
import { reportsKeptDays, type WallReport } from '@oriel/shared/contracts/walls';
import type { Database } from '../database/database';

/** As many as a chart can show. */
const pointsShown = 720;
const mostSent = 5_000;

const byTime = (a: WallReport, b: WallReport) => Date.parse(a.at) - Date.parse(b.at);

/** Keeps a batch; what was kept before, by the moment it tells of, is left as it is. */
export async function keepReports(db: Database, wallId: string, given: readonly WallReport[]): Promise<void> {
  const reports = [...given].sort(byTime);
  await db.transaction().execute(async (transaction) => {
    await transaction
      .insertInto('wall_report')
      .values(reports.map((report) => ({ wall_id: wallId, at: report.at, report: JSON.stringify(report) })))
      .onConflict((conflict) => conflict.columns(['wall_id', 'at']).doNothing())
      .execute();
    await transaction
      .updateTable('wall')
      .set({ heard_at: new Date(), report: JSON.stringify(reports.at(-1)) })
      .where('id', '=', wallId)
      .execute();
  });
}

/** The last hours, thinned: the newest of each slice of time, and each with which the ladder's step or the last error changed. */
export async function reportsOf(db: Database, wallId: string, hours: number): Promise<WallReport[]> {
  const sliceS = (hours * 3600) / pointsShown;
  const told = db
    .selectFrom('wall_report')
    .where('wall_id', '=', wallId)
    .where('at', '>', new Date(Date.now() - hours * 3_600_000))
    .select([
      'at',
      'report',
      sql<number>`row_number() over (partition by floor(extract(epoch from at) / ${sliceS}::float8) order by at desc)`.as(
        'nth',
      ),
      sql<boolean>`(report -> 'ladderStep', report -> 'lastError') is distinct from lag((report -> 'ladderStep', report -> 'lastError')) over (order by at)`.as(
        'turns',
      ),
    ]);
  const rows = await db
    .selectFrom(told.as('told'))
    .select('report')
    .where((on) => on.or([on('nth', '=', 1), on('turns', '=', true)]))
    .orderBy('at', 'desc')
    .limit(mostSent)
    .execute();
  return rows.map(({ report }) => report).reverse();
}

export async function forgetOldReports(db: Database, now = new Date()): Promise<void> {
  await db
    .deleteFrom('wall_report')
    .where('received_at', '<', new Date(now.getTime() - reportsKeptDays * 24 * 3_600_000))
    .execute();
}
