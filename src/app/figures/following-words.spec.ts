import { usualTuning } from '@oriel/shared/contracts/new-wall';
import { followingWords } from './following-words';

it('says how a wall follows, and what is made good for its screen where that was measured', () => {
  const { filter, longestHorizonMs } = usualTuning;
  const usual = followingWords(usualTuning);
  expect(usual).toContain(`${filter.across.minCutoffHz} Hz from side to side and ${filter.along.minCutoffHz} Hz nearer and farther`);
  expect(usual).toContain(`${longestHorizonMs} ms at most.`);
  expect(followingWords({ ...usualTuning, displayDelayMs: 80 })).toContain('with 80 ms for screen and camera.');
});
