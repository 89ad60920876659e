import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { figure } from '../projection/testing/arbitraries';
import { eyeFromPixel, focalPx, pixelOfPoint, rayOfPixel, type Camera } from './camera';

const CAMERA: Camera = {
  position: { x: 0, y: 160, z: 5 },
  pitchRad: 0,
  yawRad: 0,
  rollRad: 0,
  hfovRad: Math.PI / 3,
  mirrored: false,
  widthPx: 1280,
  heightPx: 720,
};
const QUARTER = Math.PI / 2;

const anyCamera = fc.record({
  position: fc.record({ x: figure(-500, 500), y: figure(-500, 500), z: figure(-50, 100) }),
  pitchRad: figure(-0.8, 0.8),
  yawRad: figure(-0.8, 0.8),
  rollRad: figure(-3, 3),
  hfovRad: figure(0.4, 2),
  mirrored: fc.boolean(),
  widthPx: fc.integer({ min: 320, max: 3840 }),
  heightPx: fc.integer({ min: 240, max: 2160 }),
});

describe('focalPx', () => {
  it('is 1108.51 at 1280 px and 60 degrees (computed)', () => {
    expect(focalPx(CAMERA)).toBeCloseTo(1108.51, 2);
  });
});

describe('eyeFromPixel', () => {
  it('finds who is in the middle of the picture straight before the lens', () => {
    expect(eyeFromPixel(CAMERA, 640, 360, 700)).toEqual({ x: 0, y: 160, z: 705 });
  });

  it('finds who is on the left of an unmirrored picture on the viewer’s right, and the other way about in a mirrored one', () => {
    expect(eyeFromPixel(CAMERA, 340, 360, 1000).x).toBeCloseTo(270.633, 3); // computed: 300/1108.51 * 1000
    expect(eyeFromPixel({ ...CAMERA, mirrored: true }, 340, 360, 1000).x).toBeCloseTo(-270.633, 3);
  });

  it('finds who is low in the picture low', () => {
    expect(eyeFromPixel(CAMERA, 640, 560, 1000).y).toBeCloseTo(160 - 180.422, 3);
  });

  it('carries out the camera’s own turns (by hand, at right angles and a tenth)', () => {
    const at = (turn: Partial<Camera>, px = 640, py = 360) =>
      eyeFromPixel({ ...CAMERA, position: { x: 0, y: 0, z: 0 }, ...turn }, px, py, 1000);
    expect(at({ pitchRad: 0.1 }).y).toBeCloseTo(1000 * Math.sin(0.1), 9);
    expect(at({ pitchRad: 0.1 }).z).toBeCloseTo(1000 * Math.cos(0.1), 9);
    expect(at({ yawRad: 0.1 }).x).toBeCloseTo(1000 * Math.sin(0.1), 9);
    // Rolled a quarter anticlockwise as the viewer sees it, the picture's top lies to the viewer's left.
    const top = at({ rollRad: QUARTER }, 640, 0);
    expect(top.x).toBeLessThan(-300);
    expect(top.y).toBeCloseTo(0, 9);
  });

  it('is undone by pixelOfPoint, whatever the camera', () => {
    fc.assert(
      fc.property(anyCamera, figure(0, 1), figure(0, 1), figure(200, 5000), (camera, s, t, distanceMm) => {
        const [px, py] = [s * camera.widthPx, t * camera.heightPx];
        const pixel = pixelOfPoint(camera, eyeFromPixel(camera, px, py, distanceMm))!;
        expect(pixel.x).toBeCloseTo(px, 6);
        expect(pixel.y).toBeCloseTo(py, 6);
      }),
    );
  });

  it('lies on the pixel’s ray', () => {
    fc.assert(
      fc.property(anyCamera, figure(0, 1), figure(0, 1), (camera, s, t) => {
        const [px, py] = [s * camera.widthPx, t * camera.heightPx];
        const ray = rayOfPixel(camera, px, py);
        const eye = eyeFromPixel(camera, px, py, 1000);
        const way = { x: eye.x - camera.position.x, y: eye.y - camera.position.y, z: eye.z - camera.position.z };
        const length = Math.hypot(way.x, way.y, way.z);
        expect(way.x / length).toBeCloseTo(ray.x, 9);
        expect(way.y / length).toBeCloseTo(ray.y, 9);
        expect(way.z / length).toBeCloseTo(ray.z, 9);
        expect(length).toBeGreaterThanOrEqual(1000 - 1e-6);
      }),
    );
  });

  it('sees nothing behind the camera', () => {
    expect(pixelOfPoint(CAMERA, { x: 0, y: 0, z: -100 })).toBeNull();
  });

  it.each([
    ['camera.hfovRad', { hfovRad: 0 }, 640, 1000],
    ['camera.hfovRad', { hfovRad: Math.PI }, 640, 1000],
    ['camera.widthPx', { widthPx: 0 }, 640, 1000],
    ['camera.pitchRad', { pitchRad: NaN }, 640, 1000],
    ['px', {}, NaN, 1000],
    ['distanceMm', {}, 640, 0],
  ])('names %s when it is impossible', (value, change, px, distanceMm) => {
    expect(() => eyeFromPixel({ ...CAMERA, ...change }, px, 360, distanceMm)).toThrowError(
      expect.objectContaining({ name: 'GeometryError', value }),
    );
  });
});
