import { anchorsOf, FULL_RANGE, SHORT_RANGE } from './detector-anchors';
import { LANDMARK_COUNT, LANDMARK_INPUT } from './face-landmarks';
import type { FaceModels } from './face-models';
import type { Picture } from './picture';
import type { Region } from './region';
import { Tracker } from './tracker';

/** A room of 640 x 480 with at most one face in it, as made-up networks see it: its box, and how far landmarks and detector believe in it. */
class Room implements Picture, FaceModels {
  readonly width = 640;
  readonly height = 480;
  face: { x: number; y: number; box: number } | null = { x: 320, y: 240, box: 90 };
  belief = 1;
  score = 0.95;
  placed = 0;
  private looked: Region = { cx: 0, cy: 0, size: 1, angleRad: 0 };

  sample(region: Region): void {
    this.looked = region;
  }

  detectShort = (): Float32Array => this.seenBy(SHORT_RANGE);
  detectFull = (): Float32Array => this.seenBy(FULL_RANGE);
  beginFull = (): void => undefined;
  finishFull = (): Float32Array => this.detectFull();

  private seenBy(range: typeof SHORT_RANGE): Float32Array {
    const n = range.inputSize;
    const anchors = anchorsOf(range);
    const output = new Float32Array((anchors.length / 2) * 17).fill(-50);
    if (!this.face) return output;
    const { x, y, box } = this.face;
    const across = (px: number) => (px - this.looked.cx) / this.looked.size + 0.5;
    const down = (py: number) => (py - this.looked.cy) / this.looked.size + 0.5;
    if (across(x) < 0 || across(x) > 1 || down(y) < 0 || down(y) > 1) return output;
    const put = (at: number, px: number, py: number) => {
      output[at] = (across(px) - anchors[0]) * n;
      output[at + 1] = (down(py) - anchors[1]) * n;
    };
    output[0] = Math.log(this.score / (1 - this.score));
    put(1, x, y);
    output[3] = output[4] = (box / this.looked.size) * n;
    put(5, x - box / 4, y - box / 8);
    put(7, x + box / 4, y - box / 8);
    return output;
  }

  /** A square of landmarks 1.1 times the box, with both eyes where the detector has them. */
  landmarks() {
    this.placed++;
    const points = new Float32Array(3 * LANDMARK_COUNT);
    const { x, y, box } = this.face ?? { x: 0, y: 0, box: 1 };
    const put = (i: number, px: number, py: number) => {
      points[3 * i] = ((px - this.looked.cx) / this.looked.size + 0.5) * LANDMARK_INPUT;
      points[3 * i + 1] = ((py - this.looked.cy) / this.looked.size + 0.5) * LANDMARK_INPUT;
    };
    for (let i = 0; i < LANDMARK_COUNT; i++) put(i, x + 0.55 * box * (i % 2 ? 1 : -1), y + 0.55 * box * (i % 4 < 2 ? 1 : -1));
    for (const i of [33, 7, 163, 144, 145, 153, 154, 155, 133, 173, 157, 158, 159, 160, 161, 246]) put(i, x - box / 4, y - box / 8);
    for (const i of [263, 249, 390, 373, 374, 380, 381, 382, 362, 398, 384, 385, 386, 387, 388, 466]) put(i, x + box / 4, y - box / 8);
    return { belief: this.face ? this.belief : 0, points };
  }

  tensors = () => 0;
  dispose = () => undefined;
}

describe('Tracker', () => {
  let room: Room;
  let tracker: Tracker;
  let frame: number;
  const look = (): number | null => tracker.look(room, 33 * frame++);

  beforeEach(() => {
    room = new Room();
    tracker = new Tracker(room);
    frame = 0;
    for (let k = 0; k < 6; k++) look();
    expect(tracker.viewer).toBe(1);
    expect(tracker.glimpsed).toBe(false);
  });

  it('goes on with the detector’s eyes where landmarks fail, for ten frames and no longer', () => {
    room.belief = 0.2;
    const seen = Array.from({ length: 12 }, () => look() !== null && tracker.glimpsed && tracker.viewer === 1);
    expect(seen.slice(0, 10)).toEqual(Array(10).fill(true));
    expect(tracker.viewer).toBeNull();
    expect(look()).toBeNull();
  });

  it('keeps the number of whoever walks to and fro for a minute without a gap', () => {
    const numbers = Array.from({ length: 1800 }, (_, i) => {
      const sway = Math.sin((2 * Math.PI * i) / 120);
      room.face = { x: 320 + 150 * sway, y: 240, box: 90 + 15 * Math.cos((2 * Math.PI * i) / 200) };
      return look() === null ? null : tracker.viewer;
    });
    expect(new Set(numbers)).toEqual(new Set([1]));
  });

  it('takes no face of quite another size for the one it followed', () => {
    room.belief = 0.2;
    room.face!.box = 30;
    expect(look()).toBeNull();
  });

  it('says at once that somebody left, and knows them again who were only missed for a moment', () => {
    const { face } = room;
    room.face = null;
    expect([look(), look()]).toEqual([null, null]);
    room.face = face;
    expect(look()).not.toBeNull();
    expect(tracker.viewer).toBe(1);
  });

  it('tells nothing of a newcomer whom landmarks do not bear out', () => {
    tracker.forget();
    room.belief = 0.2;
    expect(Array.from({ length: 12 }, look)).toEqual(Array(12).fill(null));
    room.belief = 1;
    expect(look()).not.toBeNull();
  });

  it('places landmarks again in a region of the face’s own size after it grew at a bound, and once a frame otherwise', () => {
    room.placed = 0;
    look();
    expect(room.placed).toBe(1);
    room.face!.box *= 1.2;
    look();
    expect(room.placed).toBe(3);
    look();
    expect(room.placed).toBe(4);
  });
});
