import type { Layer, SceneDocument } from '@oriel/shared/contracts/scenes';
import { sceneOnWall } from './scene-on-wall';

const layer = (name: string, depthMm: number, widthMm: number, heightMm: number): Layer => ({
  id: `00000000-0000-4000-8000-${name.padStart(12, '0').slice(-12)}`,
  name, depthMm, opacity: 1, shown: true,
  image: { id: '00000000-0000-4000-8000-000000000001', width: 300, height: 200, trim: { left: 0, top: 0, ofWidth: 300, ofHeight: 200 } },
  placed: { xMm: 0, yMm: 0, widthMm, heightMm },
});
/** Just clear from its own zone: 300 + (300 + 200) * 500/500 = 800 mm in the plane, which home sees as 800 * 1000/1500 (by hand). */
const scene: SceneDocument = {
  name: 'Meadow',
  glass: { widthMm: 600, heightMm: 400 },
  homeEye: { x: 0, y: 0, z: 1000 },
  zone: { leftMm: -200, rightMm: 200, lowestMm: -100, highestMm: 100, nearestMm: 500, farthestMm: 2000 },
  layers: [layer('Far', 500, 1066.68, 668)],
};
const glass = { widthMm: 300, heightMm: 200, widthPx: 1500, heightPx: 1000, uncertainty: null };

describe('a scene on a wall', () => {
  it('is clear where the wall’s zone is its own, scaled with the glass', () => {
    const it = sceneOnWall(scene, { glass, zone: { leftMm: -100, rightMm: 100, lowestMm: -50, highestMm: 50, nearestMm: 250, farthestMm: 1000 } });
    expect(it).toMatchObject({ clear: true, layers: [], offer: null, remedies: [] });
    expect(it.scaled).toContain('scaled here by 0.50');
    expect(it.scaled).toContain('250 to 1000 mm away, 100 mm left to 100 mm right, 50 mm down to 50 mm up');
    expect(it.scaled).not.toContain('another shape');
  });

  it('is clear from much farther away too, though that is outside its own zone', () => {
    expect(sceneOnWall(scene, { glass, zone: { leftMm: -400, rightMm: 400, lowestMm: -50, highestMm: 50, nearestMm: 1000, farthestMm: 3000 } }).clear).toBe(true);
  });

  it('names the layers that would show an edge, how much, from where, and what to do', () => {
    const it = sceneOnWall(scene, { glass, zone: { leftMm: -300, rightMm: 100, lowestMm: -50, highestMm: 50, nearestMm: 250, farthestMm: 1000 } });
    expect(it.clear).toBe(false);
    expect(it.verdict).toContain('An edge would show of Far.');
    // The plane reaches 400 mm; from 300 mm left it must reach 150 + 450 * 250/250 = 600: 200 short (by hand).
    expect(it.layers).toEqual([{ name: 'Far', worst: 'right edge: 200 mm short, seen from 300 mm left, 250 mm away' }]);
    expect(it.remedies[0]).toContain('500 to 2000 mm away, 600 mm left to 200 mm right');
  });

  it('offers the part of the zone from which it is clear, and nothing where nobody could look around', () => {
    // The plane reaches 400 mm at 250 mm behind: 150 + (150 + e) 250/z <= 400, so e <= z - 150 on either side (by hand).
    const zone = { leftMm: -300, rightMm: 300, lowestMm: -50, highestMm: 50, nearestMm: 400, farthestMm: 1000 };
    const { offer } = sceneOnWall(scene, { glass, zone });
    expect(offer?.zone).toEqual({ ...zone, leftMm: -300, rightMm: 300, nearestMm: 450 });
    expect(offer?.words).toBe('begins 0.45 m away instead of 0.4 m');
    expect(sceneOnWall({ ...scene, layers: [layer('Far', 500, 300, 668)] }, { glass, zone }).offer).toBeNull();
  });

  it('says where a glass of another shape stays dark', () => {
    const wide = { ...glass, widthMm: 500, widthPx: 2500 };
    expect(sceneOnWall(scene, { glass: wide, zone: scene.zone }).scaled).toContain('dark strip left and right');
  });
});
