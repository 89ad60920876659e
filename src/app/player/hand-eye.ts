import type { Point3 } from '@oriel/shared/projection/types';
import type { SceneOnScreen } from './scene-on-screen';

/** The eye comes two thirds of the way to where the hand puts it in this time. */
const settleMs = 120;
/** A key moves the eye by this share of the viewing zone, or this share of its distance. */
const keyStep = 1 / 16;
const keys: Readonly<Record<string, readonly [across: number, up: number, away: number]>> = {
  ArrowLeft: [-1, 0, 0],
  ArrowRight: [1, 0, 0],
  ArrowUp: [0, 1, 0],
  ArrowDown: [0, -1, 0],
  '+': [0, 0, -1],
  '=': [0, 0, -1],
  '-': [0, 0, 1],
};

const within = (least: number, value: number, most: number) => Math.min(most, Math.max(least, value));

/** An eye moved by pointer and keyboard about the viewing zone, in place of a face. */
export class HandEye {
  /** Where it is; the same object always. */
  readonly eye = { x: 0, y: 0, z: 1 };
  private readonly aim = { x: 0, y: 0, z: 1 };

  constructor(private readonly scene: Pick<SceneOnScreen, 'homeEye' | 'zone' | 'nearestEyeMm'>) {
    this.home();
    this.arrive();
  }

  /** Starts from where another eye is, so that the hand takes over without a jump. */
  from(eye: Point3): void {
    this.put(eye.x, eye.y, eye.z);
    this.arrive();
  }

  /** Aims at a place of the zone: `across` and `down` from 0 to 1, from its left and from its top. */
  point(across: number, down: number): void {
    const { zone } = this.scene;
    this.put(
      zone.leftMm + across * (zone.rightMm - zone.leftMm),
      zone.highestMm - down * (zone.highestMm - zone.lowestMm),
      this.aim.z,
    );
  }

  /** Moves the aim by one key; says whether the key means anything. */
  press(key: string): boolean {
    if (key === 'Home') {
      this.home();
      return true;
    }
    const way = keys[key];
    if (!way) return false;
    const { zone } = this.scene;
    this.put(
      this.aim.x + way[0] * keyStep * (zone.rightMm - zone.leftMm),
      this.aim.y + way[1] * keyStep * (zone.highestMm - zone.lowestMm),
      this.aim.z * (1 + keyStep) ** way[2],
    );
    return true;
  }

  /** Lets `dtMs` pass: e' = (aim - e)/settle. */
  step(dtMs: number): void {
    const share = 1 - Math.exp(-Math.max(0, dtMs) / settleMs);
    this.eye.x += (this.aim.x - this.eye.x) * share;
    this.eye.y += (this.aim.y - this.eye.y) * share;
    this.eye.z += (this.aim.z - this.eye.z) * share;
  }

  private home(): void {
    const { x, y, z } = this.scene.homeEye;
    this.put(x, y, z);
  }

  private arrive(): void {
    this.eye.x = this.aim.x;
    this.eye.y = this.aim.y;
    this.eye.z = this.aim.z;
  }

  /** Keeps to the zone, widened where the home eye lies outside it. */
  private put(x: number, y: number, z: number): void {
    const { zone, homeEye, nearestEyeMm } = this.scene;
    this.aim.x = within(Math.min(zone.leftMm, homeEye.x), x, Math.max(zone.rightMm, homeEye.x));
    this.aim.y = within(Math.min(zone.lowestMm, homeEye.y), y, Math.max(zone.highestMm, homeEye.y));
    this.aim.z = within(Math.max(nearestEyeMm, Math.min(zone.nearestMm, homeEye.z)), z, Math.max(zone.farthestMm, homeEye.z, nearestEyeMm));
  }
}
