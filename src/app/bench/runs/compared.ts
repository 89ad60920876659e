import { figuresOf } from '@oriel/shared/replay/run-figures';
import type { Spread } from '@oriel/shared/replay/spread';
import type { ChartPoint } from '../charts/line-chart';
import { thinOut } from '../charts/thin-out';
import type { WholeRun } from './runs-store';

/** One line of the comparison: what, what is good, and the figures of both runs. */
export interface ComparedRow {
  readonly name: string;
  readonly good?: string;
  readonly a: string;
  readonly b: string;
  /** Which is better, by a tenth and more; null where neither is. */
  readonly better: 'a' | 'b' | null;
  /** Why a figure is not there. */
  readonly why?: string;
}

/** What a row is judged by, and whether less of it is better. */
interface Judged<F> {
  /** Of several, none may contradict another. */
  readonly by?: (figures: F) => number | Spread;
  readonly more?: boolean;
}

const SHARE_NOTICED = 0.1;

const COLUMNS = 300;
const NOT_SHOWN = 'not shown';

const whyNoCapture = 'The browser did not tell when a frame was captured. A mirror test measures the whole delay.';
const whyNoRest = 'Nobody stands still in it for long enough.';
const whyNoMotion = 'Nobody moves from side to side in it for long enough.';

/** Two runs side by side, in figures. */
export function compared(a: WholeRun, b: WholeRun): ComparedRow[] {
  const [of, to] = [a, b].map(({ run, samples }) => figuresOf(samples, run.tuning));
  type Figures = typeof of;
  const row = (
    name: string,
    say: (figures: Figures) => string,
    { good, why, by, more }: { good?: string; why?: string } & Judged<Figures> = {},
  ): ComparedRow => {
    const said = { a: say(of), b: say(to) };
    const missing = Object.values(said).some((figure) => figure.startsWith('not '));
    return { name, ...said, ...(good && { good }), ...(why && missing && { why }), better: by ? betterOf(by(of), by(to), more) : null };
  };
  const spread = (name: string, key: 'intervalMs' | 'cropMs' | 'detectMs' | 'landmarksMs' | 'totalMs', good?: string) =>
    row(name, (figures) => spreadSaid(figures[key]), { good, by: (figures) => figures[key] });
  return [
    row('Tracked a second', ({ trackedPerS }) => said(trackedPerS, 1), { good: '15 and more; a desktop’s is 30 to 40', by: ({ trackedPerS }) => trackedPerS, more: true }),
    spread('Between looks, ms', 'intervalMs', 'under 67'),
    spread('One look, ms', 'totalMs', 'under 33'),
    spread('of it crop, ms', 'cropMs'),
    spread('of it detect, ms', 'detectMs'),
    spread('of it landmarks, ms', 'landmarksMs'),
    row('Capture to the page, ms', ({ arrivalMs }) => spreadSaid(arrivalMs, 'not known here'), { good: 'little, and steady', why: whyNoCapture, by: ({ arrivalMs }) => arrivalMs }),
    { name: 'Between frames drawn, ms', good: '17; from 33 on motion stutters', a: frames(a), b: frames(b), better: betterOf(a.run.frameIntervalP95Ms, b.run.frameIntervalP95Ms) },
    row('Jitter at rest as drawn, mm', ({ drawnJitterMm }) => said(drawnJitterMm, 2), { good: 'under 1', why: whyNoRest, by: ({ drawnJitterMm }) => drawnJitterMm }),
    row('Jitter at rest as seen, mm', ({ seenJitterMm }) => said(seenJitterMm, 2), { why: whyNoRest, by: ({ seenJitterMm }) => seenJitterMm }),
    row('Jitter of distance as seen, mm', ({ seenAlongJitterMm }) => said(seenAlongJitterMm, 1), { why: whyNoRest, by: ({ seenAlongJitterMm }) => seenAlongJitterMm }),
    row('Lag in motion as drawn, ms', ({ lagMs }) => said(lagMs, 0), { good: 'under 20', why: whyNoMotion, by: ({ lagMs }) => Math.abs(lagMs) }),
    row('Lost', ({ losses }) => `${losses} ${losses === 1 ? 'time' : 'times'}`, { good: 'never, while in view', by: ({ losses }) => losses }),
    row('Looks that found somebody', ({ foundShare }) => `${said(100 * foundShare, 0)} %`, { by: ({ foundShare }) => foundShare, more: true }),
  ];
}

function betterOf(a: number | Spread, b: number | Spread, more = false): 'a' | 'b' | null {
  if (typeof a === 'object' && typeof b === 'object') {
    const [median, p95] = [betterOf(a.median, b.median), betterOf(a.p95, b.p95)];
    return median && p95 && median !== p95 ? null : (median ?? p95);
  }
  if (typeof a === 'object' || typeof b === 'object') return null;
  if (!(Math.abs(a - b) > SHARE_NOTICED * Math.max(a, b))) return null;
  return a < b === more ? 'b' : 'a';
}

/** A figure of each sample over the run, in seconds. */
export function overTime({ samples }: WholeRun, figure: 'interval' | 'totalMs'): readonly ChartPoint[] {
  const start = samples[0]?.receivedMs ?? 0;
  const points = samples.slice(1).map((sample, i) => ({
    x: (sample.receivedMs - start) / 1000,
    y: figure === 'interval' ? sample.receivedMs - samples[i].receivedMs : sample.totalMs,
  }));
  return thinOut(points, COLUMNS);
}

const frames = ({ run: { frameIntervalP50Ms, frameIntervalP95Ms } }: WholeRun) =>
  frameIntervalP50Ms > 0 ? `${said(frameIntervalP50Ms, 1)} / ${said(frameIntervalP95Ms, 1)}` : NOT_SHOWN;

const spreadSaid = ({ median, p95 }: Spread, otherwise = NOT_SHOWN) =>
  Number.isNaN(median) ? otherwise : `${said(median, 1)} / ${said(p95, 1)}`;

const said = (figure: number, digits: number) => (Number.isFinite(figure) ? figure.toFixed(digits) : NOT_SHOWN);
