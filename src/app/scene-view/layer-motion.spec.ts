import { layerMotion } from './layer-motion';

describe('layerMotion', () => {
  it('moves nothing from the home eye, whatever the depth', () => {
    expect(layerMotion({ x: 20, y: 5, z: 900 }, { x: 20, y: 5, z: 900 }, 340)).toEqual({ scale: 1, x: 0, y: 0 });
  });

  it('shifts a layer 100 mm behind by 14.2857 mm for an eye 100 mm to the right at 600 mm (computed: 100 * 100 / (600 + 100), similar triangles)', () => {
    const motion = layerMotion({ x: 0, y: 0, z: 600 }, { x: 100, y: 0, z: 600 }, 100);
    expect(motion.x).toBeCloseTo(14.285714, 6);
    expect(motion.scale).toBe(1);
  });
});
