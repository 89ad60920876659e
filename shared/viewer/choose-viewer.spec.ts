import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CALM_CHOICE, chooseViewer, createViewerChoice, type Candidate, type ChoiceRule } from './choose-viewer';

const FRAME_MS = 33;
const person = (id: number, sizePx: number, offAxis = 0, sinceMs = 0): Candidate => ({ id, sizePx, offAxis, sinceMs });

/** Who is followed in each frame of a sequence. */
function follow(frames: readonly (readonly Candidate[])[], rule: ChoiceRule): (number | null)[] {
  const state = createViewerChoice();
  return frames.map((people, k) => chooseViewer(state, people, k * FRAME_MS, rule));
}

const repeat = (times: number, people: readonly Candidate[]): (readonly Candidate[])[] =>
  Array.from({ length: times }, () => people);

describe('the choice of viewer (expected sequences worked out by hand from the stated rule)', () => {
  const rule: ChoiceRule = { rule: 'nearest', handOverMs: 330, handOverShare: 0.2 };

  it.each([
    ['nearest', 2],
    ['most-central', 1],
    ['longest', 3],
  ] as const)('begins with the %s', (by, id) => {
    const people = [person(1, 40, 0.1, -100), person(2, 60, -0.5, -200), person(3, 30, 0.3, -900)];
    expect(follow([people], { ...rule, rule: by })).toEqual([id]);
  });

  it('hands over ten frames after another has come nearer by the share, not before', () => {
    const frames = [...repeat(5, [person(1, 50)]), ...repeat(15, [person(1, 50), person(2, 70)])];
    expect(follow(frames, rule)).toEqual([...Array<number>(15).fill(1), ...Array<number>(5).fill(2)]);
  });

  it('does not hand over to one who is nearer by less than the share, however long', () => {
    const frames = [[person(1, 50)], ...repeat(500, [person(1, 50), person(2, 62)])];
    expect(new Set(follow(frames, rule))).toEqual(new Set([1]));
  });

  it('begins to count anew where the other falls back for a frame', () => {
    const nearer = [person(1, 50), person(2, 70)];
    const frames = [[person(1, 50)], ...repeat(9, nearer), [person(1, 50), person(2, 50)], ...repeat(9, nearer)];
    expect(new Set(follow(frames, rule))).toEqual(new Set([1]));
  });

  it('takes the best of those left at once where the one followed goes', () => {
    const all = [person(1, 90), person(2, 40), person(3, 50)];
    expect(follow([all, all, all.slice(1)], rule)).toEqual([1, 1, 3]);
    expect(follow([all, []], rule)).toEqual([1, null]);
  });
});

const anyRule = fc.record({
  rule: fc.constantFrom('nearest', 'most-central', 'longest'),
  handOverMs: fc.integer({ min: 0, max: 3000 }),
  handOverShare: fc.double({ min: 0, max: 1, noNaN: true }),
}) as fc.Arbitrary<ChoiceRule>;
const anyone = (id: number): fc.Arbitrary<Candidate> =>
  fc.record({
    id: fc.constant(id),
    sizePx: fc.double({ min: 5, max: 200, noNaN: true }),
    offAxis: fc.double({ min: -1, max: 1, noNaN: true }),
    sinceMs: fc.integer({ min: -10_000, max: 0 }),
  });

describe('whatever people do', () => {
  it('hand-overs between those who stay are at least handOverMs apart', () => {
    const frames = fc.array(fc.tuple(anyone(1), anyone(2), anyone(3)), { minLength: 2, maxLength: 150 });
    fc.assert(
      fc.property(frames, anyRule, (sequence, rule) => {
        const followed = follow(sequence, rule);
        const changes = followed.flatMap((id, k) => (k > 0 && id !== followed[k - 1] ? [k * FRAME_MS] : []));
        changes.forEach((at, k) => expect(at - (changes[k - 1] ?? 0)).toBeGreaterThanOrEqual(rule.handOverMs));
      }),
    );
  });

  it('a lone viewer is followed, someone is followed where anyone is, and only those who are there', () => {
    const frames = fc.array(fc.tuple(fc.subarray([1, 2, 3]), anyone(1), anyone(2), anyone(3)), {
      minLength: 1,
      maxLength: 80,
    });
    fc.assert(
      fc.property(frames, anyRule, (sequence, rule) => {
        const people = sequence.map(([there, ...all]) => all.filter(({ id }) => there.includes(id)));
        follow(people, rule).forEach((id, k) => {
          const ids = people[k].map((one) => one.id);
          if (ids.length < 2) expect(id).toBe(ids[0] ?? null);
          else expect(ids).toContain(id);
        });
      }),
    );
  });

  it('the calm choice hands over to someone who steps clearly nearer, within two seconds', () => {
    const frames = [...repeat(30, [person(1, 35)]), ...repeat(60, [person(1, 35), person(2, 70)])];
    expect(follow(frames, CALM_CHOICE).at(-1)).toBe(2);
  });
});
