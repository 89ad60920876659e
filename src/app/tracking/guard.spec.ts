import type { Detection } from './detection';
import { differ, Guard, type Eyes } from './guard';

const eyes = (x: number, ipd = 60): Eyes => ({
  rightEye: { x: x - ipd / 2, y: 100 },
  leftEye: { x: x + ipd / 2, y: 100 },
});
const seen = (x: number, ipd = 60): Detection => ({
  ...eyes(x, ipd),
  score: 0.9,
  cx: x,
  cy: 100,
  width: 120,
  height: 120,
});

describe('differ', () => {
  it('compares places in eye distances and sizes as a ratio', () => {
    expect(differ(eyes(0), eyes(20), 0.35, 1.3)).toBe(false);
    expect(differ(eyes(0), eyes(22), 0.35, 1.3)).toBe(true);
    expect(differ(eyes(0, 60), eyes(0, 80), 0.35, 1.3)).toBe(true);
  });
});

describe('Guard', () => {
  /** Whether a look is due in each of the next frames with the eyes there; every look confirms them. */
  const looks = (guard: Guard, x: number, frames: number): number[] =>
    Array.from({ length: frames }, () => {
      const due = guard.due(eyes(x));
      if (due) guard.judge(eyes(x), seen(x));
      return Number(due);
    });

  it('looks in the first three frames, and then every fifth while nothing is suspect', () => {
    expect(looks(new Guard(), 0, 13)).toEqual([1, 1, 1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1]);
  });

  it('looks at once, and three frames on end, after an implausible jump', () => {
    const guard = new Guard();
    expect(looks(guard, 0, 4)).toEqual([1, 1, 1, 0]);
    expect(looks(guard, 90, 5)).toEqual([1, 1, 1, 0, 0]);
  });

  it('takes no alarm at a jump that was expected: a walker moves by most of an eye distance a frame', () => {
    const guard = new Guard();
    expect(looks(guard, 0, 4)).toEqual([1, 1, 1, 0]);
    expect(guard.due(eyes(50), 5, 50, 0)).toBe(false);
    expect(guard.due(eyes(50), 5, 0, 50)).toBe(true);
  });

  it('holds landmarks to less while their speed is not known', () => {
    const guard = new Guard();
    expect(guard.due(eyes(0))).toBe(true);
    expect(guard.judge(eyes(0), seen(15))).toBe('clings');
    looks(guard, 0, 3);
    expect(guard.due(eyes(0))).toBe(false);
    expect(guard.judge(eyes(0), seen(15))).toBe('holds');
  });

  it('gives up at the second look in a row that sees no face, and looks again at once after the first', () => {
    const guard = new Guard();
    expect(guard.judge(eyes(0), undefined)).toBe('missed');
    expect(guard.due(eyes(0))).toBe(true);
    expect(guard.judge(eyes(0), undefined)).toBe('lost');
  });

  it('tells landmarks that hold from landmarks that cling to a wrong size', () => {
    const guard = new Guard();
    expect(guard.judge(eyes(0), seen(5))).toBe('holds');
    expect(guard.judge(eyes(0), seen(0, 30))).toBe('clings');
  });
});
