import type { Spread } from '@oriel/shared/replay/spread';
import { FIRST_STEP, LADDER_STEPS } from '@oriel/shared/ladder/steps';
import type { ChartLine } from '../charts/line-chart';
import type { Measures } from './measures';

/** How much of the past the charts show, ms. */
export const SHOWN_MS = 30_000;

/** How many of the ladder's steps, from the finest on, place all landmarks. */
const WITH_LANDMARKS = LADDER_STEPS.filter(({ looking }) => looking.by === 'landmarks').length;

/** How a figure stands: with a word, and never by colour alone. */
export interface Standing {
  readonly is: 'good' | 'fair' | 'poor';
  readonly words: string;
}

/** One instrument as it reads now. */
export interface Reading {
  readonly name: string;
  readonly figure: string;
  readonly unit: string;
  /** Median and 95th percentile, in words; what to do where there is no figure. */
  readonly spread: string;
  readonly standing: Standing | null;
  /** What is good in this trade. */
  readonly good: string;
  readonly lines: readonly ChartLine[];
  readonly yLabel: string;
  readonly yLeast: number;
  /** What lies beyond runs off the top of the chart. */
  readonly yMost?: number;
  readonly yRange?: readonly [number, number];
  /** The steps of the ladder in words, where it is one. */
  readonly steps?: readonly { readonly words: string; readonly now: boolean }[];
}

/** Up to where each is good, and from where on it is poor; why, is said beside each. */
const LIMITS = {
  betweenLooksMs: { good: 1000 / 15, poor: 200 },
  lookMs: { good: 33, poor: 67 },
  latencyMs: { good: 50, poor: 100 },
  jitterMm: { good: 1, poor: 3 },
  frameMs: { good: 20, poor: 34 },
};
/** So long after the first look the camera's clock is known, or never will be. */
const CLOCK_KNOWN_MS = 20_000;

/** Every instrument, from the last half minute. */
export function readingsOf(measures: Measures, nowMs: number): Reading[] {
  const recent = { measures, sinceMs: nowMs - SHOWN_MS, nowMs };
  return [
    trackingReading(recent),
    lookReading(recent),
    latencyReading(recent),
    jitterReading(recent),
    lossesReading(recent),
    frameReading(recent),
    ladderReading(recent),
  ];
}

interface Recent {
  readonly measures: Measures;
  readonly sinceMs: number;
  readonly nowMs: number;
}

const line = ({ sinceMs, nowMs }: Recent, label: string, ink: ChartLine['ink'], series: Measures['total']): ChartLine => ({
  label,
  ink,
  points: series.points(sinceMs, nowMs),
});

function trackingReading(recent: Recent): Reading {
  const { trackingInterval } = recent.measures;
  const between = trackingInterval.spread(recent.sinceMs);
  // By the mean: looks that come in one after another after a pause do not make it quick.
  const meanMs = trackingInterval.mean(recent.sinceMs);
  return {
    name: 'Tracking',
    ...inFigures(1000 / meanMs, 'a second', 0),
    spread: spreadWords(between, 'ms between looks'),
    standing: standingOf({ median: meanMs, p95: between.p95 }, LIMITS.betweenLooksMs),
    good: 'Practice: about 4 a second is too slow to be believed, 15 is what a small computer should keep, 40 is a desktop’s.',
    lines: [line(recent, 'Tracking interval', 'ink', trackingInterval), goodUpTo(LIMITS.betweenLooksMs.good)],
    yLabel: 'between looks, ms',
    ...scaleFor(between, 100),
  };
}

function lookReading(recent: Recent): Reading {
  const { total, landmarks, detect, crop } = recent.measures;
  const look = total.spread(recent.sinceMs);
  const median = (series: Measures['total']) => ms(series.spread(recent.sinceMs).median);
  const parts = look.median >= 0 ? `; crop ${median(crop)}, detect ${median(detect)}, landmarks ${median(landmarks)}` : '';
  return {
    name: 'Time for one look',
    ...inFigures(look.median, 'ms', 1),
    spread: `${spreadWords(look, 'ms')}${parts}`,
    standing: standingOf(look, LIMITS.lookMs),
    good: 'Practice: under 33 ms a camera of 30 a second is looked at whole; beyond, frames are skipped.',
    lines: [
      line(recent, 'Total', 'ink', total),
      line(recent, 'Landmarks', 'near', landmarks),
      line(recent, 'Detect', 'far', detect),
      line(recent, 'Crop', 'middle', crop),
      goodUpTo(LIMITS.lookMs.good),
    ],
    yLabel: 'time, ms',
    ...scaleFor(look, 40),
  };
}

function latencyReading(recent: Recent): Reading {
  const latency = recent.measures.latency.spread(recent.sinceMs);
  return {
    name: 'Capture to drawing',
    ...inFigures(latency.median, 'ms', 0),
    spread: spreadWords(latency, 'ms') || latencyUnknown(recent),
    standing: standingOf(latency, LIMITS.latencyMs),
    good: 'Practice: under 50 ms prediction makes good well. Changes of 15 ms are noticed in headsets (Mania 2004), some 20 ms on a desk.',
    lines: [line(recent, 'Capture to drawing', 'ink', recent.measures.latency), goodUpTo(LIMITS.latencyMs.good)],
    yLabel: 'delay, ms',
    ...scaleFor(latency, 80),
  };
}

