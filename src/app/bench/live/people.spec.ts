import type { EyeSample } from '../../tracking/eye-sample';
import { othersWords, peopleIn } from './people';

const sample = (found: boolean): EyeSample =>
  ({ found, viewer: 3, others: [{ id: 5, eyePx: { x: 1, y: 2 }, eye: { x: 0, y: 0, z: 2350 } }] }) as unknown as EyeSample;

describe('the people in a sample', () => {
  it('are the one followed and the others, each by their number', () => {
    const people = peopleIn(sample(true));
    expect(people.followed).toBe(3);
    expect(othersWords(people)).toBe('person 5 at 2.4 m');
    expect(othersWords({ followed: 3, others: [] })).toBe('nobody');
  });

  it('has nobody followed where nobody was found', () => {
    expect(peopleIn(sample(false)).followed).toBeNull();
  });
});
