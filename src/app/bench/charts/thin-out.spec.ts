import { thinOut } from './thin-out';

describe('thinning out', () => {
  it('keeps every peak and the order of time', () => {
    const points = Array.from({ length: 5000 }, (_, x) => ({ x, y: x === 1234 ? 99 : Math.sin(x) }));
    const thin = thinOut(points, 100);
    expect(thin.length).toBeLessThanOrEqual(204);
    expect(thin).toContainEqual({ x: 1234, y: 99 });
    expect(thin.map(({ x }) => x)).toEqual([...thin.map(({ x }) => x)].sort((a, b) => a - b));
  });
  it('leaves a few points alone', () => {
    const few = [
      { x: 0, y: 1 },
      { x: 1, y: 2 },
    ];
    expect(thinOut(few, 10)).toBe(few);
  });
});
