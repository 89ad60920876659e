import { CaptureClock } from '../../../src/app/tracking/capture-clock';
import { quantile, rounded } from '../tracking/statistics';
import type { Seen } from './probe';

/** Median and 95th percentile, ms; null where nothing was measured. */
export type Spread = readonly [p50: number, p95: number] | null;

/** What a page did within a span of time. */
export interface Figures {
  readonly framesPerS: number;
  /** From the beginning of one frame to that of the next. */
  readonly frameMs: Spread;
  readonly trackedPerS: number;
  readonly lookMs: Spread;
  /** Of the first frame drawn with each sample of a face. */
  readonly captureToDrawnMs: Spread;
  readonly drawnToPresentedMs: Spread;
}

export const spread = (values: readonly number[]): Spread => (values.length === 0 ? null : [rounded1(quantile(values, 0.5)), rounded1(quantile(values, 0.95))]);

const rounded1 = (value: number): number => Math.round(value * 10) / 10;

/** The figures of what was seen from `fromMs` until `untilMs`, on the page's clock. */
export function figuresOf({ frames, looks, captures, presented }: Seen, fromMs: number, untilMs: number): Figures {
  const within = (tMs: number): boolean => tMs >= fromMs && tMs < untilMs;
  const drawn = frames.filter(([beganMs]) => within(beganMs));
  const faces = looks.filter(([, receivedMs, found]) => found && within(receivedMs));
  const seconds = (untilMs - fromMs) / 1000;
  return {
    framesPerS: rounded(drawn.length / seconds),
    frameMs: spread(drawn.slice(1).map(([beganMs], index) => beganMs - drawn[index][0])),
    trackedPerS: rounded(faces.length / seconds),
    lookMs: spread(faces.map(([, , , lookMs]) => lookMs)),
    captureToDrawnMs: spread(delays(faces, frames, clockOffsetMs(looks, captures))),
    drawnToPresentedMs: spread(presented.filter(([drawnMs]) => within(drawnMs)).map(([drawnMs, presentedMs]) => presentedMs - drawnMs)),
  };
}

/** From capture of each face to the end of the first frame begun after its sample had come. */
function delays(faces: Seen['looks'], frames: Seen['frames'], offsetMs: number | null): number[] {
  if (offsetMs === null) return [];
  let next = 0;
  return faces.flatMap(([timestampMs, receivedMs]) => {
    while (next < frames.length && frames[next][1] < receivedMs) next++;
    return next < frames.length ? [frames[next][1] - (timestampMs + offsetMs)] : [];
  });
}

/** Frames of the time in which captures were told, and no others, can be matched to them; a sample comes this much later at the most. */
const CLOCK_SLACK_MS = 150;

function clockOffsetMs(looks: Seen['looks'], captures: readonly number[]): number | null {
  const clock = new CaptureClock();
  const untilMs = captures.at(-1) ?? 0;
  for (const captureMs of captures) clock.noteCapture(captureMs);
  for (const [timestampMs, receivedMs] of looks) if (receivedMs <= untilMs + CLOCK_SLACK_MS) clock.noteFrame(timestampMs, receivedMs);
  return clock.offsetMs();
}

/** Second by second: frames drawn, faces tracked, the ladder's step at its end. */
export function secondsOf({ frames, looks, changes }: Seen, fromMs: number, untilMs: number, firstStep: number): [frames: number, faces: number, lookMs: number | null, step: number][] {
  return Array.from({ length: Math.floor((untilMs - fromMs) / 1000) }, (_, second) => {
    const beginMs = fromMs + second * 1000;
    const within = (tMs: number): boolean => tMs >= beginMs && tMs < beginMs + 1000;
    const faces = looks.filter(([, receivedMs, found]) => found && within(receivedMs));
    const before = changes.filter(({ tMs }) => tMs < beginMs + 1000);
    return [frames.filter(([beganMs]) => within(beganMs)).length, faces.length, faces.length ? rounded1(quantile(faces.map((look) => look[3]), 0.5)) : null, before.at(-1)?.to ?? firstStep];
  });
}
