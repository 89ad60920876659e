import { describe, expect, it } from 'vitest';
import { createFollower } from '../smoothing/follower';
import { CALM_FOLLOWING } from '../smoothing/follower-settings';
import { newWall, usualGlass } from './new-wall';
import { PairingCode, WallSetUp } from './walls';

describe('a new wall', () => {
  it('is as the contract has it, and every figure is kept', () => {
    const setUp = newWall('Hall');
    expect(WallSetUp.parse(setUp)).toEqual(setUp);
  });

  it('has a glass of 42.5 inches (sold as 43), 16:9 within half a per cent (computed: 1079.5 mm / 25.4)', () => {
    expect(Math.hypot(usualGlass.widthMm, usualGlass.heightMm) / 25.4).toBeCloseTo(42.5, 1);
    expect(Math.abs(usualGlass.widthMm / usualGlass.heightMm / (16 / 9) - 1)).toBeLessThan(0.005);
    expect(usualGlass.widthPx / usualGlass.heightPx).toBe(16 / 9);
  });

  it('has its camera in the frame above, seeing 60 degrees', () => {
    const { camera, glass } = newWall('Hall');
    expect(camera.position.x).toBe(0);
    expect(camera.position.y).toBeGreaterThan(glass.heightMm / 2);
    expect((camera.hfovRad * 180) / Math.PI).toBeCloseTo(60, 9);
  });

  it('follows as calmly as the player does by itself', () => {
    const { tuning } = newWall('Hall');
    expect(tuning.filter).toEqual(CALM_FOLLOWING.filter);
    expect(() =>
      createFollower({ ...CALM_FOLLOWING, homeEye: { x: 0, y: 0, z: 1800 }, filter: tuning.filter }),
    ).not.toThrow();
  });
});

describe('a pairing code', () => {
  it('is understood however it is typed', () => {
    for (const typed of ['ABC234', 'abc234', ' abc-234 ', 'A B C 2 3 4'])
      expect(PairingCode.parse(typed)).toBe('ABC234');
  });

  it('has six signs, none of those that are mistaken for one another', () => {
    for (const typed of ['ABC23', 'ABC2345', 'ABCO23', 'ABC0IL', 'ABC1I1', ''])
      expect(PairingCode.safeParse(typed).success).toBe(false);
  });
});
