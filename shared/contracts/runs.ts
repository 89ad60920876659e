import * as z from 'zod';
import { Id, Moment, Name } from './fields';
import { everyRole, tuners } from './role';
import { defineRoute, members } from './route';
import { TrackerTuning } from './wall-set-up';

/**
 * One frame of a run: when it was captured and received (ms, one clock; the same where the browser does not tell when it was captured), the
 * eye as measured before smoothing (mm from the centre of the glass; null where nobody was), and the time each stage took. Never a picture.
 */
export const RunSample = z.object({
  capturedMs: z.number(),
  receivedMs: z.number(),
  eye: z.tuple([z.number(), z.number(), z.number()]).nullable(),
  cropMs: z.number(),
  detectMs: z.number(),
  landmarksMs: z.number(),
  totalMs: z.number(),
});
export type RunSample = z.infer<typeof RunSample>;

export const RunHeader = z.object({
  id: Id,
  name: Name,
  wallId: Id.nullable(),
  /** What it was recorded on, in the browser's own words: no serial numbers. */
  machine: z.string().max(300),
  tuning: TrackerTuning,
  recordedAt: Moment,
  recordedBy: z.string(),
  durationMs: z.number().nonnegative(),
  sampleCount: z.number().int().nonnegative(),
  /** Intervals between frames drawn while it was recorded, ms. */
  frameIntervalP50Ms: z.number().nonnegative(),
  frameIntervalP95Ms: z.number().nonnegative(),
});
export type RunHeader = z.infer<typeof RunHeader>;

/** Ten minutes at thirty a second. */
export const runMaxSamples = 18_000;
/** That many samples in full digits, and room. */
const runMaxBytes = 8_000_000;

const HouseholdParams = z.object({ householdId: Id });
const RunParams = z.object({ runId: Id });

/** The newest first. */
export const listRuns = defineRoute({
  method: 'GET',
  path: '/api/households/:householdId/runs',
  access: members('household', everyRole),
  params: HouseholdParams,
  reply: z.object({ runs: z.array(RunHeader) }),
});
/** A run sent again under its id, its answer having been lost, is kept once. 422 `wall-not-here` for a wall of another household. */
export const keepRun = defineRoute({
  method: 'POST',
  path: '/api/households/:householdId/runs',
  access: members('household', tuners),
  params: HouseholdParams,
  body: z.object({
    /** Given where it was recorded. */
    id: Id,
    name: Name,
    wallId: Id.nullable(),
    machine: z.string().max(300),
    tuning: TrackerTuning,
    frameIntervalP50Ms: z.number().nonnegative(),
    frameIntervalP95Ms: z.number().nonnegative(),
    samples: z.array(RunSample).min(2, 'Record for longer').max(runMaxSamples, 'A run holds at most ten minutes'),
  }),
  bodyMaxBytes: runMaxBytes,
  reply: z.object({ run: RunHeader }),
});
export const readRun = defineRoute({
  method: 'GET',
  path: '/api/runs/:runId',
  access: members('run', everyRole),
  params: RunParams,
  reply: z.object({ run: RunHeader, samples: z.array(RunSample) }),
});
/** Only over the name that was seen: 409 `renamed-meanwhile`, whose `detail.name` is the newer one. */
export const renameRun = defineRoute({
  method: 'PATCH',
  path: '/api/runs/:runId',
  access: members('run', tuners),
  params: RunParams,
  body: z.object({ name: Name, was: z.string() }),
  reply: z.object({ run: RunHeader }),
});
export const removeRun = defineRoute({
  method: 'DELETE',
  path: '/api/runs/:runId',
  access: members('run', tuners),
  params: RunParams,
});
