import { describe, expect, it } from 'vitest';
import { usualTuning } from '../contracts/new-wall';
import { searchTuning, TooLittleMotion } from './search-tuning';
import { madeUpRun, standsThenWalks } from './testing';
import { canBeReplayed, judgedBy, showsAll, whatItShows, NOTHING_SHOWN } from './what-it-shows';

const shown = (untilMs: number, path = standsThenWalks) => whatItShows(madeUpRun(path, { untilMs, lateMs: 40 }));

describe('what a run shows', () => {
  it('is how long somebody stands still and moves, as the path has it', () => {
    const { stillMs, acrossMs, alongMs } = shown(14_000);
    // By hand: six seconds still, less half a second of settling; the sine's speed is above 100 mm/s for
    // 1 - 2/pi asin(100 / (300 2 pi f)) of eight seconds: 7.46 s across at 0.5 Hz, 7.22 s along at 0.35 Hz. A sine turns where it is slow.
    expect(Math.abs(stillMs - 5500)).toBeLessThan(200);
    expect(Math.abs(acrossMs - 7460)).toBeLessThan(400);
    expect(Math.abs(alongMs - 7220)).toBeLessThan(400);
  });

  it('is enough, roughly or too little', () => {
    expect(showsAll(shown(14_000))).toBe(true);
    expect(judgedBy(shown(3000), 'stillMs')).toBe('roughly');
    expect(judgedBy(shown(1000), 'stillMs')).toBe('too-little');
    expect([canBeReplayed(shown(1000)), canBeReplayed(shown(6000)), canBeReplayed(shown(9000))]).toEqual([false, false, true]);
    expect(whatItShows([])).toEqual(NOTHING_SHOWN);
  });

  it('agrees with replay, which refuses exactly what cannot be replayed', () => {
    for (const untilMs of [1000, 5000, 6500, 7000, 9000]) {
      const samples = madeUpRun(standsThenWalks, { untilMs, lateMs: 40 });
      const refused = (['across', 'along'] as const).every((direction) => {
        try {
          return !searchTuning(samples, usualTuning, direction);
        } catch (cause) {
          return cause instanceof TooLittleMotion;
        }
      });
      expect([untilMs, refused]).toEqual([untilMs, !canBeReplayed(whatItShows(samples))]);
    }
  });
});
