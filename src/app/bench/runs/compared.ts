import { figuresOf } from '@oriel/shared/replay/run-figures';
import type { ChartPoint } from '../charts/line-chart';
import { thinOut } from '../charts/thin-out';
import type { WholeRun } from './runs-store';

/** One line of the comparison: what, the figures of both runs, and what is better. */
export interface ComparedRow {
  readonly name: string;
  readonly a: string;
  readonly b: string;
}

const COLUMNS = 300;

/** Two runs side by side, in figures. */
export function compared(a: WholeRun, b: WholeRun): ComparedRow[] {
  const [of, to] = [a, b].map(({ run, samples }) => figuresOf(samples, run.tuning));
  const row = (name: string, say: (figures: typeof of) => string): ComparedRow => ({ name, a: say(of), b: say(to) });
  const spread = (name: string, key: 'intervalMs' | 'cropMs' | 'detectMs' | 'landmarksMs' | 'totalMs' | 'arrivalMs') =>
    row(name, (figures) => `${said(figures[key].median, 1)} / ${said(figures[key].p95, 1)}`);
  return [
    row('Tracked a second', ({ trackedPerS }) => said(trackedPerS, 1)),
    spread('Between looks, ms', 'intervalMs'),
    spread('One look, ms', 'totalMs'),
    spread('Crop, ms', 'cropMs'),
    spread('Detect, ms', 'detectMs'),
    spread('Landmarks, ms', 'landmarksMs'),
    spread('Capture to the page, ms', 'arrivalMs'),
    { name: 'Between frames drawn, ms', a: frames(a), b: frames(b) },
    row('Jitter at rest as seen, mm', ({ seenJitterMm }) => said(seenJitterMm, 2)),
    row('Jitter at rest as drawn, mm', ({ drawnJitterMm }) => said(drawnJitterMm, 2)),
    row('Jitter of distance as seen, mm', ({ seenAlongJitterMm }) => said(seenAlongJitterMm, 1)),
    row('Lag in motion as drawn, ms', ({ lagMs }) => said(lagMs, 0)),
    row('Lost', ({ losses }) => `${losses} ${losses === 1 ? 'time' : 'times'}`),
    row('Looks that found somebody', ({ foundShare }) => `${said(100 * foundShare, 0)} %`),
  ];
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

const frames = ({ run }: WholeRun) => `${said(run.frameIntervalP50Ms, 1)} / ${said(run.frameIntervalP95Ms, 1)}`;

const said = (figure: number, digits: number) => (Number.isFinite(figure) ? figure.toFixed(digits) : 'not shown');
