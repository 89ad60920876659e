import * as z from 'zod';
import { Id, Name } from './fields';
import { ZoneSchema } from './scenes';

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
export const ViewerIpd = z.object({ value: z.number().min(35).max(90), uncertainty: z.number().nonnegative() });
export const ViewerFactor = z.number().min(0.5).max(2);

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

/** How the picture follows, as far as the bench tunes it. */
export const FollowingTuning = TrackerTuning.pick({ filter: true, displayDelayMs: true, longestHorizonMs: true });
export type FollowingTuning = z.infer<typeof FollowingTuning>;

export const WallSetUp = z.object({
  name: Name,
  glass: WallGlass,
  camera: WallCamera,
  zone: ZoneSchema,
  tuning: TrackerTuning,
  /** How it followed before the bench last changed that: the way back. Null where nothing was changed, or it was gone back to. */
  followingBefore: FollowingTuning.nullable().default(null),
  /** A scene of the same household; null while nothing is chosen. */
  sceneId: Id.nullable(),
});
export type WallSetUp = z.infer<typeof WallSetUp>;
