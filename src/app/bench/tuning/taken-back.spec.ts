import { usualTuning } from '@oriel/shared/contracts/new-wall';
import { takenBack } from './taken-back';

it('puts back what a change changed, and leaves what came after it', () => {
  const after = { ...usualTuning, displayDelayMs: 80 };
  const since = { ...after, holdMs: 999 };
  expect(takenBack(since, usualTuning, after)).toEqual({ ...usualTuning, holdMs: 999 });
  expect(takenBack(since, after, after)).toEqual(since);
});
