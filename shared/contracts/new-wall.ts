import { livingRoom } from '../projection/living-room';
import { CALM_FOLLOWING } from '../smoothing/follower-settings';
import { USUAL_VIEWER } from '../viewer/eye-from-landmarks';
import { usualCamera } from '../viewer/usual-camera';
import type { TrackerTuning, WallGlass, WallSetUp } from './wall-set-up';

/** A screen of 16:9, lying, sold as 43 inches. Until it is measured (practice). */
export const usualGlass: WallGlass = { widthMm: 941, heightMm: 529, widthPx: 1920, heightPx: 1080, uncertainty: null };

/** Standard deviation of the distance between the eyes among adults, mm (N. Dodgson, Proc. SPIE 5291, 2004; memory). */
const ipdSpreadMm = 3.8;

const { filter, longestHorizonMs, appearMs, holdMs, returnMs, greatestMmPerS } = CALM_FOLLOWING;
export const usualTuning: TrackerTuning = {
  filter: { across: { ...filter.across }, along: { ...filter.along } },
  displayDelayMs: 0,
  longestHorizonMs,
  appearMs,
  holdMs,
  returnMs,
  greatestMmPerS,
  choice: { rule: 'nearest', handOverMs: 1500, handOverShare: 0.2 },
  ipdMm: { value: USUAL_VIEWER.eyeDistanceMm, uncertainty: ipdSpreadMm },
  scaleFactor: USUAL_VIEWER.distanceFactor,
};

/** What a wall is when it is made, until somebody measures: a living room, nothing chosen to show. */
export const newWall = (name: string): WallSetUp => ({
  name,
  glass: usualGlass,
  camera: {
    ...usualCamera(usualGlass, livingRoom('landscape').zone),
    yawRad: 0,
    rollRad: 0,
    mirrored: false,
    uncertainty: { hfovRad: null, pitchRad: null, positionMm: null },
  },
  zone: livingRoom('landscape').zone,
  tuning: usualTuning,
  followingBefore: null,
  sceneId: null,
});
