import { createTrack, type ReplaySample, type Track } from './sample';

/*
 * The eye as it is known afterwards: at each moment a parabola fitted by weighted least squares to the samples before *and* after
 * (A. Savitzky, M. Golay, Analytical Chemistry 36(8), 1964, in the form of local regression for uneven times: W. Cleveland, JASA 74,
 * 1979, with its tricube weight (1 - |u|^3)^3). It has no lag: a parabola of any speed and acceleration goes through unchanged. What no
 * follower can know in time, replay can.
 */

/** Samples this far to either side count: at 30 a second nine of them, whose noise falls to about half. */
const HALF_WIDTH_MS = 150;
/** Spacing of the result. */
const GRID_MS = 1000 / 120;
/** Without a sample for so long, nothing is known. */
const LONGEST_GAP_MS = 250;

/** The later-known eye and its speeds, on an even grid; NaN where nobody was. Speeds in mm a second. */
export interface LaterKnown {
  readonly startMs: number;
  readonly stepMs: number;
  readonly place: Track;
  readonly acrossMmPerS: Float64Array;
  readonly alongMmPerS: Float64Array;
}

export function laterKnown(samples: readonly ReplaySample[]): LaterKnown {
  const seen = samples.filter(
    (sample): sample is ReplaySample & { eye: [number, number, number] } => sample.eye !== null,
  );
  const startMs = seen[0]?.capturedMs ?? 0;
  const endMs = seen[seen.length - 1]?.capturedMs ?? -1;
  const length = seen.length ? Math.floor((endMs - startMs) / GRID_MS) + 1 : 0;
  const known: LaterKnown = {
    startMs,
    stepMs: GRID_MS,
    place: createTrack(length),
    acrossMmPerS: new Float64Array(length),
    alongMmPerS: new Float64Array(length),
  };
  const fit = createFit();
  let from = 0;
  for (let i = 0; i < length; i++) {
    const tMs = startMs + i * GRID_MS;
    while (seen[from].capturedMs < tMs - HALF_WIDTH_MS) from++;
    clear(fit);
    let gapMs = Infinity;
    for (let s = from; s < seen.length && seen[s].capturedMs <= tMs + HALF_WIDTH_MS; s++) {
      const away = seen[s].capturedMs - tMs;
      gapMs = Math.min(gapMs, Math.abs(away));
      add(fit, away / HALF_WIDTH_MS, seen[s].eye);
    }
    known.place.tMs[i] = tMs;
    solve(fit, gapMs <= LONGEST_GAP_MS / 2);
    known.place.x[i] = fit.level[0];
    known.place.y[i] = fit.level[1];
    known.place.z[i] = fit.level[2];
    const perS = 1000 / HALF_WIDTH_MS;
    known.acrossMmPerS[i] = Math.hypot(fit.slope[0], fit.slope[1]) * perS;
    known.alongMmPerS[i] = Math.abs(fit.slope[2]) * perS;
  }
  return known;
}

/** One coordinate of the later-known eye at a time, between the grid's points on a straight line; NaN outside. */
export function knownAt({ startMs, stepMs, place }: LaterKnown, axis: 'x' | 'y' | 'z', tMs: number): number {
  const at = (tMs - startMs) / stepMs;
  const i = Math.floor(at);
  const values = place[axis];
  if (i < 0 || i + 1 >= values.length) return NaN;
  return values[i] + (at - i) * (values[i + 1] - values[i]);
}

/** Moments of the times, and for each axis of the values, for the normal equations of a parabola. */
interface Fit {
  readonly s: Float64Array;
  readonly v: Float64Array;
  readonly level: Float64Array;
  readonly slope: Float64Array;
}

const createFit = (): Fit => ({
  s: new Float64Array(5),
  v: new Float64Array(9),
  level: new Float64Array(3),
  slope: new Float64Array(3),
});

function clear({ s, v }: Fit): void {
  s.fill(0);
  v.fill(0);
}

function add({ s, v }: Fit, u: number, eye: readonly [number, number, number]): void {
  const near = 1 - Math.abs(u) ** 3;
  let power = near > 0 ? near ** 3 : 0;
  for (let p = 0; p < 5; p++, power *= u) {
    s[p] += power;
    if (p < 3) for (let axis = 0; axis < 3; axis++) v[3 * axis + p] += power * eye[axis];
  }
}

/** Value and slope of the parabola at u = 0, by Cramer's rule; with too few samples for one, their mean and no slope. */
function solve({ s, v, level, slope }: Fit, known: boolean): void {
  const det =
    s[0] * (s[2] * s[4] - s[3] * s[3]) - s[1] * (s[1] * s[4] - s[2] * s[3]) + s[2] * (s[1] * s[3] - s[2] * s[2]);
  const definite = det > 1e-6 * s[0] ** 3;
  for (let axis = 0; axis < 3; axis++) {
    const [a, b, c] = [v[3 * axis], v[3 * axis + 1], v[3 * axis + 2]];
    if (!known) level[axis] = slope[axis] = NaN;
    else if (!definite) {
      level[axis] = a / s[0];
      slope[axis] = 0;
    } else {
      level[axis] =
        (a * (s[2] * s[4] - s[3] * s[3]) - s[1] * (b * s[4] - s[3] * c) + s[2] * (b * s[3] - s[2] * c)) / det;
      slope[axis] =
        (s[0] * (b * s[4] - s[3] * c) - a * (s[1] * s[4] - s[2] * s[3]) + s[2] * (s[1] * c - b * s[2])) / det;
    }
  }
}
