import { LadderKeeper } from './ladder-keeper';

describe('LadderKeeper', () => {
  it('judges by the median look of each second, and keeps what changed', () => {
    const keeper = new LadderKeeper();
    for (let s = 1; s <= 3; s++) {
      for (const ms of [80, 20, 90, 85, 20]) keeper.note(ms);
      expect(keeper.second(s * 1000, 60)).toBe(s === 3);
    }
    expect(keeper.state).toMatchObject({ step: 2, changes: [{ tMs: 3000, from: 1, to: 2, reason: 'a look took 80 ms, and 55 are allowed' }] });
  });

  it('takes a page that draws nothing for hidden, not for slow', () => {
    const keeper = new LadderKeeper();
    for (let s = 1; s < 15; s++) {
      keeper.note(13);
      expect(keeper.second(s * 1000, 0)).toBe(false);
    }
  });
});
