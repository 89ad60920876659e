import { newWall } from '@oriel/shared/contracts/new-wall';
import { coneOf, roomExtents } from './wall-room';

const glass = { widthMm: 941, heightMm: 529 };
const zone = { leftMm: -700, rightMm: 900, lowestMm: -250, highestMm: 250, nearestMm: 1200, farthestMm: 3200 };

/** Straight ahead, 60 degrees across. */
const level = { ...newWall('Landing').camera, pitchRad: 0 };

describe('the camera’s cone', () => {
  it('opens 60 degrees in the plan: 1000 mm away it reaches 577.35 mm to either side (by hand, 1000 tan 30)', () => {
    const ends = coneOf('plan', { ...level, position: { x: 0, y: 0, z: 0 } }, 1000).map(([, end]) => end);
    expect(ends.map(({ z }) => Math.round(z))).toEqual([1000, 1000]);
    expect(ends.map(({ across }) => across).sort((a, b) => a - b)[1]).toBeCloseTo(577.35, 2);
  });

  it('opens 35.98 degrees in the section, about an axis turned down (by hand: atan(tan 30 · 9/16) = 17.99)', () => {
    const tenDown = { ...level, position: { x: 0, y: 0, z: 0 }, pitchRad: -Math.PI / 18 };
    const angles = coneOf('section', tenDown, 1000).map(([, end]) => (Math.atan2(end.across, end.z) * 180) / Math.PI);
    expect(Math.max(...angles)).toBeCloseTo(7.99, 2);
    expect(Math.min(...angles)).toBeCloseTo(-27.99, 2);
  });

  it('ends on the sheet though the camera looks along the wall', () => {
    const ends = coneOf('plan', { ...level, yawRad: 1.5 }, 1000).map(([, end]) => end);
    for (const end of ends) expect(Math.hypot(end.across, end.z)).toBeLessThanOrEqual(3000 + 1);
  });
});

describe('what must fit on the drawing', () => {
  it('is the farthest of glass, camera, zone and spot to each side', () => {
    expect(roomExtents(glass, { x: -800, y: 300, z: 0 }, zone, null)).toEqual({ left: -860, right: 960, below: -324.5, above: 360, before: 3400 });
    expect(roomExtents(glass, { x: 0, y: 300, z: 0 }, zone, { x: 0, y: -900, z: 4000 })).toMatchObject({ below: -960, before: 4200 });
  });
});
