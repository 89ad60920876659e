import { describe, expect, it } from 'vitest';
import { bleedOver } from './bleed';

const GLASS = { widthMm: 600, heightMm: 400 };
const HOME = { x: 0, y: 0, z: 1000 };
const ZONE = { leftMm: -500, rightMm: 500, lowestMm: -100, highestMm: 100, nearestMm: 500, farthestMm: 2000 };

describe('bleedOver', () => {
  it('tells the spare of each side that reaches (worked by hand, d = 250: the plane is 1.25 of the glass)', () => {
    const bleed = bleedOver(ZONE, GLASS, HOME, {
      placed: { xMm: 0, yMm: 0, widthMm: 1200, heightMm: 500 },
      depthMm: 250,
    });
    // The plane reaches 750 across; the zone asks for 300 + 800/2 = 700. Up: 312.5 against 200 + 300/2 = 350.
    expect(bleed.right).toEqual({ reaches: true, spareMm: 50, worstEye: { x: -500, y: 0, z: 500 } });
    expect(bleed.left).toEqual({ reaches: true, spareMm: 50, worstEye: { x: 500, y: 0, z: 500 } });
    expect(bleed.top).toEqual({ reaches: true, spareMm: -37.5, worstEye: { x: 0, y: -100, z: 500 } });
    expect(bleed.spareMm).toBe(-37.5);
  });

  it('takes a side that stays inside for a silhouette', () => {
    const bleed = bleedOver(ZONE, GLASS, HOME, {
      placed: { xMm: 0, yMm: -350, widthMm: 1300, heightMm: 500 },
      depthMm: 100,
    });
    expect(bleed.top.reaches).toBe(false);
    expect(bleed.bottom.reaches).toBe(true);
    expect(bleed.spareMm).toBe(Math.min(bleed.left.spareMm, bleed.right.spareMm, bleed.bottom.spareMm));
  });

  it('has nothing to spare to tell where the whole layer stands inside the glass', () => {
    expect(
      bleedOver(ZONE, GLASS, HOME, { placed: { xMm: 0, yMm: 0, widthMm: 100, heightMm: 100 }, depthMm: 100 }).spareMm,
    ).toBeNull();
  });

  it('counts a side within half a millimetre of the edge as reaching it, and no farther', () => {
    const at = (widthMm: number) =>
      bleedOver(ZONE, GLASS, HOME, { placed: { xMm: 0, yMm: 0, widthMm, heightMm: 100 }, depthMm: 0 }).right;
    expect(at(599)).toMatchObject({ reaches: true, spareMm: -0.5 });
    expect(at(598.9).reaches).toBe(false);
  });
});
