import { figuresOf } from '@oriel/shared/replay/run-figures';
import type { WholeRun } from './runs-store';

/** So many times the other's, and so many ms more, is plainly slower: no setting of following does that (practice). */
const PLAINLY = { times: 2, ms: 30 };

/** One sentence where one run's machine was plainly slower, by the slowest looks in twenty; empty where neither was, or it is not known. */
export function slowerWords(a: WholeRun, b: WholeRun): string {
  const [of, to] = [a, b].map(({ run, samples }) => figuresOf(samples, run.tuning));
  for (const { what, from, other } of [
    { what: 'from capture to the page', from: of.arrivalMs.p95, other: to.arrivalMs.p95 },
    { what: 'for one look', from: of.totalMs.p95, other: to.totalMs.p95 },
  ]) {
    const [slow, quick] = [Math.max(from, other), Math.min(from, other)];
    if (!(slow >= PLAINLY.times * quick && slow >= quick + PLAINLY.ms)) continue;
    const name = (from > other ? a : b).run.name;
    return `The machine was plainly slower in ${name}: ${slow.toFixed(0)} ms ${what} against ${quick.toFixed(0)} (95th percentile). What differs comes from that before it comes from settings.`;
  }
  return '';
}
