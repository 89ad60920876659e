import { usualTuning } from '@oriel/shared/contracts/new-wall';
import type { TrackerTuning } from '@oriel/shared/contracts/wall-set-up';
import { tuningDifferences } from './tuning-words';

describe('what differs between two tunings', () => {
  it('is nothing between a tuning and itself', () => {
    expect(tuningDifferences(usualTuning, structuredClone(usualTuning))).toEqual([]);
  });

  it('is told with both sides and the unit', () => {
    const after = { ...usualTuning, displayDelayMs: 80, filter: { ...usualTuning.filter, across: { ...usualTuning.filter.across, minCutoffHz: 0.3 } } };
    expect(tuningDifferences(usualTuning, after)).toEqual([
      { name: 'Cutoff at rest, side to side', before: `${usualTuning.filter.across.minCutoffHz} Hz`, after: '0.3 Hz' },
      { name: 'Delay of screen and camera', before: '0 ms', after: '80 ms' },
    ]);
  });

  it('misses no setting there is: every leaf changed is told', () => {
    const leaves = (value: unknown, path: string[] = []): string[][] =>
      typeof value === 'object' && value !== null ? Object.entries(value).flatMap(([key, inner]) => leaves(inner, [...path, key])) : [path];
    for (const path of leaves(usualTuning)) {
      const changed = structuredClone(usualTuning) as unknown as Record<string, never>;
      const holder = path.slice(0, -1).reduce<Record<string, never>>((at, key) => at[key], changed) as Record<string, unknown>;
      const key = path[path.length - 1];
      holder[key] = typeof holder[key] === 'number' ? holder[key] * 1.5 + 0.5 : 'longest';
      expect([path.join('.'), tuningDifferences(usualTuning, changed as unknown as TrackerTuning).length]).toEqual([path.join('.'), 1]);
    }
  });
});
