import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { normalNoise } from '../replay/testing';
import { BLINK_MS, blinkPlan, SYMBOL_MS } from './blink-plan';
import { maximalSequence } from './maximal-sequence';
import { bestPlace, correlationAt, GREATEST_SPREAD_MS, mirrorDelay, type Drawn, type Seen } from './mirror-delay';

describe('maximal-length sequences (S. Golomb, memory; the properties computed)', () => {
  it.each([3, 4, 5, 6, 7])(
    'of %i stages: autocorrelation N at no shift, -1 at every other; one more 1 than 0',
    (stages) => {
      const signs = maximalSequence(stages).map((bit) => 2 * bit - 1);
      const length = 2 ** stages - 1;
      expect(signs.length).toBe(length);
      expect(signs.reduce((a, b) => a + b, 0)).toBe(1);
      for (let shift = 0; shift < length; shift++)
        expect(signs.reduce((sum, sign, i) => sum + sign * signs[(i + shift) % length], 0)).toBe(shift ? -1 : length);
    },
  );

  it('has no others', () => expect(() => maximalSequence(9)).toThrow('3 to 7'));
});

describe('the blink', () => {
  it('flashes at most once a second: a third of what WCAG 2.3.1 allows', () => {
    const plan = blinkPlan();
    const changes = plan.flatMap((level, i) => (i && level !== plan[i - 1] ? [i * SYMBOL_MS] : []));
    for (const at of changes)
      expect(changes.filter((other) => other >= at && other < at + 1000).length).toBeLessThanOrEqual(2);
  });
  it('takes about half a minute', () => {
    expect(BLINK_MS).toBe(blinkPlan().length * SYMBOL_MS);
    expect(BLINK_MS).toBeLessThan(35_000);
  });
});

/** The plan as a screen of 60 a second draws it. */
const drawn: Drawn[] = [...blinkPlan(), 0].map((level, i) => ({
  atMs: 1000 + Math.ceil((i * SYMBOL_MS) / (1000 / 60)) * (1000 / 60),
  level,
}));
const levelAt = (tMs: number) => drawn.findLast(({ atMs }) => atMs <= tMs)?.level ?? 0;

interface Camera {
  readonly delayMs: number;
  readonly noise?: number;
  readonly jitterMs?: number;
  readonly exposureMs?: number;
  readonly phaseMs?: number;
  readonly seed?: number;
}

/** What a camera of 30 a second would see: exposure, noise (of a change of 1), and times of capture known only roughly. */
function filmed({ delayMs, noise = 0.3, jitterMs = 4, exposureMs = 10, phaseMs = 0, seed = 3 }: Camera): Seen[] {
  const normal = normalNoise(seed);
  return Array.from({ length: Math.floor((BLINK_MS + 1500) / (1000 / 30)) }, (_, i) => {
    const atMs = (i * 1000) / 30 + phaseMs;
    let light = 0;
    for (let part = 0; part < 10; part++) light += levelAt(atMs - delayMs + ((part - 4.5) / 10) * exposureMs) / 10;
    return { atMs: atMs + jitterMs * normal(), brightness: 80 + 12 * (light + noise * normal()) + 0.0004 * atMs };
  });
}

/**
 * A camera in step with the screen meets its changes at two phases only, half a camera's interval apart: within a quarter of that interval to
 * either side all delays look alike. No estimator does better.
 */
const halfDisplayMs = 1000 / 60 / 2;

describe('the delay in the mirror', () => {
  it('is found to a few milliseconds through noise, rough times and exposure', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 20, max: 350, noNaN: true }),
        fc.double({ min: 0, max: 33, noNaN: true }),
        fc.double({ min: 8, max: 33, noNaN: true }),
        fc.integer({ min: 1, max: 1000 }),
        (delayMs, phaseMs, exposureMs, seed) => {
          const found = mirrorDelay(drawn, filmed({ delayMs, phaseMs, exposureMs, seed }));
          expect(Math.abs(found!.delayMs - delayMs)).toBeLessThan(halfDisplayMs + 4);
          expect(Math.abs(found!.medianMs - delayMs)).toBeLessThan(halfDisplayMs + 6);
          expect(found!.spreadMs).toBeLessThan(GREATEST_SPREAD_MS);
        },
      ),
      { numRuns: 60 },
    );
  });

  it('has no bias: over many phases its mean is right to 2 ms', () => {
    const errors = Array.from(
      { length: 40 },
      (_, i) =>
        mirrorDelay(drawn, filmed({ delayMs: 100 + i, phaseMs: (i * 7) % 33, seed: i + 1 }))!.delayMs - (100 + i),
    );
    expect(Math.abs(errors.reduce((a, b) => a + b, 0) / errors.length)).toBeLessThan(2);
  });

  it('refuses what has nothing to do with the blink', () => {
    const noise = normalNoise(11);
    const other = Array.from({ length: 1000 }, (_, i) => ({
      atMs: (i * 1000) / 30,
      brightness: 80 + noise() + 5 * Math.sin(i / 20),
    }));
    expect(mirrorDelay(drawn, other)).toBeNull();
    expect(
      mirrorDelay(
        drawn,
        other.map(({ atMs }) => ({ atMs, brightness: 80 })),
      ),
    ).toBeNull();
    expect(mirrorDelay(drawn, [])).toBeNull();
    expect(mirrorDelay(drawn, filmed({ delayMs: 100, noise: 6 }))).toBeNull();
  });

  it('refuses a dark blink in a bright one’s place: the mirror shows the screen as it is', () => {
    expect(
      mirrorDelay(
        drawn,
        filmed({ delayMs: 100 }).map(({ atMs, brightness }) => ({ atMs, brightness: -brightness })),
      ),
    ).toBeNull();
  });

  it('finds the part of the picture in which the mirror is', () => {
    const empty = filmed({ delayMs: 100 }).map(({ atMs }, i) => ({ atMs, brightness: 90 + Math.sin(i) }));
    expect(bestPlace(drawn, [empty, filmed({ delayMs: 100 }), empty]).place).toBe(1);
  });

  it('correlates wholly with itself', () => {
    const clean = filmed({ delayMs: 0, noise: 0, jitterMs: 0, exposureMs: 0 }).map(({ atMs }) => ({
      atMs,
      brightness: levelAt(atMs),
    }));
    expect(correlationAt(drawn, clean, 0)).toBeCloseTo(1, 9);
  });
});
