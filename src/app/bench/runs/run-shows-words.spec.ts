import { adviceWords, partWords, verdictWords } from './run-shows-words';

const shows = (stillMs: number, acrossMs: number, alongMs: number) => ({ stillMs, acrossMs, alongMs });

describe('what a run shows, in words', () => {
  it('says whether it can be tuned by', () => {
    expect(verdictWords(shows(400, 9000, 9000))).toContain('neither jitter nor lag');
    expect(verdictWords(shows(9000, 900, 0))).toContain('nobody moves');
    expect(verdictWords(shows(9000, 5000, 0))).toBe('It can be tuned by, but not nearer and farther.');
    expect(verdictWords(shows(2000, 5000, 5000))).toContain('surer');
    expect(verdictWords(shows(5000, 3000, 3000))).toBe('Enough to tune by.');
  });
  it('says what to do to have enough', () => {
    expect(adviceWords(shows(0, 9000, 200))).toBe('Stand still for ten seconds, then step toward the glass and back a few times.');
    expect(adviceWords(shows(9000, 9000, 9000))).toBe('');
  });
  it('says how much there is of each, and how much is good', () => {
    expect(partWords(shows(400, 0, 0), 'stillMs')).toBe('0.4 s, too little to judge; 5 s are good');
    expect(partWords(shows(12_345, 0, 0), 'stillMs')).toBe('12 s, enough');
  });
});
