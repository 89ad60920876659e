import type { Point3 } from '../projection/types';
import { CALM_DRIFT, type DriftSettings } from './drift';
import type { EyeFilterSettings } from './eye-filter';

/** Everything that decides how the picture follows the viewer. Times in ms, lengths in mm. */
export interface FollowerSettings {
  readonly homeEye: Point3;
  readonly filter: EyeFilterSettings;
  /** Time constants of the predictor, for x and y and for z: longer is calmer and turns later. */
  readonly predictor: { readonly acrossMs: number; readonly alongMs: number };
  /** Speeds below this are mostly noise and are not carried ahead. */
  readonly restMmPerS: number;
  /** The predictor looks no farther ahead than this; then the motion runs out. */
  readonly longestHorizonMs: number;
  /** Share of the filter's own lag that the predictor makes good, 0 to 1. */
  readonly lagShare: number;
  /** In how long each new sample's correction is worked in. */
  readonly correctionMs: number;
  /** In how long the picture comes to a viewer who appears. */
  readonly appearMs: number;
  /** How long the picture waits where it is after the viewer is lost. */
  readonly holdMs: number;
  /** In how long it then goes home. */
  readonly returnMs: number;
  /** Without any word from the tracker for so long, the viewer counts as lost. */
  readonly silenceMs: number;
  /** A sample this far from where the viewer was expected is another viewer: approached as one who appears. */
  readonly jumpMm: number;
  readonly drift: DriftSettings;
  readonly greatestMmPerS: number;
  /** The eye never comes nearer to the glass than this, whatever is predicted. */
  readonly nearestMm: number;
}

/** Settings for a viewer about 1 m away, tracked 15 to 30 times a second; what they do at rest and in motion is measured in follower.spec.ts. */
export const CALM_FOLLOWING: Omit<FollowerSettings, 'homeEye'> = {
  filter: {
    across: { minCutoffHz: 1, beta: 0.1, derivativeCutoffHz: 1 },
    along: { minCutoffHz: 0.8, beta: 0.02, derivativeCutoffHz: 1 },
  },
  predictor: { acrossMs: 25, alongMs: 120 },
  restMmPerS: 50,
  longestHorizonMs: 120,
  lagShare: 1,
  correctionMs: 50,
  appearMs: 600,
  holdMs: 400,
  returnMs: 3000,
  silenceMs: 700,
  jumpMm: 350,
  drift: CALM_DRIFT,
  greatestMmPerS: 2500,
  nearestMm: 150,
};
