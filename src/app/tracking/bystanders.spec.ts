import { Bystanders } from './bystanders';
import type { Detection } from './detection';
import type { Looks } from './looks';
import type { Picture } from './picture';
import type { Region } from './region';

const PICTURE: Picture = { width: 400, height: 400, sample: () => undefined };
const FOLLOWED: Region = { cx: 100, cy: 200, size: 120, angleRad: 0 };
const faceAt = (cx: number, width = 60): Detection => ({
  score: 0.9,
  cx,
  cy: 200,
  width,
  height: width,
  rightEye: { x: cx - 12, y: 190 },
  leftEye: { x: cx + 12, y: 190 },
});

/** Looks at people who are where they are told to be: the far look sees all, the near one whoever is within its region. */
class FakeLooks {
  people: Detection[] = [];
  looked = 0;
  beginFull(): void {
    this.looked++;
  }
  finishFull(): Detection[] {
    this.looked++;
    return this.people;
  }
  short(_: Picture, region: Region): Detection[] {
    this.looked++;
    return this.people.filter(({ cx }) => Math.abs(cx - region.cx) < region.size / 2);
  }
}

describe('Bystanders', () => {
  let looks: FakeLooks;
  let bystanders: Bystanders;
  let ids: number;
  const look = (times: number): void => {
    for (let k = 0; k < times; k++) bystanders.look(looks as unknown as Looks, PICTURE, FOLLOWED, 100);
  };
  beforeEach(() => {
    looks = new FakeLooks();
    ids = 1;
    bystanders = new Bystanders(() => ++ids);
  });

  it('takes in whoever is found and confirmed, but never the one who is followed', () => {
    looks.people = [faceAt(102), faceAt(300)];
    look(3);
    expect(bystanders.all.map(({ id, face }) => [id, face.cx])).toEqual([[2, 300]]);
  });

  it('keeps each person’s number while they walk', () => {
    looks.people = [faceAt(300)];
    look(3);
    for (let cx = 300; cx > 200; cx -= 5) {
      looks.people = [faceAt(cx)];
      look(1);
    }
    expect(bystanders.all.map(({ id }) => id)).toEqual([2]);
    expect(bystanders.all[0].face.cx).toBeLessThan(215);
  });

  it('tells one far away from one near, seen right beside them', () => {
    looks.people = [faceAt(300, 110)];
    look(3);
    looks.people = [faceAt(300, 110), faceAt(370, 40)];
    look(8);
    expect(bystanders.all.map(({ face }) => face.width).sort((a, b) => a - b)).toEqual([40, 110]);
  });

  it('lets go of one who has left', () => {
    looks.people = [faceAt(300)];
    look(3);
    looks.people = [];
    look(5);
    expect(bystanders.all).toEqual([]);
  });

  it('drops one who came to where the followed is, who cannot be told from the followed', () => {
    looks.people = [faceAt(160)];
    look(3);
    expect(bystanders.all).toHaveLength(1);
    looks.people = [faceAt(110)];
    look(6);
    expect(bystanders.all).toEqual([]);
  });

  it('looks once each time while nothing is found', () => {
    look(7);
    expect(looks.looked).toBe(7);
  });
});
