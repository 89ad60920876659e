import type { EyeSample } from '../../tracking/eye-sample';
import { followedWords, othersWords, peopleIn } from './people';

const sample = (found: boolean): EyeSample =>
  ({ found, viewer: 3, others: [{ id: 5, eyePx: { x: 1, y: 2 }, eye: { x: 0, y: 0, z: 2350 } }] }) as unknown as EyeSample;

describe('the people in a sample', () => {
  it('are the one followed and the others', () => {
    const people = peopleIn(sample(true));
    expect(people.followed).toBe(3);
    expect(othersWords(people)).toBe('one more, at 2.4 m');
    expect(othersWords({ followed: 3, others: [] })).toBe('nobody');
  });

  it.each([
    [900, '0 s'],
    [59_999, '59 s'],
    [125_000, '2 min 5 s'],
  ])('were followed for %i ms: %s', (ms, words) => expect(followedWords(ms)).toBe(words));

  it('has nobody followed where nobody was found', () => {
    expect(peopleIn(sample(false)).followed).toBeNull();
  });
});
