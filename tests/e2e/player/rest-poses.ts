import type { FacePose } from '../../video/face-path';

/**
 * Where the face rests, in the camera's picture of 640 x 480: px of the midpoint between the pupils, and their distance. Not far from the
 * middle: a filmed flat picture of a face has no perspective of its own, so that its distance reads too long the farther it is off the
 * axis (2.2 % at 60 px up, 1.6 % at 70 px aside), which a real head's does not.
 */
export const rests = {
  centre: { x: 320, y: 240, ipd: 50 },
  right: { x: 266, y: 240, ipd: 50 },
  left: { x: 374, y: 240, ipd: 50 },
  up: { x: 320, y: 210, ipd: 50 },
  down: { x: 320, y: 270, ipd: 50 },
  near: { x: 320, y: 240, ipd: 70 },
  far: { x: 320, y: 240, ipd: 38 },
} as const;
export type Rest = keyof typeof rests;
export const restNames = Object.keys(rests) as Rest[];

const holdFrames = 150;
const moveFrames = 15;
const wholeFrames = holdFrames + moveFrames;
/** By then the picture has come to rest too: the slowest filter lets 0.8 Hz pass, which leaves e^-15 of a step. */
const settledFrames = 90;
export const settledMs = (settledFrames * 1000) / 30;

const poseAt = (from: Rest, to: Rest, t: number): FacePose => {
  const eased = t * t * (3 - 2 * t);
  const between = (key: 'x' | 'y' | 'ipd') => rests[from][key] + (rests[to][key] - rests[from][key]) * eased;
  return { segment: from, on: true, x: between('x'), y: between('y'), ipd: between('ipd'), rollDeg: 0 };
};

/** A face that rests for five seconds at each place and moves on in half a second, over and over. */
export const restingFace = {
  name: 'rests',
  poses: restNames.flatMap((name, index) => {
    const next = restNames[(index + 1) % restNames.length];
    return Array.from({ length: wholeFrames }, (_, frame) => poseAt(name, next, Math.max(0, (frame - holdFrames) / moveFrames)));
  }),
};

/** Whether the picture of a face seen in this frame has come to rest, and where. */
export function restOf(frame: number): Rest | null {
  const within = frame % wholeFrames;
  return within >= settledFrames && within < holdFrames ? restNames[Math.floor(frame / wholeFrames)] : null;
}
