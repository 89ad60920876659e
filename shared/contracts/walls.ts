import * as z from 'zod';
import { Id, Moment, Name } from './fields';
import { DerivativeEdge } from './photos';
import { everyRole, tuners } from './role';
import { anyone, defineRoute, members, theWall } from './route';
import { Scene, ZoneSchema } from './scenes';

const Radians = z.number().min(-Math.PI).max(Math.PI);
const Positive = z.number().positive('Must be more than 0').max(100_000);
const Milliseconds = z.number().min(0).max(60_000);
/** In how long something is done; never in no time at all. */
const Duration = z.number().min(1, 'At least 1 ms').max(60_000);

export const WallGlass = z.object({
  widthMm: Positive,
  heightMm: Positive,
  widthPx: z.number().int().positive().max(20_000),
  heightPx: z.number().int().positive().max(20_000),
  /** Standard uncertainty of the width, relative (0.01 is 1 %). */
  uncertainty: z.number().nonnegative().nullable(),
});

/** The camera as shared/viewer's Camera has it; position from the centre of the glass. */
export const WallCamera = z.object({
  position: z.object({
    x: z.number().min(-10_000).max(10_000),
    y: z.number().min(-10_000).max(10_000),
    z: z.number().min(-10_000).max(10_000),
  }),
  pitchRad: Radians,
  yawRad: Radians,
  rollRad: Radians,
  hfovRad: z.number().min(0.2).max(2.8),
  mirrored: z.boolean(),
  /** Standard uncertainties; null while assumed. */
  uncertainty: z.object({
    hfovRad: z.number().nonnegative().nullable(),
    pitchRad: z.number().nonnegative().nullable(),
    positionMm: z.number().nonnegative().nullable(),
  }),
});

export type WallGlass = z.infer<typeof WallGlass>;
export type WallCamera = z.infer<typeof WallCamera>;

/** Which of several people is followed; the others take over only after `handOverMs`, and by a margin of `handOverShare`. */
export const ViewerChoice = z.object({
  rule: z.enum(['nearest', 'most-central', 'longest']),
  handOverMs: Milliseconds,
  handOverShare: z.number().min(0).max(1),
});
export type ViewerChoice = z.infer<typeof ViewerChoice>;

/** Distance between the eyes and its standard uncertainty (JCGM 100:2008, GUM), mm. */
const ViewerIpd = z.object({ value: z.number().min(35).max(90), uncertainty: z.number().nonnegative() });
const ViewerFactor = z.number().min(0.5).max(2);

/** What a tuner may turn: shared/smoothing's FollowerSettings as far as they are tuned, the viewer's own scale, and the choice of viewer. */
export const TrackerTuning = z.object({
  filter: z.object({
    across: z.object({
      minCutoffHz: z.number().positive().max(60),
      beta: z.number().min(0).max(10),
      derivativeCutoffHz: z.number().positive().max(60),
    }),
    along: z.object({
      minCutoffHz: z.number().positive().max(60),
      beta: z.number().min(0).max(10),
      derivativeCutoffHz: z.number().positive().max(60),
    }),
  }),
  /** Delay of screen and camera that prediction makes good beyond what is measured frame by frame, ms. */
  displayDelayMs: Milliseconds,
  longestHorizonMs: Milliseconds,
  appearMs: Duration,
  holdMs: Milliseconds,
  returnMs: Duration,
  greatestMmPerS: z.number().positive().max(20_000),
  choice: ViewerChoice,
  ipdMm: ViewerIpd,
  /** k of shared/viewer. */
  scaleFactor: ViewerFactor,
});
export type TrackerTuning = z.infer<typeof TrackerTuning>;

export const WallSetUp = z.object({
  name: Name,
  glass: WallGlass,
  camera: WallCamera,
  zone: ZoneSchema,
  tuning: TrackerTuning,
  /** A scene of the same household; null while nothing is chosen. */
  sceneId: Id.nullable(),
});
export type WallSetUp = z.infer<typeof WallSetUp>;

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
const WallParams = z.object({ wallId: Id });
const WallReply = z.object({ wall: Wall });

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

/** What codes are made of: figures and capitals that are not mistaken for one another (no 0, O, 1, I). */
export const pairingSigns = '23456789ABCDEFGHJKLMNPQRSTUVWXYZ';
/** Six of them, however they are typed. */
export const PairingCode = z
  .string()
  .transform((typed) => typed.replace(/[\s-]/g, '').toUpperCase())
  .pipe(
    z
      .string()
      .regex(new RegExp(`^[${pairingSigns}]{6}$`), 'The code has six letters and figures, as the screen shows them'),
  );
