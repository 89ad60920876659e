import { differenceWords } from './difference-words';

const figures = (jitterMm: number, strayMs: number) => ({ jitterMm, strayMs });

describe('what a setting brings', () => {
  it.each([
    [figures(0.5, 40), 'trembles 50 % less than today, and keeps up 10 ms less well'],
    [figures(2, 18), 'trembles 100 % more than today, and keeps up 12 ms better'],
    [figures(1.02, 31), 'trembles as today, and keeps up as well'],
  ])('of %o against 1 mm and 30 ms', (other, words) => expect(differenceWords(figures(1, 30), other)).toBe(words));
});
