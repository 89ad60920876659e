import { agreeing, askFor, awaitedAfter, ruledUncertainty, sideByOthers, squarePx, type Side } from './glass-shape';

const fullHd = { widthMm: 941, heightMm: 529, widthPx: 1920, heightPx: 1080 };

describe('the shape of a glass', () => {
  it('agrees with its px to within a rule’s reading: 941 * 9/16 = 529.3 (by hand)', () => {
    expect(squarePx(fullHd)).toBe(true);
    expect(squarePx({ ...fullHd, heightMm: 526 })).toBe(true);
  });

  it('is doubted where only one side was typed, and the other offered: 600 * 9/16 = 337.5, 529 * 16/9 = 940.4 (by hand)', () => {
    const typed = { ...fullHd, widthMm: 600 };
    expect(squarePx(typed)).toBe(false);
    expect(agreeing(typed).map(({ part }) => part)).toEqual([{ heightMm: 337.5 }, { widthMm: 940.4 }]);
    for (const { part } of agreeing(typed)) expect(squarePx({ ...typed, ...part })).toBe(true);
  });

  it('is doubted where the px stand the other way round, and exchanging them is offered first', () => {
    const upright = { ...fullHd, widthMm: 529, heightMm: 941 };
    expect(agreeing(upright)[0].part).toEqual({ widthPx: 1080, heightPx: 1920 });
  });

  it('gives any figure by the three others: 2560 * 529/941 = 1439.1, 1440 * 941/529 = 2561.5 (by hand)', () => {
    expect(sideByOthers({ ...fullHd, widthPx: 2560 }, 'heightPx')).toBe(1439);
    expect(sideByOthers({ ...fullHd, heightPx: 1440 }, 'widthPx')).toBe(2562);
    expect(sideByOthers({ ...fullHd, widthMm: 600 }, 'heightMm')).toBe(337.5);
    expect(sideByOthers(fullHd, 'widthMm')).toBe(940.4);
  });

  it('counts as measured by a rule alone, and only once the sides agree with the px: 1 / 941 = 0.0010627 (by hand)', () => {
    const assumed = { ...fullHd, uncertainty: null };
    expect(ruledUncertainty(assumed, 1)).toBeCloseTo(0.0010627, 7);
    expect(ruledUncertainty({ ...assumed, widthMm: 600 }, 1)).toBeNull();
    expect(ruledUncertainty(assumed, null)).toBeNull();
    expect(ruledUncertainty({ ...fullHd, uncertainty: 0.006 }, null)).toBe(0.006);
  });

  describe('while figures are still to be typed', () => {
    const after = (...typed: Side[]) => typed.reduce<readonly Side[]>(awaitedAfter, []);

    it('asks for the other of the pair, with what it is by the rest: 600 * 9/16 = 337.5 (by hand)', () => {
      const asked = askFor({ ...fullHd, widthMm: 600 }, after('widthMm'));
      expect(asked?.words).toBe('Now the height. By the pixels it is 337.5 mm.');
      expect(asked?.offer).toEqual({ words: 'Take 337.5 mm', part: { heightMm: 337.5 } });
    });

    it('offers nothing by a figure that is itself still to be typed', () => {
      const asked = askFor({ ...fullHd, widthMm: 600, widthPx: 2560 }, after('widthMm', 'widthPx'));
      expect(asked).toEqual({ words: 'Now the height and the number down.', offer: null });
    });

    it('offers the last one again: 2560 * 375/600 = 1600 (by hand)', () => {
      const asked = askFor({ ...fullHd, widthMm: 600, heightMm: 375, widthPx: 2560 }, after('widthMm', 'widthPx', 'heightMm'));
      expect(asked?.offer?.part).toEqual({ heightPx: 1600 });
    });

    it('asks nothing once all are typed, and no other figure because one is typed twice', () => {
      expect(askFor(fullHd, after('widthPx', 'heightPx'))).toBeNull();
      expect(after('widthMm', 'widthMm')).toEqual(['heightMm']);
    });
  });
});
