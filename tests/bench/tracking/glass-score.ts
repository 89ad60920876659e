import { createFollower } from '@oriel/shared/smoothing/follower';
import { CALM_FOLLOWING } from '@oriel/shared/smoothing/follower-settings';
import { stillStretches, type Hit } from './hits';
import { deviationWithin, quantile, rounded } from './statistics';
import type { TrueFace, TruthFrame } from './truth';

/**
 * End to end on the glass, in mm: what was measured goes through the product's follower, and a point of a layer 100 mm behind the glass is
 * drawn for the eye it gives.
 */
export interface GlassScore {
  /** Standard deviation of the drawn point where the truth has stood still for half a second: after a cut of the film the picture eases. */
  readonly glassRestSdMm: number | null;
  /** Drawn two frames after capture, how far from where it belongs for the eye that is truly there by then. */
  readonly glassErrorMmP50: number;
  readonly glassErrorMmP95: number;
}

type Eye = readonly [number, number, number];

const DEPTH_MM = 100;
/** Where the point is placed on the glass, off the middle, so that distance matters too. */
const PLACED_MM = 100;
const FRAMES_TO_DRAW = 2;
/** An eye nearer than this is a wrong find that no follower is given. */
const NEAREST_MM = 100;
/** What is drawn has come to rest by then, and what is left of a rest is judged where it is so many frames. */
const EASED_S = 0.5;
const FEWEST_AT_REST = 10;

/** S = P z/(z + d) + E d/(z + d): where the point is drawn for this eye. */
const drawn = ([x, y, z]: Eye): readonly [number, number] => {
  const on = (eye: number): number => (PLACED_MM * z + eye * DEPTH_MM) / (z + DEPTH_MM);
  return [on(x), on(y)];
};

/** Figures of an engine's finds, its distances divided by `scale`; nothing where nobody was found. */
export function scoreOnGlass(
  truths: readonly TruthFrame[],
  hits: readonly (Hit | null)[],
  fps: number,
  scale: number,
): Partial<GlassScore> {
  const follower = createFollower({ ...CALM_FOLLOWING, homeEye: { x: 0, y: 0, z: 1000 } });
  const out = { x: 0, y: 0, z: 0 };
  const draws = new Map<Hit, readonly [number, number]>();
  const errors: number[] = [];
  hits.forEach((hit, k) => {
    const tMs = (k * 1000) / fps;
    const eye = hit && (hit.found.eyeMm.map((mm) => mm / scale) as unknown as Eye);
    if (eye && eye[2] > NEAREST_MM) follower.sample({ x: eye[0], y: eye[1], z: eye[2] }, tMs);
    else follower.lost(tMs);
    follower.at(tMs + (FRAMES_TO_DRAW * 1000) / fps, out);
    if (!hit) return;
    const point = drawn([out.x, out.y, out.z]);
    draws.set(hit, point);
    const then = eyeLater(hit.truth, truths[k + FRAMES_TO_DRAW]);
    if (!then) return;
    const [x, y] = drawn(then);
    errors.push(Math.hypot(point[0] - x, point[1] - y));
  });
  if (errors.length === 0) return {};
  const still = stillStretches(hits)
    .map((stretch) => stretch.slice(Math.round(EASED_S * fps)).map((hit) => draws.get(hit)!))
    .filter(({ length }) => length >= FEWEST_AT_REST);
  const along = (axis: 0 | 1): number => deviationWithin(still.map((stretch) => stretch.map((point) => point[axis])));
  return {
    glassRestSdMm: still.length > 0 ? rounded(Math.max(along(0), along(1))) : null,
    glassErrorMmP50: rounded(quantile(errors, 0.5)),
    glassErrorMmP95: rounded(quantile(errors, 0.95)),
  };
}

/** Where the same head is in a later frame: the one nearest to where it was. */
function eyeLater({ eyeMm }: TrueFace, frame: TruthFrame | undefined): Eye | null {
  if (!eyeMm) return null;
  const far = (other: Eye): number => Math.hypot(...other.map((mm, axis) => mm - eyeMm[axis]));
  const there = (frame?.faces ?? []).flatMap((face) => (face.eyeMm ? [face.eyeMm] : []));
  return there.sort((a, b) => far(a) - far(b))[0] ?? null;
}
