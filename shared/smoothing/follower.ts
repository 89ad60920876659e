import { requireEye } from '../projection/requirements';
import type { Point3 } from '../projection/types';
import {
  createDoubleExponential,
  predict,
  slopeOf,
  stepDoubleExponential,
  type DoubleExponentialState,
} from './double-exponential';
import type { Axis } from './drift';
import { axisLagMs, createEyeFilter, resetEyeFilter, stepEyeFilter } from './eye-filter';
import type { FollowerSettings } from './follower-settings';
import { createGoal, goalAt, goalRate, type Goal } from './goal';
import { addJump, createSettling, settlingRate, stepSettling, type Settling } from './settling';
import { createSpeedLimit, stepSpeedLimit } from './speed-limit';

/** Whether someone is followed, was lost a moment ago, or nobody is there. */
export type Presence = 'nobody' | 'following' | 'holding';

/** From samples of the viewer's eye to the eye the picture is drawn for. Everything is in mm and ms on one clock. */
export interface Follower {
  readonly presence: Presence;
  /** Takes the eye as the camera saw it at `tMs`. Samples older than the last are ignored. Throws a GeometryError for an impossible eye. */
  sample(eye: Point3, tMs: number): void;
  /** The camera saw nobody at `tMs`. May be repeated. */
  lost(tMs: number): void;
  /** Writes the eye for a picture lit at `tMs`. Times must not run backwards. */
  at(tMs: number, out: { x: number; y: number; z: number }): void;
}

const AXES = ['x', 'y', 'z'] as const;

interface AxisState {
  readonly predictor: DoubleExponentialState;
  readonly goal: Goal;
  /** What is left of the way to a new goal, after someone came or went. */
  readonly ease: Settling;
  /** What is left of the corrections that samples brought. */
  readonly correction: Settling;
}

/**
 * The pipeline: 1 euro filter, double exponential prediction to the moment asked for, easing, limit on speed.
 *
 * The eye is a goal (goal.ts) plus two differences that die away (settling.ts). When the goal changes, what it jumped by
 * is added to a difference, so the sum never jumps in place or in speed; when nothing changes the sum is the goal, with no
 * lag. Its state depends only on the calls and their times: a recorded run replays to the same eyes. Nothing is allocated
 * after creation.
 */
