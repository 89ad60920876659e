import { describeDepth, describeEye, plainMm, readFigure, signedMm } from './words';

describe('figures in words', () => {
  it('carry a true minus and a plus', () => {
    expect(signedMm(1500)).toBe('+1500');
    expect(signedMm(-60)).toBe('\u221260');
    expect(signedMm(-0.01)).toBe('0');
    expect(plainMm(52.94)).toBe('52.9');
  });

  it('are read as people type them', () => {
    expect(readFigure('+180')).toBe(180);
    expect(readFigure('\u221260 mm')).toBe(-60);
    expect(readFigure('12,5')).toBe(12.5);
    expect(readFigure('80%')).toBe(80);
    expect(readFigure('60,5°')).toBe(60.5);
    for (const wrong of ['', 'far', '1e9', '--3', '1.2.3']) expect(readFigure(wrong)).toBeNull();
  });

  it('are not guessed where they could be read in two ways', () => {
    for (const unclear of ['1,500', '\u22121,500 mm', '12,345', '1,234,567']) expect(readFigure(unclear)).toBeNull();
    for (const [clear, figure] of [['0,125', 0.125], ['1500,5', 1500.5], ['1234,567', 1234.567]] as const) expect(readFigure(clear)).toBe(figure);
  });

  it('say where a layer and an eye are', () => {
    expect(describeDepth(180)).toBe('180 mm behind the glass');
    expect(describeDepth(-60)).toBe('60 mm in front of the glass');
    expect(describeDepth(0)).toBe('on the glass');
    expect(describeEye({ x: -260, y: 0, z: 1500 })).toBe('260 mm left, 1500 mm away');
  });
});
