import { usualTuning } from '@oriel/shared/contracts/new-wall';
import { normalNoise } from '@oriel/shared/replay/testing';
import type { EyeSample } from '../../tracking/eye-sample';
import { readingsOf } from './instruments';
import { Measures } from './measures';

const timings = { cropMs: 1, detectMs: 2, landmarksMs: 5, totalMs: 8 };

/** Plays samples at 30 a second that arrive 40 ms late, and frames at 60, into the instruments. */
function played(path: (tMs: number) => number | null, untilMs = 10_000): { measures: Measures; nowMs: number } {
  const measures = new Measures(usualTuning);
  const noise = normalNoise();
  let next = 0;
  let nowMs = 0;
  for (let frame = 0; (nowMs = (frame * 1000) / 60) < untilMs; frame++) {
    for (; next + 40 <= nowMs; next += 1000 / 30) {
      const x = path(next);
      const eye = { x: (x ?? 0) + 0.5 * noise(), y: 0.5 * noise(), z: 1000 };
      const sample: EyeSample = {
        found: x !== null,
        eye,
        capturedMs: next,
        receivedMs: next + 40,
        captureTimeKnown: true,
        timings,
        frameWidth: 640,
        frameHeight: 480,
        landmarks: null,
        viewer: 1,
        others: [],
      };
      measures.sample(sample);
    }
    measures.frame(nowMs, nowMs);
    if (frame % 15 === 0) measures.judge(nowMs);
  }
  return { measures, nowMs };
}

const reading = (name: string, { measures, nowMs }: ReturnType<typeof played>) =>
  readingsOf(measures, nowMs).find((one) => one.name === name)!;

describe('the instruments', () => {
  it('read what was played: 30 a second, 8 ms a look, 40 ms and up to a frame from capture to drawing', () => {
    const still = played(() => 100);
    expect(reading('Tracking', still).figure).toBe('30');
    expect(reading('Time for one look', still).figure).toBe('8.0');
    const latency = Number(reading('Capture to drawing', still).figure);
    expect(latency).toBeGreaterThanOrEqual(40);
    expect(latency).toBeLessThanOrEqual(57);
    expect(reading('Frame interval of this page', still).figure).toBe('16.7');
    expect(reading('Losses', still).figure).toBe('0');
  });

  it('see 0.5 mm of noise in x and y as 0.7 mm (sqrt 2, computed), and draw less', () => {
    const still = played(() => 100);
    const seen = still.measures.seenJitter.spread(0).median;
    expect(seen).toBeCloseTo(0.5 * Math.SQRT2, 1);
    expect(Number(reading('Jitter at rest', still).figure)).toBeLessThan(seen / 2);
  });

  it('give no jitter for somebody who walks', () => {
    expect(
      reading(
        'Jitter at rest',
        played((tMs) => tMs / 2),
      ).figure,
    ).toBe('–');
  });

  it('give none for somebody who turns about every second and a half: half of their way has no mean', () => {
    const turning = played((tMs) => 150 * Math.sin((2 * Math.PI * tMs) / 3000));
    expect(reading('Jitter at rest', turning).figure).toBe('–');
  });

  it('count how often somebody was lost', () => {
    const lost = played((tMs) => (Math.floor(tMs / 1000) % 2 ? null : 0));
    expect(reading('Losses', lost).figure).toBe('5');
    expect(reading('Losses', lost).spread).toContain('50 %');
  });

  it('say what is missing before anything came', () => {
    const nothing = { measures: new Measures(usualTuning), nowMs: 0 };
    expect(reading('Tracking', nothing).figure).toBe('–');
    expect(reading('Jitter at rest', nothing).spread).toContain('Stand still');
  });

  it('show the step of the ladder, counted from the finest, and what changed', () => {
    const { measures, nowMs } = played(() => 100);
    const change = { tMs: nowMs - 1000, from: 1, to: 2, reason: 'looks took 60 ms' };
    for (let k = 0; k < 8; k++)
      measures.stand(nowMs - 2000 + 250 * k, {
        step: k < 4 ? 1 : 2,
        words: 'landmarks, checked every tenth frame',
        lookedBy: 'landmarks',
        changes: k < 4 ? [] : [change],
      });
    const shown = reading('Ladder', { measures, nowMs });
    expect(shown.figure).toBe('3');
    expect(shown.unit).toContain('checked every tenth frame');
    expect(shown.spread).toContain('changes in half a minute: 1, the last one looks took 60 ms');
    expect(shown.lines[0].points.map(({ y }) => y)).toEqual([2, 2, 2, 2, 3, 3, 3, 3]);
  });
});
