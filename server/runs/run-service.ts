import type { keepRun, RunHeader, RunSample } from '@oriel/shared/contracts/runs';
import { sql } from 'kysely';
import type * as z from 'zod';
import type { Database } from '../database/database';
import { saverOf } from '../database/revisions';
import type { ActingMember } from '../http/acting-member';
import { DomainFailure, notFound } from '../http/failure';
import { compact, durationOf, unfold, type RunFacts } from './compact-run';

type NewRun = z.output<(typeof keepRun)['body']>;
interface HeaderRow {
  id: string;
  name: string;
  wall_id: string | null;
  facts: RunFacts;
  recorded_at: Date;
  recorder: string | null;
}

const wallNotHere = () =>
  new DomainFailure(
    422,
    'wall-not-here',
    'The wall of this run is not in this household.',
    'Keep the run without a wall, or choose another.',
    {
      fields: { wallId: 'This wall is not here' },
    },
  );

const renamedMeanwhile = (name: string) =>
  new DomainFailure(
    409,
    'renamed-meanwhile',
    `Somebody else named this run “${name}” meanwhile.`,
    'Nothing was overwritten. Save again to give it your name all the same.',
    { detail: { name } },
  );

const toHeader = ({ facts, ...row }: HeaderRow): RunHeader => ({
  id: row.id,
  name: row.name,
  wallId: row.wall_id,
  ...facts,
  recordedAt: row.recorded_at.toISOString(),
  recordedBy: saverOf({ saver: row.recorder }),
});

const headers = (db: Database) =>
  db
    .selectFrom('run')
    .leftJoin('account', 'account.id', 'run.recorded_by')
    .select(['run.id', 'run.name', 'run.wall_id', 'run.facts', 'run.recorded_at', 'account.name as recorder']);

export function runService(db: Database) {
  async function header(id: string): Promise<RunHeader> {
    const row = await headers(db).where('run.id', '=', id).executeTakeFirst();
    if (!row) throw notFound();
    return toHeader(row);
  }

  /** @throws wall-not-here (422) */
  async function requireWall(householdId: string, wallId: string): Promise<void> {
    const wall = await db
      .selectFrom('wall')
      .select('id')
      .where('id', '=', wallId)
      .where('household_id', '=', householdId)
      .executeTakeFirst();
    if (!wall) throw wallNotHere();
  }

  return {
    /** Without their samples, the newest first. */
    async list(householdId: string): Promise<RunHeader[]> {
      const rows = await headers(db)
        .where('run.household_id', '=', householdId)
        .orderBy('run.recorded_at', 'desc')
        .orderBy('run.id')
        .execute();
      return rows.map(toHeader);
    },

    /** Once, however often it is sent; sent again by whoever recorded it with more samples, those are kept. @throws wall-not-here (422) */
    async keep({ id, name, wallId, samples, ...recorded }: NewRun, { householdId, accountId }: ActingMember): Promise<RunHeader> {
      if (wallId) await requireWall(householdId, wallId);
      const facts: RunFacts = { ...recorded, durationMs: durationOf(samples), sampleCount: samples.length };
      const recording = { facts: JSON.stringify(facts), samples: JSON.stringify(samples.map(compact)) };
      await db
        .insertInto('run')
        .values({ id, household_id: householdId, wall_id: wallId, name, recorded_by: accountId, ...recording })
        .onConflict((same) =>
          same
            .column('id')
            .doUpdateSet(recording)
            .where('run.household_id', '=', householdId)
            .where('run.recorded_by', '=', accountId)
            .where(sql<number>`(run.facts->>'sampleCount')::int`, '<', samples.length),
        )
        .execute();
      const kept = await headers(db)
        .where('run.id', '=', id)
        .where('run.household_id', '=', householdId)
        .executeTakeFirst();
      if (!kept) throw notFound();
      return toHeader(kept);
    },

    async read(id: string): Promise<{ run: RunHeader; samples: RunSample[] }> {
      const row = await headers(db).select('run.samples').where('run.id', '=', id).executeTakeFirst();
      if (!row) throw notFound();
      const { samples, ...rest } = row;
      return { run: toHeader(rest), samples: samples.map(unfold) };
    },

    /** @throws renamed-meanwhile (409) */
    async rename(id: string, name: string, was: string): Promise<RunHeader> {
      const { numUpdatedRows } = await db
        .updateTable('run')
        .set({ name })
        .where('id', '=', id)
        .where('name', 'in', [was, name])
        .executeTakeFirst();
      const now = await header(id);
      if (!numUpdatedRows) throw renamedMeanwhile(now.name);
      return now;
    },

    async remove(id: string): Promise<void> {
      await db.deleteFrom('run').where('id', '=', id).execute();
    },
  };
}
