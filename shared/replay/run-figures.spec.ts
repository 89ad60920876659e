import { describe, expect, it } from 'vitest';
import { usualTuning } from '../contracts/new-wall';
import { figuresOf } from './run-figures';
import { spreadOf } from './spread';
import { madeUpRun, standsThenWalks } from './testing';

describe('a run in figures', () => {
  const stages = { cropMs: 1, detectMs: 2, landmarksMs: 5, totalMs: 8 };
  const run = madeUpRun(standsThenWalks, { untilMs: 14_000, lateMs: 40, across: 0.5, along: 5 }).map((s) => ({ ...s, ...stages }));

  it('says what went into it', () => {
    const figures = figuresOf(run, usualTuning);
    expect(figures.trackedPerS).toBeCloseTo(30, 6);
    expect(figures.intervalMs.median).toBeCloseTo(1000 / 30, 6);
    expect(figures.arrivalMs.p95).toBeCloseTo(40, 6);
    expect(figures.totalMs).toEqual({ median: 8, p95: 8 });
    // Noise of 0.5 mm in x and in y: sqrt(2) of it together (computed).
    expect(figures.seenJitterMm).toBeCloseTo(0.5 * Math.SQRT2, 1);
    expect(figures.drawnJitterMm).toBeLessThan(figures.seenJitterMm / 2);
    expect(figures.losses).toBe(0);
    expect(figures.foundShare).toBe(1);
  });

  it('does not claim that frames came in no time where it is not known when they were captured', () => {
    const unknown = run.map((sample) => ({ ...sample, capturedMs: sample.receivedMs }));
    expect(figuresOf(unknown, usualTuning).arrivalMs).toEqual({ median: NaN, p95: NaN });
    const first = run.map((sample, i) => (i < 60 ? unknown[i] : sample));
    expect(figuresOf(first, usualTuning).arrivalMs.median).toBeCloseTo(40, 6);
    expect(figuresOf(first, usualTuning).lagMs).toBeCloseTo(figuresOf(run, usualTuning).lagMs, 6);
  });

  it('counts losses by how often, and the share of looks that found somebody', () => {
    const lost = run.slice(0, 100).map((sample, i) => (i % 10 === 5 || i % 10 === 6 ? { ...sample, eye: null } : sample));
    expect(figuresOf(lost, usualTuning).losses).toBe(10);
    expect(figuresOf(lost, usualTuning).foundShare).toBeCloseTo(0.8, 9);
  });

  it('takes median and 95th percentile by nearest rank', () => {
    expect(spreadOf([5, 1, 3])).toEqual({ median: 3, p95: 5 });
    expect(spreadOf(Array.from({ length: 100 }, (_, i) => i + 1))).toEqual({ median: 50, p95: 95 });
    expect(spreadOf([]).median).toBeNaN();
  });
});
