import { cameraOnFrame } from './camera-on-frame';

describe('cameraOnFrame', () => {
  const before = { widthMm: 941, heightMm: 529 };
  const after = { widthMm: 520, heightMm: 292.5 };

  it('keeps a camera 15 mm above the glass 15 mm above it (by hand: 264.5 + 15 becomes 146.25 + 15)', () => {
    expect(cameraOnFrame({ x: 0, y: 279.5, z: 0 }, before, after)).toEqual({ x: 0, y: 161.25, z: 0 });
  });

  it('keeps one at the left edge at the left edge, and one before the glass where it is', () => {
    expect(cameraOnFrame({ x: -480.5, y: 100, z: 5 }, before, after)).toEqual({ x: -270, y: 100, z: 5 });
  });

  it('comes back where it was when the glass does', () => {
    const there = cameraOnFrame({ x: 500, y: -300, z: 0 }, before, after);
    expect(cameraOnFrame(there, after, before)).toEqual({ x: 500, y: -300, z: 0 });
  });
});
