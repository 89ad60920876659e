import { describe, expect, it } from 'vitest';
import { livingRoom } from '../projection/living-room';
import { usualCamera } from './usual-camera';

describe('the usual camera', () => {
  it('stands above the middle of the upper edge and looks at the middle of the zone', () => {
    const { zone } = livingRoom('landscape');
    const camera = usualCamera({ heightMm: 529 }, zone);
    expect(camera.position).toEqual({ x: 0, y: 279.5, z: 0 });
    // atan(279.5 / 2200) = 7.24 degrees (computed).
    expect((camera.pitchRad * 180) / Math.PI).toBeCloseTo(-7, 9);
  });

  it('looks up at people who stand above it', () => {
    expect(usualCamera({ heightMm: 200 }, { leftMm: -1, rightMm: 1, lowestMm: 400, highestMm: 600, nearestMm: 800, farthestMm: 1200 }).pitchRad).toBeGreaterThan(0);
  });
});
