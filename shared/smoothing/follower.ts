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
  return new Pipeline(settings);
}

class Pipeline implements Follower {
  presence: Presence = 'nobody';
  private readonly predictorMs: Readonly<Record<Axis, number>>;
  private readonly filter = createEyeFilter();
  private readonly limit = createSpeedLimit();
  private readonly axes: Readonly<Record<Axis, AxisState>>;
  private readonly wanted: { x: number; y: number; z: number };
  /** Moments, ms. */
  private clockMs = NaN;
  private sampledMs = -Infinity;
  private lostMs = 0;
  private easeRate: number;

  constructor(private readonly settings: FollowerSettings) {
    const { homeEye, predictor, returnMs } = settings;
    this.predictorMs = { x: predictor.acrossMs, y: predictor.acrossMs, z: predictor.alongMs };
    this.axes = { x: createAxis(homeEye.x), y: createAxis(homeEye.y), z: createAxis(homeEye.z) };
    this.wanted = { x: homeEye.x, y: homeEye.y, z: homeEye.z };
    this.easeRate = settlingRate(returnMs);
  }

  sample(eye: Point3, tMs: number): void {
    requireEye(eye);
    if (tMs <= this.sampledMs) return;
    const appears = this.presence === 'nobody' || this.isAnother(eye, tMs);
    if (appears) this.startAfresh();
    this.presence = 'following';
    this.sampledMs = tMs;
    stepEyeFilter(this.filter, eye, tMs, this.settings.filter);
    for (const axis of AXES)
      stepDoubleExponential(this.axes[axis].predictor, this.filter[axis].value, tMs, this.predictorMs[axis]);
    const across = this.moving(Math.hypot(this.slope('x'), this.slope('y')));
    const along = this.moving(this.slope('z'));
    for (const axis of AXES) {
      const { predictor, ease, correction } = this.axes[axis];
      const share = axis === 'z' ? along : across;
      const now = predict(predictor, this.settings.lagShare * axisLagMs(this.filter, axis), this.predictorMs[axis]);
      const level = predictor.once + share * (now - predictor.once);
      this.redirect(axis, appears ? ease : correction, 'viewer', level, share * this.slope(axis), tMs);
    }
  }

  lost(tMs: number): void {
    if (this.presence !== 'following' || tMs < this.sampledMs) return;
    if (Number.isNaN(this.clockMs)) this.clockMs = tMs;
    this.hold();
  }

  at(tMs: number, out: { x: number; y: number; z: number }): void {
    const { silenceMs, holdMs, greatestMmPerS, nearestMm } = this.settings;
    if (this.presence === 'following' && tMs > this.sampledMs + silenceMs) {
      this.advance(this.sampledMs + silenceMs);
      this.hold();
    }
    if (this.presence === 'holding' && tMs > this.lostMs + holdMs) {
      this.advance(this.lostMs + holdMs);
      this.goHome();
    }
    this.advance(tMs);
    for (const axis of AXES) {
      const { ease, correction } = this.axes[axis];
      this.wanted[axis] = this.goalNow(axis) + ease.p + correction.p;
    }
    stepSpeedLimit(this.limit, this.wanted, this.clockMs, greatestMmPerS);
    out.x = this.limit.limited.x;
    out.y = this.limit.limited.y;
    out.z = Math.max(nearestMm, this.limit.limited.z);
  }

  /** Lets the differences die away up to `tMs`. */
  private advance(tMs: number): void {
    const dtMs = tMs - this.clockMs;
    if (dtMs > 0) {
      for (const axis of AXES) {
        stepSettling(this.axes[axis].ease, dtMs, this.easeRate);
        stepSettling(this.axes[axis].correction, dtMs, settlingRate(this.settings.correctionMs));
      }
    }
    if (!(dtMs <= 0)) this.clockMs = tMs;
  }

  /** Forgets how the last viewer moved; the way to the new one is eased. */
  private startAfresh(): void {
    this.easeRate = settlingRate(this.settings.appearMs);
    resetEyeFilter(this.filter);
    for (const axis of AXES) this.axes[axis].predictor.started = false;
  }

  /** Gives an axis a new goal and adds what it jumps by to `into`. */
  private redirect(axis: Axis, into: Settling, kind: Goal['kind'], level: number, slope: number, tMs: number): void {
    const { goal } = this.axes[axis];
    const running = !Number.isNaN(this.clockMs);
    const place = running ? this.goalNow(axis) : 0;
    const rate = running ? this.goalRateNow(axis) : 0;
    goal.kind = kind;
    goal.level = level;
    goal.slope = slope;
    goal.tMs = tMs;
    if (running) addJump(into, place - this.goalNow(axis), rate - this.goalRateNow(axis));
  }

  /** Stops where the present motion runs out: an exponential stop ends v/w farther on. */
  private hold(): void {
    this.presence = 'holding';
    this.lostMs = this.clockMs;
    this.easeRate = settlingRate(this.settings.holdMs);
    for (const axis of AXES) {
      const { goal, ease, correction } = this.axes[axis];
      const place = this.goalNow(axis) + ease.p + correction.p;
      const rate = this.goalRateNow(axis) + ease.v + correction.v;
      correction.p = correction.v = 0;
      ease.p = -rate / this.easeRate;
      ease.v = rate;
      goal.kind = 'rest';
      goal.level = place + rate / this.easeRate;
    }
  }

  private goHome(): void {
    this.presence = 'nobody';
    this.easeRate = settlingRate(this.settings.returnMs);
    for (const axis of AXES) this.redirect(axis, this.axes[axis].ease, 'home', this.settings.homeEye[axis], 0, 0);
  }

  private goalNow(axis: Axis): number {
    return goalAt(this.axes[axis].goal, axis, this.clockMs, this.settings.drift, this.settings.longestHorizonMs);
  }

  private goalRateNow(axis: Axis): number {
    return goalRate(this.axes[axis].goal, axis, this.clockMs, this.settings.drift, this.settings.longestHorizonMs);
  }

  private slope(axis: Axis): number {
    return slopeOf(this.axes[axis].predictor, this.predictorMs[axis]);
  }

  /** The share of a speed, mm/ms, that is believed: v2/(v2 + rest2), so that the noise of a still viewer is not carried ahead. */
  private moving(speed: number): number {
    const square = (speed * 1000) ** 2;
    return square > 0 ? square / (square + this.settings.restMmPerS ** 2) : 0;
  }

  /** Whether a sample is too far from where the filtered viewer should be by now to be the same one. */
  private isAnother(eye: Point3, tMs: number): boolean {
    let square = 0;
    for (const axis of AXES) {
      const { predictor } = this.axes[axis];
      square += (eye[axis] - predict(predictor, tMs - predictor.tMs, this.predictorMs[axis])) ** 2;
    }
    return square > this.settings.jumpMm ** 2;
  }
}

function createAxis(homeMm: number): AxisState {
  return {
    predictor: createDoubleExponential(),
    goal: createGoal(homeMm),
    ease: createSettling(),
    correction: createSettling(),
  };
}
