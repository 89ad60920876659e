import { describe, expect, it } from 'vitest';
import { usualTuning } from '../contracts/new-wall';
import { excerptOf, replayExcerpt, wholeRun } from './excerpt';
import { followerSettingsOf } from './follower-settings-of';
import { laterKnown } from './later-known';
import { replay } from './replay';
import { movingStretches, stillStretches, totalMs } from './stretches';
import { madeUpRun, standsThenWalks } from './testing';

const settings = followerSettingsOf(usualTuning);
const runOf = (untilMs: number) => {
  const samples = madeUpRun((tMs) => standsThenWalks(tMs % 14_000), { untilMs, lateMs: 40, across: 0.5, along: 5 });
  const known = laterKnown(samples);
  return { samples, still: stillStretches(known), moving: movingStretches(known, 'across') };
};

describe('an excerpt', () => {
  it('of a short run is the whole of it, replayed just so', () => {
    const { samples, still, moving } = runOf(40_000);
    const excerpt = excerptOf(samples, still, moving);
    expect(excerpt).toEqual(wholeRun(samples, still, moving));
    expect(replayExcerpt(excerpt, settings, 50)).toEqual(replay(samples, settings, 50));
  });

  it('of a long run holds enough rest and motion, from all over it, in a tenth of its length', () => {
    const { samples, still, moving } = runOf(600_000);
    const { windows, ...judged } = excerptOf(samples, still, moving);
    expect(totalMs(judged.still)).toBeGreaterThanOrEqual(12_000);
    expect(totalMs(judged.moving)).toBeGreaterThanOrEqual(12_000);
    expect(totalMs(windows)).toBeLessThanOrEqual(60_000);
    expect(windows[windows.length - 1].toMs - windows[0].fromMs).toBeGreaterThan(300_000);
    const windowed = (tMs: number) => windows.some(({ fromMs, toMs }) => tMs >= fromMs && tMs <= toMs);
    for (const { fromMs, toMs } of [...judged.still, ...judged.moving])
      expect(windowed(fromMs) && windowed(toMs)).toBe(true);
  });

  it('draws what the whole run draws, once whoever is there has been approached', () => {
    const { samples, still, moving } = runOf(600_000);
    const whole = replay(samples, settings, 50);
    const part = replayExcerpt(excerptOf(samples, still, moving), settings, 50);
    let worst = 0;
    part.tMs.forEach((tMs, i) => {
      const at = (tMs - whole.tMs[0]) / (1000 / 60);
      const [k, share] = [Math.floor(at), at - Math.floor(at)];
      if (k < 0 || k + 1 >= whole.x.length) return;
      worst = Math.max(worst, Math.abs(part.x[i] - (whole.x[k] + share * (whole.x[k + 1] - whole.x[k]))));
    });
    expect(worst).toBeLessThan(5);
  });
});
