import * as z from 'zod';
import { Id, Moment, Name } from './fields';
import { everyRole, tuners } from './role';
import { defineRoute, members } from './route';
import { WallSetUp } from './wall-set-up';

/** What a wall tells of itself, one line every few seconds. */
export const WallReport = z.object({
  at: Moment,
  framesPerS: z.number().nonnegative(),
  trackedPerS: z.number().nonnegative(),
  /** Step of the ladder, 0 the finest. */
  ladderStep: z.number().int().min(0).max(20),
  ladderWords: z.string().max(80),
  renderer: z.string().max(40),
  tracking: z.string().max(40),
  latencyMs: z.number().nonnegative().nullable(),
  temperatureC: z.number().nullable(),
  lastError: z.string().max(500).nullable(),
});
export type WallReport = z.infer<typeof WallReport>;

export const Wall = z.object({
  id: Id,
  householdId: Id,
  setUp: WallSetUp,
  revision: z.number().int(),
  savedAt: Moment,
  savedBy: z.string(),
  /** When its screen fetched its credential; null while it has none. */
  pairedAt: Moment.nullable(),
  /** When that screen last reported or asked; null before it ever did. */
  heardAt: Moment.nullable(),
  /** Its newest report. */
  report: WallReport.nullable(),
});
export type Wall = z.infer<typeof Wall>;

/** A wall that has not been heard for so long counts as silent. */
export const silentAfterMs = 90_000;
/** How long a wall's reports are kept, days. */
export const reportsKeptDays = 7;

const HouseholdParams = z.object({ householdId: Id });
export const WallParams = z.object({ wallId: Id });
export const WallReply = z.object({ wall: Wall });

export const listWalls = defineRoute({
  method: 'GET',
  path: '/api/households/:householdId/walls',
  access: members('household', everyRole),
  params: HouseholdParams,
  reply: z.object({ walls: z.array(Wall) }),
});
/** Begins with the usual set-up of shared/contracts/new-wall.ts. */
export const createWall = defineRoute({
  method: 'POST',
  path: '/api/households/:householdId/walls',
  access: members('household', tuners),
  params: HouseholdParams,
  body: z.object({ name: Name }),
  reply: WallReply,
});
export const readWall = defineRoute({
  method: 'GET',
  path: '/api/walls/:wallId',
  access: members('wall', everyRole),
  params: WallParams,
  reply: WallReply,
});
/**
 * Saves over `revision`, which must be the newest: otherwise 409 `revision-moved` with `detail` {revision, savedBy, savedById, savedAt}, and nothing is
 * written. 422 `scene-not-here` for a scene that is binned or not of this household. The screen hears of it within a second.
 */
export const saveWall = defineRoute({
  method: 'PUT',
  path: '/api/walls/:wallId',
  access: members('wall', tuners),
  params: WallParams,
  body: z.object({ revision: z.number().int(), setUp: WallSetUp }),
  reply: WallReply,
});
export const removeWall = defineRoute({
  method: 'DELETE',
  path: '/api/walls/:wallId',
  access: members('wall', tuners),
  params: WallParams,
});
/** The oldest first: at most one for each 720th of the time asked for, and besides every one with which the ladder's step or the last error changed. */
export const wallReports = defineRoute({
  method: 'GET',
  path: '/api/walls/:wallId/reports',
  access: members('wall', everyRole),
  params: WallParams,
  query: z.object({ hours: z.coerce.number().int().min(1).max(168).default(24) }),
  reply: z.object({ reports: z.array(WallReport) }),
});
