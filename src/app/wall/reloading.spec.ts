import { betweenReloadsMs, untilNight, waitToReload } from './reloading';

describe('a wall that loads itself anew', () => {
  it('does so at most every five minutes', () => {
    expect(waitToReload(null, 1_000_000)).toBe(0);
    expect(waitToReload(1_000_000, 1_000_000 + 60_000)).toBe(betweenReloadsMs - 60_000);
    expect(waitToReload(1_000_000, 1_000_000 + betweenReloadsMs)).toBe(0);
    expect(waitToReload(9_000_000, 1_000_000)).toBe(0);
  });

  it('waits for the next night, and after this one for the next', () => {
    const minutes = (now: Date) => untilNight(now, 0) / 60_000;
    expect(minutes(new Date(2027, 0, 10, 3, 0))).toBe(60);
    expect(minutes(new Date(2027, 0, 10, 4, 5))).toBe(24 * 60 - 5);
    expect(minutes(new Date(2027, 0, 10, 23, 0))).toBe(5 * 60);
    expect(untilNight(new Date(2027, 0, 10, 23, 0), 1)).toBe((5 * 60 + 15) * 60_000);
  });
});
