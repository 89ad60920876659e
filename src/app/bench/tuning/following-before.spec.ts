import { newWall, usualTuning } from '@oriel/shared/contracts/new-wall';
import { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import { goneBack, tuned } from './following-before';

const wall = newWall('Hall');
const { filter, displayDelayMs, longestHorizonMs } = usualTuning;
const delayed = (ms: number) => tuned(wall, (tuning) => ({ ...tuning, displayDelayMs: ms }));

describe('how a wall followed before', () => {
  it('is kept when that is changed, and gone back to with whatever else was changed since left as it is', () => {
    const after = delayed(80);
    expect(after.followingBefore).toEqual({ filter, displayDelayMs, longestHorizonMs });
    const since = { ...after, name: 'Landing', tuning: { ...after.tuning, holdMs: 999 } };
    expect(goneBack(since)).toEqual({ ...wall, name: 'Landing', tuning: { ...usualTuning, holdMs: 999 } });
  });

  it('is not written over where nothing of how it follows changes', () => {
    expect(delayed(0).followingBefore).toBeNull();
    const twice = tuned(delayed(80), (tuning) => ({ ...tuning, displayDelayMs: 80, holdMs: 5 }));
    expect(twice.followingBefore?.displayDelayMs).toBe(0);
  });

  it('is null in a set-up stored before there was such a thing', () => {
    const { followingBefore, ...stored } = wall;
    expect(followingBefore).toBeNull();
    expect(WallSetUp.parse(stored)).toEqual(wall);
  });
});
