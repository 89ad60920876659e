import { describe, expect, it } from 'vitest';
import { ID1_WIDTH, lensFromTwoDistances } from './two-distances';
import { measured } from './uncertainty';

const exactly = (value: number) => measured(value, 0);

describe('lensFromTwoDistances', () => {
  it('finds f = 1000 px and a lens 10 mm behind the front (by hand: 1000·100/(290+10) = 333.33 px, 1000·100/(790+10) = 125 px)', () => {
    const lens = lensFromTwoDistances(
      exactly(100),
      { distanceMm: exactly(290), widthPx: exactly(1000 / 3) },
      { distanceMm: exactly(790), widthPx: exactly(125) },
      1280,
    );
    expect(lens.focalPx.value).toBeCloseTo(1000, 9);
    expect(lens.behindFrontMm.value).toBeCloseTo(10, 9);
    expect((lens.hfovRad.value * 180) / Math.PI).toBeCloseTo(65.2385, 4); // 2 atan(0.64), computed
    expect(lens.focalPx.uncertainty).toBe(0);
  });

  it('does not mind which came first', () => {
    const near = { distanceMm: measured(300, 2), widthPx: measured(316, 1) };
    const far = { distanceMm: measured(900, 2), widthPx: measured(105.4, 1) };
    expect(lensFromTwoDistances(ID1_WIDTH, far, near, 1280)).toEqual(lensFromTwoDistances(ID1_WIDTH, near, far, 1280));
  });

  it('finds the webcams of 78 and 90 degrees across the diagonal, 70.43 and 82.15 across 16:9, from a card (computed)', () => {
    for (const [across, focal] of [
      [70.43, 906.6],
      [82.15, 734.4],
    ]) {
      const seen = (d: number) => ({ distanceMm: exactly(d), widthPx: exactly((focal * 85.6) / d) });
      const { hfovRad } = lensFromTwoDistances(exactly(85.6), seen(250), seen(700), 1280);
      expect((hfovRad.value * 180) / Math.PI).toBeCloseTo(across, 1);
    }
  });

  it('says what to do where the sightings cannot be', () => {
    const near = { distanceMm: exactly(300), widthPx: exactly(200) };
    const askew = { distanceMm: exactly(600), widthPx: exactly(210) };
    expect(() => lensFromTwoDistances(ID1_WIDTH, near, askew, 1280)).toThrow('mark its two edges again');
    expect(() => lensFromTwoDistances(ID1_WIDTH, near, { ...near, widthPx: exactly(150) }, 1280)).toThrow('move the card farther');
  });
});
