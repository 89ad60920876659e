import type { Spread } from '@oriel/shared/replay/spread';
import { FIRST_STEP, LADDER_STEPS } from '@oriel/shared/ladder/steps';
import type { ChartLine } from '../charts/line-chart';
import type { Measures } from './measures';

/** How much of the past the charts show, ms. */
export const SHOWN_MS = 30_000;

/** How many of the ladder's steps, from the finest on, place all landmarks. */
const WITH_LANDMARKS = LADDER_STEPS.filter(({ looking }) => looking.by === 'landmarks').length;

/** One instrument as it reads now. */
export interface Reading {
  readonly name: string;
  readonly figure: string;
  readonly unit: string;
  /** Median and 95th percentile, in words; what to do where there is no figure. */
  readonly spread: string;
  /** What is good in this trade. */
  readonly good: string;
  readonly lines: readonly ChartLine[];
  readonly yLabel: string;
  readonly yLeast: number;
  readonly yRange?: readonly [number, number];
}

/** Every instrument, from the last half minute. */
export function readingsOf(measures: Measures, nowMs: number): Reading[] {
  const since = nowMs - SHOWN_MS;
  const frame = measures.frameInterval.spread(since);
  const tracking = measures.trackingInterval.spread(since);
  const total = measures.total.spread(since);
  const latency = measures.latency.spread(since);
  const jitter = measures.drawnJitter.spread(since);
  const losses = measures.losses.count(since);
  const looks = measures.found.count(since);
  const line = (label: string, ink: ChartLine['ink'], series: Measures['total']): ChartLine => ({
    label,
    ink,
    points: series.points(since, nowMs),
  });
  return [
    {
      name: 'Tracking',
      // By the mean: looks that come in one after another after a pause do not make it quick.
      ...inFigures(1000 / measures.trackingInterval.mean(since), 'a second', 0),
      spread: spreadWords(tracking, 'ms between looks'),
      good: 'Practice: about 4 a second is too slow to be believed, 15 is what a small computer should keep, 40 is a desktop’s.',
      lines: [line('Tracking interval', 'ink', measures.trackingInterval)],
      yLabel: 'between looks, ms',
      yLeast: 80,
    },
    {
      name: 'Time for one look',
      ...inFigures(total.median, 'ms', 1),
      spread: `${spreadWords(total, 'ms')}${total.median >= 0 ? `; crop ${ms(measures.crop.spread(since).median)}, detect ${ms(measures.detect.spread(since).median)}, landmarks ${ms(measures.landmarks.spread(since).median)}` : ''}`,
      good: 'Practice: under 33 ms a camera of 30 a second is looked at whole; beyond, frames are skipped.',
      lines: [
        line('Total', 'ink', measures.total),
        line('Landmarks', 'near', measures.landmarks),
        line('Detect', 'far', measures.detect),
        line('Crop', 'middle', measures.crop),
      ],
      yLabel: 'time, ms',
      yLeast: 20,
    },
    {
      name: 'Capture to drawing',
      ...inFigures(latency.median, 'ms', 0),
      spread: spreadWords(latency, 'ms') || 'The camera’s own clock is known after a few seconds of following.',
      good: 'Changes of 15 ms are noticed in headsets (Mania 2004), some 20 ms on a desk. Prediction makes good what is steady.',
      lines: [line('Capture to drawing', 'ink', measures.latency)],
      yLabel: 'delay, ms',
      yLeast: 80,
    },
    {
      name: 'Jitter at rest',
      ...inFigures(jitter.median, 'mm', 2),
      spread: spreadWords(jitter, 'mm', 2)
        ? `${spreadWords(jitter, 'mm', 2)}; before smoothing ${measures.seenJitter.spread(since).median.toFixed(2)}`
        : 'Stand still for two seconds.',
      good: '1 mm of the eye moves a layer 100 mm behind the glass by 0.14 mm, seen from 600 mm: just under what the eye can tell.',
      lines: [
        line('As drawn', 'ink', measures.drawnJitter),
        { ...line('As the camera saw it', 'pencil', measures.seenJitter), as: 'dashed' },
      ],
      yLabel: 'jitter, mm',
      yLeast: 1,
    },
    {
      name: 'Losses',
      figure: looks ? String(losses) : '–',
      unit: 'in half a minute',
      spread: looks
        ? `${(100 * measures.found.mean(since)).toFixed(0)} % of ${looks} looks found somebody`
        : 'Nobody has been looked for yet.',
      good: 'Practice: someone who stays in view should never be lost. Better light helps first.',
      lines: [line('Somebody found', 'ink', measures.found)],
      yLabel: '1 found, 0 not',
      yLeast: 1,
    },
    {
      name: 'Frame interval of this page',
      ...inFigures(frame.median, 'ms', 1),
      spread: spreadWords(frame, 'ms'),
      good: '17 ms is 60 a second. Practice: from 33 ms on motion is seen to stutter. The charts themselves cost a little.',
      lines: [line('Frame interval', 'ink', measures.frameInterval)],
      yLabel: 'between frames, ms',
      yLeast: 50,
    },
    ladderReading(measures, since, line('Step of the ladder', 'ink', measures.ladderStep)),
  ];
}

/** Counted from 1, the finest, which is drawn at the top. */
function ladderReading(measures: Measures, sinceMs: number, line: ChartLine): Reading {
  const { ladder } = measures;
  const steps = measures.ladderStep.spread(sinceMs);
  const changes = ladder?.changes.filter(({ tMs }) => tMs >= sinceMs) ?? [];
  const [last] = changes.slice(-1);
  return {
    name: 'Ladder',
    figure: ladder ? String(ladder.step + 1) : '–',
    unit: `of ${LADDER_STEPS.length}: ${ladder?.words ?? 'nothing is looked for'}`,
    spread: Number.isFinite(steps.median)
      ? `median step ${steps.median}, 95 % at ${steps.p95} or finer; changes in half a minute: ${changes.length}${last ? `, the last one ${last.reason}` : ''}`
      : '',
    good: `Step ${FIRST_STEP + 1} is where it begins; 1 to ${WITH_LANDMARKS} place all landmarks, from ${WITH_LANDMARKS + 1} on the distance of a turned head is less sure. A step kept for long is good, one that changes every few seconds is not.`,
    lines: [{ ...line, as: 'steps' }],
    yLabel: 'step',
    yLeast: 0,
    yRange: [LADDER_STEPS.length, 1],
  };
}

const ms = (figure: number) => figure.toFixed(1);

const inFigures = (figure: number, unit: string, digits: number) => ({
  figure: Number.isFinite(figure) ? figure.toFixed(digits) : '–',
  unit,
});

function spreadWords({ median, p95 }: Spread, unit: string, digits = 1): string {
  return Number.isFinite(median) ? `median ${median.toFixed(digits)}, 95 % under ${p95.toFixed(digits)} ${unit}` : '';
}
