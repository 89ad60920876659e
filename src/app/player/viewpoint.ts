import { holdEye } from '@oriel/shared/projection/hold-eye';
import type { Point3 } from '@oriel/shared/projection/types';
import { NO_DRIFT } from '@oriel/shared/smoothing/drift';
import { type Follower, createFollower } from '@oriel/shared/smoothing/follower';
import { CALM_FOLLOWING, type FollowerSettings } from '@oriel/shared/smoothing/follower-settings';
import { HandEye } from './hand-eye';
import type { SceneOnScreen } from './scene-on-screen';

/** So long after pointer or keys last moved the eye, a face takes over again. */
const handOverMs = 4000;
/** From drawing to the light of the screen, ms: measured with CSS at 60 frames a second. */
const drawnToLitMs = 20;

/** What was tuned of how the picture follows; the rest is as usual. */
export interface Following {
  readonly settings: Partial<FollowerSettings>;
  /** Delay of screen and camera that no timestamp shows, ms: looked ahead for. */
  readonly displayDelayMs: number;
}

const usualFollowing: Following = { settings: {}, displayDelayMs: 0 };

/**
 * Whose eye the picture is drawn for: a face, the hand in its place, or nobody. Both are sent through one follower, so that handing over,
 * easing and the limit of comfort are the same for all; and both are held to the room from which the scene is clear, so that it never
 * tears. Nothing is allocated after creation.
 */
export class Viewpoint {
  private readonly follower: Follower;
  private readonly hand: HandEye;
  private readonly seen = { x: 0, y: 0, z: 1 };
  private readonly last = { x: 0, y: 0, z: 1 };
  private steeredMs = -Infinity;
  private steppedMs = 0;
  private handHolds = false;

  /** `still`: less motion is asked for, so nothing drifts by itself. */
  constructor(
    private readonly scene: SceneOnScreen,
    still: boolean,
    private readonly following: Following = usualFollowing,
  ) {
    const { homeEye, nearestEyeMm } = scene;
    this.hand = new HandEye(scene);
    this.follower = createFollower({
      ...CALM_FOLLOWING,
      ...following.settings,
      homeEye: { ...homeEye, z: Math.max(homeEye.z, nearestEyeMm) },
      nearestMm: nearestEyeMm,
      ...(still ? { drift: NO_DRIFT } : {}),
    });
    Object.assign(this.last, homeEye);
  }

  /** Whether pointer or keys move the eye. */
  get byHand(): boolean {
    return this.handHolds;
  }

  /** Takes the eye of a face, mm from the centre of the screen. What no eye can be is ignored. */
  face(eye: Point3, capturedMs: number): void {
    if (this.handHolds || !(eye.z > 0) || !Number.isFinite(eye.x + eye.y + eye.z)) return;
    this.seen.x = eye.x - this.scene.stage.centreMm.x;
    this.seen.y = eye.y - this.scene.stage.centreMm.y;
    this.seen.z = eye.z;
    this.follower.sample(this.seen, capturedMs);
  }

  /** The camera saw nobody. */
  nobody(tMs: number): void {
    if (!this.handHolds) this.follower.lost(tMs);
  }

  /** Aims the eye by pointer: `across` and `down` from 0 to 1 of the viewing zone. */
  point(across: number, down: number, tMs: number): void {
    this.takeInHand(tMs);
    this.hand.point(across, down);
  }

  /** Moves the eye by a key; says whether the key means anything. */
  press(key: string, tMs: number): boolean {
    if (!this.hand.press(key)) return false;
    if (!this.handHolds) {
      this.takeInHand(tMs);
      this.hand.press(key);
    }
    this.steeredMs = tMs;
    return true;
  }

  /** Writes the eye to draw for, mm from the centre of the stage, in the frame at `tMs`. With `faceExpected` the hand gives way after a while. */
  at(tMs: number, faceExpected: boolean, out: { x: number; y: number; z: number }): void {
    if (this.handHolds && faceExpected && tMs > this.steeredMs + handOverMs) {
      this.handHolds = false;
      this.follower.lost(tMs);
    }
    if (this.handHolds) {
      this.hand.step(tMs - this.steppedMs);
      this.follower.sample(this.hand.eye, tMs);
    }
    this.steppedMs = tMs;
    this.follower.at(tMs + drawnToLitMs + this.following.displayDelayMs, out);
    holdEye(this.scene.room, out, out);
    out.z = Math.max(out.z, this.scene.nearestEyeMm);
    this.last.x = out.x;
    this.last.y = out.y;
    this.last.z = out.z;
  }

  private takeInHand(tMs: number): void {
    this.steeredMs = tMs;
    if (this.handHolds) return;
    this.handHolds = true;
    this.hand.from(this.last);
  }
}
