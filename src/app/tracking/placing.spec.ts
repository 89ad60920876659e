import { LANDMARK_COUNT, LANDMARK_INPUT } from './face-landmarks';
import { Looks } from './looks';
import type { FaceModels, RawLandmarks } from './face-models';
import type { Picture } from './picture';
import { Placing } from './placing';
import type { Region } from './region';

/** A face whose box is 100 px about (200, 150), seen by a landmark model that believes in it only within regions of these sizes. */
class Face implements Pick<FaceModels, 'landmarks'>, Picture {
  readonly width = 640;
  readonly height = 480;
  readonly looked: number[] = [];
  private region: Region = { cx: 0, cy: 0, size: 1, angleRad: 0 };

  constructor(private readonly believed: (sizePx: number) => boolean) {}

  sample(region: Region): void {
    this.region = region;
    this.looked.push(Math.round(region.size));
  }

  landmarks = (): RawLandmarks => {
    const points = new Float32Array(3 * LANDMARK_COUNT);
    const put = (i: number, x: number, y: number) => {
      points[3 * i] = ((x - this.region.cx) / this.region.size + 0.5) * LANDMARK_INPUT;
      points[3 * i + 1] = ((y - this.region.cy) / this.region.size + 0.5) * LANDMARK_INPUT;
    };
    for (let i = 0; i < LANDMARK_COUNT; i++) put(i, 200, 150);
    put(0, 150, 100);
    put(1, 250, 200);
    for (const i of [33, 7, 163, 144, 145, 153, 154, 155, 133, 173, 157, 158, 159, 160, 161, 246]) put(i, 175, 140);
    for (const i of [263, 249, 390, 373, 374, 380, 381, 382, 362, 398, 384, 385, 386, 387, 388, 466]) put(i, 225, 140);
    return { belief: this.believed(this.region.size) ? 0.9 : 0.1, points };
  };
}

const region = (size: number): Region => ({ cx: 200, cy: 150, size, angleRad: 0 });
/** A detector's box whose landmark region, 1.5 times it, is of this size. */
const detected = (size: number) => ({
  score: 0.9,
  cx: 200,
  cy: 150,
  width: size / 1.5,
  height: size / 1.5,
  rightEye: { x: 175, y: 140 },
  leftEye: { x: 225, y: 140 },
});

describe('Placing', () => {
  const placingOn = (face: Face) => new Placing(new Looks(face as unknown as FaceModels));

  it('looks once where the region is of the face’s size to 8 %, and again in the face’s own where it is not', () => {
    const near = new Face(() => true);
    expect(placingOn(near).settle(near, region(160))).toBe(true);
    expect(near.looked).toEqual([160]);
    const far = new Face(() => true);
    expect(placingOn(far).settle(far, region(220))).toBe(true);
    expect(far.looked).toEqual([220, 150]);
  });

  it('takes the detector’s own region where only there the face is believed, if it was expected to be of that size', () => {
    const smeared = new Face((size) => size < 140);
    const placing = placingOn(smeared);
    expect(placing.placeOn(smeared, detected(130))).toBe(false);
    expect(placing.placeOn(smeared, detected(130), region(250))).toBe(false);
    expect(placing.placeOn(smeared, detected(130), region(140))).toBe(true);
    expect(placing.belief).toBeCloseTo(0.9, 6);
  });

  it('says where the landmarks have the face and its eyes', () => {
    const face = new Face(() => true);
    const placing = placingOn(face);
    placing.settle(face, region(150));
    expect(placing.region.size).toBeCloseTo(150, 3);
    expect(placing.eyes.leftEye.x).toBeCloseTo(225, 3);
  });
});