function jitterReading(recent: Recent): Reading {
  const { drawnJitter, seenJitter } = recent.measures;
  const jitter = drawnJitter.spread(recent.sinceMs);
  const words = spreadWords(jitter, 'mm', 2);
  return {
    name: 'Jitter at rest',
    ...inFigures(jitter.median, 'mm', 2),
    spread: words ? `${words}; before smoothing ${seenJitter.spread(recent.sinceMs).median.toFixed(2)}` : 'Stand still for two seconds.',
    standing: standingOf(jitter, LIMITS.jitterMm),
    good: 'Under 1 mm: that moves a layer 100 mm behind the glass by 0.14 mm, seen from 600 mm, just under what the eye can tell.',
    lines: [
      line(recent, 'As drawn', 'ink', drawnJitter),
      { ...line(recent, 'As the camera saw it', 'pencil', seenJitter), as: 'dashed' },
      goodUpTo(LIMITS.jitterMm.good),
    ],
    yLabel: 'jitter, mm',
    ...scaleFor(jitter, 2),
  };
}

function lossesReading(recent: Recent): Reading {
  const { found } = recent.measures;
  const losses = recent.measures.losses.count(recent.sinceMs);
  const looks = found.count(recent.sinceMs);
  return {
    name: 'Losses',
    figure: looks ? String(losses) : '–',
    unit: 'in half a minute',
    spread: looks
      ? `${(100 * found.mean(recent.sinceMs)).toFixed(0)} % of ${looks} looks found somebody`
      : 'Nobody has been looked for yet.',
    standing: looks ? (losses === 0 ? GOOD : losses < 3 ? FAIR : POOR) : null,
    good: 'Practice: someone who stays in view should never be lost. Better light helps first.',
    lines: [line(recent, 'Somebody found', 'ink', found)],
    yLabel: '1 found, 0 not',
    yLeast: 1,
  };
}

function frameReading(recent: Recent): Reading {
  const frame = recent.measures.frameInterval.spread(recent.sinceMs);
  return {
    name: 'Frame interval of this page',
    ...inFigures(frame.median, 'ms', 1),
    spread: spreadWords(frame, 'ms'),
    standing: standingOf(frame, LIMITS.frameMs),
    good: '17 ms is 60 a second. Practice: from 33 ms on motion is seen to stutter. The charts themselves cost a little.',
    lines: [line(recent, 'Frame interval', 'ink', recent.measures.frameInterval), goodUpTo(LIMITS.frameMs.poor)],
    yLabel: 'between frames, ms',
    ...scaleFor(frame, 50),
  };
}

/** Counted from 1, the finest, which is drawn at the top. */
function ladderReading(recent: Recent): Reading {
  const { measures, sinceMs } = recent;
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
    standing: Number.isFinite(steps.median) ? ladderStanding(changes.length, ladder?.step ?? 0) : null,
    good: `Step ${FIRST_STEP + 1} is where it begins; 1 to ${WITH_LANDMARKS} place all landmarks, from ${WITH_LANDMARKS + 1} on the distance of a turned head is less sure. A step kept for long is good, one that changes every few seconds is not.`,
    lines: [{ ...line(recent, 'Step of the ladder', 'ink', measures.ladderStep), as: 'steps' }],
    yLabel: 'step',
    yLeast: 0,
    yRange: [LADDER_STEPS.length, 1],
    steps: LADDER_STEPS.map(({ words }, step) => ({ words, now: ladder?.step === step })),
  };
}

const GOOD: Standing = { is: 'good', words: 'good' };
const FAIR: Standing = { is: 'fair', words: 'fair' };
const POOR: Standing = { is: 'poor', words: 'poor' };

/** By the median; good in the middle and poor once in twenty is uneven. */
function standingOf({ median, p95 }: Spread, { good, poor }: { readonly good: number; readonly poor: number }): Standing | null {
  if (!Number.isFinite(median)) return null;
  if (median > good) return median < poor ? FAIR : POOR;
  return p95 < poor ? GOOD : { is: 'fair', words: 'uneven' };
}

function ladderStanding(changes: number, step: number): Standing {
  if (changes > 3) return { is: 'poor', words: 'restless' };
  return step < WITH_LANDMARKS ? GOOD : FAIR;
}

/** A dashed line across the whole chart: below it is good. */
const goodUpTo = (y: number): ChartLine => ({
  label: `Good below ${Number(y.toFixed(0))}`,
  ink: 'clear',
  as: 'dashed',
  points: [
    { x: -SHOWN_MS / 1000, y },
    { x: 0, y },
  ],
});

/** So that one peak does not flatten all the rest; the end is a round figure. */
function scaleFor({ p95 }: Spread, yLeast: number) {
  const step = yLeast / 2;
  return { yLeast, ...(p95 >= 0 ? { yMost: Math.max(yLeast, step * Math.ceil((1.5 * p95) / step)) } : {}) };
}

const latencyUnknown = ({ measures, nowMs }: Recent): string =>
  nowMs - measures.firstLookMs > CLOCK_KNOWN_MS
    ? 'Not known here: this browser does not tell when a frame was captured. The mirror test measures the whole delay.'
    : 'Known a few seconds after somebody is followed.';

const ms = (figure: number) => figure.toFixed(1);

const inFigures = (figure: number, unit: string, digits: number) => ({
  figure: Number.isFinite(figure) ? figure.toFixed(digits) : '–',
  unit,
});

function spreadWords({ median, p95 }: Spread, unit: string, digits = 1): string {
  return Number.isFinite(median) ? `median ${median.toFixed(digits)}, 95 % under ${p95.toFixed(digits)} ${unit}` : '';
}