export function createFollower(settings: FollowerSettings): Follower {
  requireEye(settings.homeEye, 'homeEye');
  const { homeEye, drift, longestHorizonMs } = settings;
  const predictorMs = { x: settings.predictor.acrossMs, y: settings.predictor.acrossMs, z: settings.predictor.alongMs };
  const filter = createEyeFilter();
  const limit = createSpeedLimit();
  const axes: Record<Axis, AxisState> = {
    x: createAxis(homeEye.x),
    y: createAxis(homeEye.y),
    z: createAxis(homeEye.z),
  };
  const wanted = { x: homeEye.x, y: homeEye.y, z: homeEye.z };
  let presence: Presence = 'nobody';
  /** Moments, ms; kept in one object, whose figures are changed in place. */
  const run = { clockMs: NaN, sampledMs: -Infinity, lostMs: 0, easeRate: settlingRate(settings.returnMs) };

  /** Lets the differences die away up to `tMs`. */
  function advance(tMs: number): void {
    const dtMs = tMs - run.clockMs;
    if (dtMs > 0) {
      for (const axis of AXES) {
        stepSettling(axes[axis].ease, dtMs, run.easeRate);
        stepSettling(axes[axis].correction, dtMs, settlingRate(settings.correctionMs));
      }
    }
    if (!(dtMs <= 0)) run.clockMs = tMs;
  }

  /** Gives an axis a new goal and adds what it jumps by to `into`. */
  function redirect(axis: Axis, into: Settling, kind: Goal['kind'], level: number, slope: number, tMs: number): void {
    const { goal } = axes[axis];
    const { clockMs } = run;
    const running = !Number.isNaN(clockMs);
    const place = running ? goalAt(goal, axis, run.clockMs, drift, longestHorizonMs) : 0;
    const rate = running ? goalRate(goal, axis, run.clockMs, drift, longestHorizonMs) : 0;
    goal.kind = kind;
    goal.level = level;
    goal.slope = slope;
    goal.tMs = tMs;
    if (!running) return;
    addJump(
      into,
      place - goalAt(goal, axis, run.clockMs, drift, longestHorizonMs),
      rate - goalRate(goal, axis, run.clockMs, drift, longestHorizonMs),
    );
  }

  /** Stops where the present motion runs out: an exponential stop ends v/w farther on. */
  function hold(): void {
    presence = 'holding';
    run.easeRate = settlingRate(settings.holdMs);
    for (const axis of AXES) {
      const { goal, ease, correction } = axes[axis];
      const place = goalAt(goal, axis, run.clockMs, drift, longestHorizonMs) + ease.p + correction.p;
      const rate = goalRate(goal, axis, run.clockMs, drift, longestHorizonMs) + ease.v + correction.v;
      correction.p = correction.v = 0;
      ease.p = -rate / run.easeRate;
      ease.v = rate;
      goal.kind = 'rest';
      goal.level = place + rate / run.easeRate;
    }
  }

  function goHome(): void {
    presence = 'nobody';
    run.easeRate = settlingRate(settings.returnMs);
    for (const axis of AXES) redirect(axis, axes[axis].ease, 'home', homeEye[axis], 0, 0);
  }

  function slope(axis: Axis): number {
    return slopeOf(axes[axis].predictor, predictorMs[axis]);
  }

  /** The share of a speed, mm/ms, that is believed: v2/(v2 + rest2), so that the noise of a still viewer is not carried ahead. */
  function moving(speed: number): number {
    const square = (speed * 1000) ** 2;
    return square > 0 ? square / (square + settings.restMmPerS ** 2) : 0;
  }

  /** Whether a sample is too far from where the filtered viewer should be by now to be the same one. */
  function isAnother(eye: Point3, tMs: number): boolean {
    let square = 0;
    for (const axis of AXES) {
      const { predictor } = axes[axis];
      square += (eye[axis] - predict(predictor, tMs - predictor.tMs, predictorMs[axis])) ** 2;
    }
    return square > settings.jumpMm ** 2;
  }

  return {
    get presence() {
      return presence;
    },

    sample(eye, tMs) {
      requireEye(eye);
      if (tMs <= run.sampledMs) return;
      const appears = presence === 'nobody' || isAnother(eye, tMs);
      if (appears) {
        run.easeRate = settlingRate(settings.appearMs);
        resetEyeFilter(filter);
        for (const axis of AXES) axes[axis].predictor.started = false;
      }
      presence = 'following';
      run.sampledMs = tMs;
      stepEyeFilter(filter, eye, tMs, settings.filter);
      for (const axis of AXES) {
        stepDoubleExponential(axes[axis].predictor, filter[axis].value, tMs, predictorMs[axis]);
      }
      const across = moving(Math.hypot(slope('x'), slope('y')));
      const along = moving(slope('z'));
      for (const axis of AXES) {
        const { predictor, ease, correction } = axes[axis];
        const share = axis === 'z' ? along : across;
        const now = predict(predictor, settings.lagShare * axisLagMs(filter, axis), predictorMs[axis]);
        const level = predictor.once + share * (now - predictor.once);
        redirect(axis, appears ? ease : correction, 'viewer', level, share * slope(axis), tMs);
      }
    },

    lost(tMs) {
      if (presence !== 'following' || tMs < run.sampledMs) return;
      if (Number.isNaN(run.clockMs)) run.clockMs = tMs;
      run.lostMs = run.clockMs;
      hold();
    },

    at(tMs, out) {
      if (presence === 'following' && tMs > run.sampledMs + settings.silenceMs) {
        advance(run.sampledMs + settings.silenceMs);
        run.lostMs = run.clockMs;
        hold();
      }
      if (presence === 'holding' && tMs > run.lostMs + settings.holdMs) {
        advance(run.lostMs + settings.holdMs);
        goHome();
      }
      advance(tMs);
      for (const axis of AXES) {
        const { goal, ease, correction } = axes[axis];
        wanted[axis] = goalAt(goal, axis, run.clockMs, drift, longestHorizonMs) + ease.p + correction.p;
      }
      stepSpeedLimit(limit, wanted, run.clockMs, settings.greatestMmPerS);
      out.x = limit.limited.x;
      out.y = limit.limited.y;
      out.z = Math.max(settings.nearestMm, limit.limited.z);
    },
  };
}

function createAxis(homeMm: number): AxisState {
  return {
    predictor: createDoubleExponential(),
    goal: createGoal(homeMm),
    ease: createSettling(),
    correction: createSettling(),
  };
}
