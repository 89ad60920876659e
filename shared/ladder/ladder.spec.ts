import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createLadder, type Ladder, type LadderChange, USUAL_LADDER } from './ladder';
import { LADDER_STEPS } from './steps';

/** A machine on which a look of the first step takes `ms`, each step's cost straying from the table by its own factor. */
interface Machine {
  readonly ms: number;
  readonly stray: readonly number[];
  /** Interval between frames that drawing alone would have, ms, and what a look of 1 ms a frame adds to it. */
  readonly drawingMs: number;
  readonly burden: number;
}

const machine = (ms: number, part: Partial<Machine> = {}): Machine => ({ ms, stray: LADDER_STEPS.map(() => 1), drawingMs: 17, burden: 0, ...part });

const lookMs = ({ ms, stray }: Machine, step: number) => ms * LADDER_STEPS[step].cost * stray[step];
const looksPerS = (on: Machine, step: number) => Math.min(30, LADDER_STEPS[step].looking.mostPerS, 1000 / Math.max(1, lookMs(on, step)));

function run(ladder: Ladder, on: Machine, fromS: number, untilS: number): LadderChange[] {
  const changes: LadderChange[] = [];
  for (let s = fromS; s < untilS; s++) {
    const look = lookMs(on, ladder.step);
    const frameMs = on.drawingMs + on.burden * look * (looksPerS(on, ladder.step) / 30);
    const change = ladder.second({ tMs: s * 1000, lookMs: ladder.step === LADDER_STEPS.length - 1 ? null : look, frameMs });
    if (change) changes.push(change);
  }
  return changes;
}

const hour = 3600;
const last = LADDER_STEPS.length - 1;
const anyMachine = fc.record({
  ms: fc.double({ min: 2, max: 800, noNaN: true }),
  stray: fc.array(fc.double({ min: 0.6, max: 1.6, noNaN: true }), { minLength: LADDER_STEPS.length, maxLength: LADDER_STEPS.length }),
  drawingMs: fc.double({ min: 7, max: 60, noNaN: true }),
  burden: fc.double({ min: 0, max: 3, noNaN: true }),
});

describe('the ladder', () => {
  it('goes to the finest step on a fast machine and stays there', () => {
    const ladder = createLadder();
    expect(run(ladder, machine(13.4), 0, hour)).toMatchObject([{ from: 1, to: 0, tMs: 19_000 }]);
  });

  // Looks a second measured on emulated computers (read): a quarter of four cores 20 by landmarks; a sixth 11, and 16 by the detector.
  it('keeps landmarks where they come 20 times a second, and takes the detector where they come 11 times', () => {
    const quarter = createLadder();
    run(quarter, machine(50 / 0.61), 0, hour);
    expect(quarter.step).toBeLessThanOrEqual(2);
    const sixth = createLadder();
    run(sixth, machine(1000 / 16 / 0.49), 0, hour);
    expect(LADDER_STEPS[sixth.step].looking).toEqual({ by: 'detector', guardEvery: 1, mostPerS: Infinity });
  });

  it('gives up where not even five looks a second come, and says why at each step', () => {
    const ladder = createLadder();
    const changes = run(ladder, machine(500), 0, 30);
    expect(ladder.step).toBe(last);
    expect(changes.map(({ to }) => to)).toEqual([2, 3, 4, 5, 6, last]);
    for (const { reason } of changes) expect(reason).toMatch(/^a look took \d+ ms, and \d+ are allowed$/);
  });

  it('comes back step by step when the load has gone, each with its proof', () => {
    const ladder = createLadder();
    run(ladder, machine(500), 0, 30);
    const changes = run(ladder, machine(13.4), 30, 260);
    expect(changes.map(({ to }) => to)).toEqual([6, 5, 4, 3, 2, 1, 0]);
    const times = changes.map(({ tMs }) => tMs / 1000);
    for (let i = 1; i < times.length; i++) expect(times[i] - times[i - 1]).toBeGreaterThanOrEqual(USUAL_LADDER.proofS);
  });

  it('bears single slow seconds', () => {
    const ladder = createLadder();
    run(ladder, machine(13.4), 0, 60);
    for (let s = 60; s < 600; s++) expect(ladder.second({ tMs: s * 1000, lookMs: s % 3 === 0 ? 300 : 13, frameMs: 17 })).toBeNull();
  });

  it('neither falls nor climbs while nobody is there to be measured', () => {
    const ladder = createLadder();
    for (let s = 0; s < hour; s++) expect(ladder.second({ tMs: s * 1000, lookMs: null, frameMs: 17 })).toBeNull();
  });

  it('gives way to the drawing where that helps, and not where tracking is not to blame', () => {
    const helped = createLadder();
    run(helped, machine(40, { burden: 1.2 }), 0, hour);
    expect(helped.step).toBeGreaterThan(1);
    const blameless = createLadder();
    run(blameless, machine(13.4, { drawingMs: 50 }), 0, hour);
    expect(blameless.step).toBeLessThanOrEqual(1);
  });

  it('lays nothing drawn slowly at the door of tracking while nobody is followed, as when the page loads', () => {
    const ladder = createLadder();
    for (let s = 0; s < hour; s++) expect(ladder.second({ tMs: s * 1000, lookMs: null, frameMs: 120 })).toBeNull();
  });

  it('looks at least 20 times a second whatever the drawing, and having ceased for its own, tries again whatever the drawing', () => {
    const hampered = createLadder();
    const noisy = (s: number) => (s % 7 < 5 ? 120 - (s % 50) : 20);
    for (let s = 0; s < hour; s++) {
      hampered.second({ tMs: s * 1000, lookMs: 60, frameMs: noisy(s) });
      expect(LADDER_STEPS[hampered.step].looking.mostPerS).toBeGreaterThanOrEqual(20);
    }
    const ceased = createLadder();
    run(ceased, machine(500), 0, 30);
    expect(ceased.step).toBe(last);
    for (let s = 30; s < 60; s++) ceased.second({ tMs: s * 1000, lookMs: null, frameMs: 90 });
    expect(ceased.step).toBe(last - 1);
  });

  it('settles under any constant load: after an hour at most 4 changes an hour', () => {
    fc.assert(
      fc.property(anyMachine, (on) => {
        const ladder = createLadder();
        run(ladder, on, 0, hour);
        expect(run(ladder, on, hour, 4 * hour).length).toBeLessThanOrEqual(12);
      }),
      { numRuns: 300 },
    );
  });

  it('changes at most 34 times in an hour, whatever the loads', () => {
    const load = fc.record({ forS: fc.integer({ min: 1, max: 400 }), on: anyMachine });
    fc.assert(
      fc.property(fc.array(load, { minLength: 20, maxLength: 60 }), (loads) => {
        const ladder = createLadder();
        let s = 0;
        let changes = 0;
        for (let i = 0; s < hour; i++) {
          const { forS, on } = loads[i % loads.length];
          const until = Math.min(hour, s + forS);
          changes += run(ladder, on, s, until).length;
          s = until;
        }
        expect(changes).toBeLessThanOrEqual(34);
      }),
      { numRuns: 300 },
    );
  });

  it('says the same of the same seconds', () => {
    fc.assert(
      fc.property(anyMachine, (on) => {
        expect(run(createLadder(), on, 0, 900)).toEqual(run(createLadder(), on, 0, 900));
      }),
      { numRuns: 50 },
    );
  });
});
