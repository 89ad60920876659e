import type { Spread } from '@oriel/shared/replay/spread';
import type { ChartLine } from '../charts/line-chart';
import type { Measures } from './measures';

/** How much of the past the charts show, ms. */
export const SHOWN_MS = 30_000;

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
      ...inFigures(tracking.median ? 1000 / tracking.median : NaN, 'a second', 0),
      spread: spreadWords(tracking, 'ms between looks'),
      good: 'Practice: about 4 a second is too slow to be believed, 15 is what a small computer should keep, 40 is a desktop’s.',
      lines: [line('Tracking interval', 'ink', measures.trackingInterval)],
      yLabel: 'ms',
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
      yLabel: 'ms',
      yLeast: 20,
    },
    {
      name: 'Capture to drawing',
      ...inFigures(latency.median, 'ms', 0),
      spread: spreadWords(latency, 'ms') || 'The camera’s own clock is known after a few seconds of following.',
      good: 'Changes of 15 ms are noticed in headsets (Mania 2004), some 20 ms on a desk. Prediction makes good what is steady.',
      lines: [line('Capture to drawing', 'ink', measures.latency)],
      yLabel: 'ms',
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
      yLabel: 'mm',
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
      yLabel: 'found',
      yLeast: 1,
    },
    {
      name: 'Frame interval of this page',
      ...inFigures(frame.median, 'ms', 1),
      spread: spreadWords(frame, 'ms'),
      good: '17 ms is 60 a second. Practice: from 33 ms on motion is seen to stutter. The charts themselves cost a little.',
      lines: [line('Frame interval', 'ink', measures.frameInterval)],
      yLabel: 'ms',
      yLeast: 50,
    },
  ];
}

const ms = (figure: number) => figure.toFixed(1);

const inFigures = (figure: number, unit: string, digits: number) => ({
  figure: Number.isFinite(figure) ? figure.toFixed(digits) : '–',
  unit,
});

function spreadWords({ median, p95 }: Spread, unit: string, digits = 1): string {
  return Number.isFinite(median) ? `median ${median.toFixed(digits)}, 95 % under ${p95.toFixed(digits)} ${unit}` : '';
}
