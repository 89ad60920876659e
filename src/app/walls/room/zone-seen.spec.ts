import { newWall } from '@oriel/shared/contracts/new-wall';
import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import { seenPart, unseenWords } from './zone-seen';

/** A camera in the middle of the glass, 90 degrees across (half of 1 in 1), 58.7 up (half of 9 in 16). */
const camera = { ...newWall('Landing').camera, position: { x: 0, y: 0, z: 0 }, pitchRad: 0, hfovRad: Math.PI / 2 };
const wall = (zone: Partial<WallSetUp['zone']>, part: Partial<WallSetUp['camera']> = {}): WallSetUp => ({
  ...newWall('Landing'),
  camera: { ...camera, ...part },
  zone: { leftMm: -400, rightMm: 400, lowestMm: -200, highestMm: 200, nearestMm: 500, farthestMm: 1000, ...zone },
});
const area = (corners: readonly { across: number; z: number }[]) =>
  Math.abs(corners.reduce((sum, a, i) => sum + a.across * corners[(i + 1) % corners.length].z - a.z * corners[(i + 1) % corners.length].across, 0)) / 2;

describe('what the camera sees of the zone', () => {
  it('is all of it where it fits, and nothing is said', () => {
    expect(area(seenPart('plan', wall({})))).toBeCloseTo(800 * 500, 6);
    expect(unseenWords(wall({}))).toEqual([]);
  });

  it('lacks the near corners beyond the cone (by hand: triangles of 200 by 200 mm on both sides)', () => {
    const wide = wall({ leftMm: -700, rightMm: 700 });
    expect(area(seenPart('plan', wide))).toBeCloseTo(1400 * 500 - 200 * 200, 4);
    // 2 atan(700/500) = 108.9 degrees (computed).
    expect(unseenWords(wide)).toEqual([
      'The camera does not see all of the viewing zone: nobody is followed whose eyes are on the left and on the right and near. It would have to see 109° across for that: begin the zone farther away, or take a camera that sees wider.',
    ]);
  });

  it('lacks what is low, and is told how far to turn: from atan(-400/500) to 0 its middle is 19 degrees down (computed)', () => {
    const low = wall({ lowestMm: -400, highestMm: 0 });
    expect(area(seenPart('section', low))).toBeLessThan(400 * 500);
    expect(unseenWords(low)).toEqual([
      'The camera does not see all of the viewing zone: nobody is followed whose eyes are low down and near. Turn it about 19° farther down and it sees all.',
    ]);
    expect(unseenWords(wall({ lowestMm: -400, highestMm: 0 }, { pitchRad: -0.337 }))).toEqual([]);
  });

  it('is nothing where the camera looks away', () => {
    expect(seenPart('plan', wall({}, { yawRad: 1.7 }))).toEqual([]);
  });
});
