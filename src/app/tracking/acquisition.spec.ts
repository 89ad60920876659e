import { confirm, nearestTo } from './acquisition';
import type { Detection } from './detection';
import type { Looks } from './looks';
import type { Picture } from './picture';
import type { Region } from './region';

const PICTURE: Picture = { width: 400, height: 400, sample: () => undefined };
const faceAt = (cx: number, width: number, score = 0.9): Detection => ({
  score,
  cx,
  cy: 200,
  width,
  height: width,
  rightEye: { x: cx - width / 5, y: 190 },
  leftEye: { x: cx + width / 5, y: 190 },
});
/** Sees whoever is within the region, best first, as detectors do. */
const looksAt = (...people: Detection[]): Looks =>
  ({
    short: (_: Picture, { cx, size }: Region) => people.filter((one) => Math.abs(one.cx - cx) < size / 2),
  }) as unknown as Looks;

describe('a closer look', () => {
  it('is at the face in its middle, though another beside it is believed in more', () => {
    expect(nearestTo({ cx: 200, cy: 200 }, [faceAt(260, 40, 0.99), faceAt(205, 100, 0.8)])?.cx).toBe(205);
    expect(nearestTo({ cx: 200, cy: 200 }, [])).toBeUndefined();
  });

  it('confirms the face that was found, and not a neighbour', () => {
    const looks = looksAt(faceAt(275, 60, 0.99), faceAt(200, 80, 0.8));
    expect(confirm(looks, PICTURE, faceAt(200, 90))?.cx).toBe(200);
  });

  it('confirms nothing where nobody is seen', () => {
    expect(confirm(looksAt(), PICTURE, faceAt(200, 90))).toBeNull();
  });
});