export const pairingMinutes = 10;

/** A screen asks for a code; it keeps `claim`, a secret, to fetch its credential when someone has entered the code. */
export const askPairing = defineRoute({
  method: 'POST',
  path: '/api/pairings',
  access: anyone,
  reply: z.object({ code: z.string(), claim: z.string(), expiresAt: Moment }),
});
/** Asked every two seconds or so. `paired` comes once, with the wall's own cookie; `expired` means ask for another code. */
export const claimPairing = defineRoute({
  method: 'POST',
  path: '/api/pairings/claims',
  access: anyone,
  body: z.object({ claim: z.string().min(40).max(60) }),
  reply: z.object({ state: z.enum(['waiting', 'paired', 'expired']) }),
});
/**
 * 422 `code-unknown` when no screen shows this code. The screen fetches its credential within seconds; `pairedAt` of the wall then says so,
 * and whatever screen the wall had before is no longer let in.
 */
export const pairWall = defineRoute({
  method: 'POST',
  path: '/api/walls/:wallId/pairing',
  access: members('wall', tuners),
  params: WallParams,
  body: z.object({ code: PairingCode }),
  reply: WallReply,
});
/** Revokes the screen's credential at once. */
export const unpairWall = defineRoute({
  method: 'DELETE',
  path: '/api/walls/:wallId/pairing',
  access: members('wall', tuners),
  params: WallParams,
  reply: WallReply,
});

/** Whether whoever asks is some wall's own screen. Answered to anyone without an error, so that a new screen may ask before it shows a code. */
export const screenPairing = defineRoute({
  method: 'GET',
  path: '/api/wall/pairing',
  access: anyone,
  reply: z.object({ paired: z.boolean() }),
});
/** What the screen itself may use, by its own credential and for nothing but its own wall: otherwise 401 `not-paired`. `scene` is null when none is chosen or it is in the bin. */
export const wallShows = defineRoute({
  method: 'GET',
  path: '/api/wall',
  access: theWall,
  reply: z.object({ wallId: Id, setUp: WallSetUp, revision: z.number().int(), scene: Scene.nullable() }),
});
/**
 * Server-sent events: `changed` at the opening and whenever the wall's set-up or scene may have changed, and a comment every 20 s to keep
 * the line alive. Ends when the screen is unpaired.
 */
export const wallEvents = defineRoute({ method: 'GET', path: '/api/wall/events', access: theWall, answers: 'file' });
/** As `layerImageFile`, of the scene that the wall shows. */
export const wallImageFile = defineRoute({
  method: 'GET',
  path: '/api/wall/images/:imageId/:edge',
  access: theWall,
  params: z.object({ imageId: Id, edge: DerivativeEdge }),
  answers: 'file',
});
/** A report sent again, because its answer was lost, counts once. */
export const reportFromWall = defineRoute({
  method: 'POST',
  path: '/api/wall/reports',
  access: theWall,
  body: z.object({ reports: z.array(WallReport).min(1).max(200) }),
});

/** A household member's own scale, set once at a marked distance. */
export const ViewerScale = z.object({
  id: Id,
  name: Name,
  ipdMm: ViewerIpd,
  scaleFactor: ViewerFactor,
  measuredAt: Moment,
});
export type ViewerScale = z.infer<typeof ViewerScale>;
const ScalesReply = z.object({ scales: z.array(ViewerScale) });
export const listViewerScales = defineRoute({
  method: 'GET',
  path: '/api/households/:householdId/viewer-scales',
  access: members('household', everyRole),
  params: HouseholdParams,
  reply: ScalesReply,
});
/** Replaces what was kept under that name. */
export const keepViewerScale = defineRoute({
  method: 'POST',
  path: '/api/households/:householdId/viewer-scales',
  access: members('household', tuners),
  params: HouseholdParams,
  body: ViewerScale.omit({ id: true, measuredAt: true }),
  reply: ScalesReply,
});
export const removeViewerScale = defineRoute({
  method: 'DELETE',
  path: '/api/households/:householdId/viewer-scales/:scaleId',
  access: members('household', tuners),
  params: z.object({ householdId: Id, scaleId: Id }),
  reply: ScalesReply,
});
