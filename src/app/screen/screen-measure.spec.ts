import { card, diagonalOf, glassFromDiagonal, mmPerInch, nominalPxMm, pxMmFromCard } from './screen-measure';

describe('a screen measured by a card', () => {
  it('takes the card to be of ISO/IEC 7810 ID-1, 3.370 x 2.125 inches (secondary source read)', () => {
    expect(card.widthMm / mmPerInch).toBeCloseTo(3.37, 3);
    expect(card.heightMm / mmPerInch).toBeCloseTo(2.125, 3);
  });

  it('finds the nominal px when the card covers 323.5 px (85.60 / 25.4 * 96, computed)', () => {
    expect(pxMmFromCard(323.5276)).toBeCloseTo(nominalPxMm, 6);
  });
});

describe('a screen measured by its diagonal', () => {
  it('a 16:9 glass of 23.8 inches measures 526.9 x 296.4 mm, as makers print it (computed; data sheets say 527.04 x 296.46 for 1920 x 1080 at 0.2745 mm)', () => {
    const glass = glassFromDiagonal(23.8 * mmPerInch, 1920, 1080);
    expect(glass.widthMm).toBeCloseTo(526.87, 1);
    expect(glass.heightMm).toBeCloseTo(296.36, 1);
    expect(diagonalOf(glass)).toBeCloseTo(23.8 * mmPerInch, 9);
  });
});
