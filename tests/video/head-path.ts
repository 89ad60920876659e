import type { HeadPose } from './turning-head';

/** A stretch of a video: what its camera is like, and where each head is at a time from 0 to 1. */
export interface HeadSegment {
  readonly name: string;
  readonly frames: number;
  /** Share of full light, and noise of the sensor in levels of 255. */
  readonly light?: number;
  readonly noise?: number;
  /** The shutter is open for this share of the time from one frame to the next; moments drawn meanwhile. */
  readonly shutter?: number;
  readonly moments?: number;
  readonly heads: (t: number) => readonly HeadPose[];
}

const wave = (t: number): number => Math.sin(2 * Math.PI * t);
const degrees = (radians: number): number => (radians * 180) / Math.PI;
/** From 0 to 1 with no jerk at either end: 3t^2 - 2t^3. */
const eased = (t: number): number => {
  const clamped = Math.min(1, Math.max(0, t));
  return clamped * clamped * (3 - 2 * clamped);
};

/** One person's head at this distance, turning as issue 3 asks: yaw 35, pitch 20, roll 25 degrees, all together, talking. */
function turning(z: number, who: number): HeadSegment[] {
  const one =
    (turn: (t: number) => Partial<HeadPose>) =>
    (t: number): HeadPose[] => [{ who, x: 0, y: -20, z, ...turn(t) }];
  return [
    { name: 'rest', frames: 30, heads: one(() => ({})) },
    { name: 'yaw', frames: 60, heads: one((t) => ({ yaw: 35 * wave(t) })) },
    { name: 'pitch', frames: 45, heads: one((t) => ({ pitch: 20 * wave(t) })) },
    { name: 'roll', frames: 45, heads: one((t) => ({ roll: 25 * wave(t) })) },
    {
      name: 'mixed',
      frames: 60,
      heads: one((t) => ({
        yaw: 30 * wave(t),
        pitch: 12 * wave(2 * t + 0.1),
        roll: 10 * wave(t + 0.3),
        x: 0.15 * z * wave(t),
      })),
    },
    { name: 'talk', frames: 30, heads: one((t) => ({ jaw: 12 * Math.abs(wave(t)) })) },
  ];
}

/** Past the camera at 2 m and this speed, looking ahead at first and then at the camera, with the rise and fall of steps. */
function walkPast(name: string, mmPerS: number, who: number, more: Partial<HeadSegment> = {}): HeadSegment {
  const seconds = 2600 / mmPerS;
  return {
    name,
    frames: Math.round(seconds * 30),
    ...more,
    heads: (t) => {
      const [x, z] = [-1300 + 2600 * t, 2000];
      const toCamera = -degrees(Math.atan2(x, z));
      const yaw = 60 + (toCamera - 60) * eased(t / 0.4);
      return [{ who, x, y: -60 + 18 * wave(1.9 * t * seconds), z, yaw, roll: 3 * wave(0.95 * t * seconds) }];
    },
  };
}

const walk = (who: number): HeadSegment[] => [
  { name: 'rest', frames: 24, heads: () => [{ who, x: 0, y: -20, z: 1500 }] },
  { name: 'gone', frames: 12, heads: () => [] },
  walkPast('walk', 1000, who),
  { name: 'gone', frames: 12, heads: () => [] },
  walkPast('fast', 1500, who),
];

const far = (who: number): HeadSegment[] => [
  { name: 'gone', frames: 6, heads: () => [] },
  { name: 'arrive4000', frames: 24, heads: () => [{ who, x: 600, y: -150, z: 4000 }] },
  ...[3000, 2000, 1500, 1000, 600, 500].map((z) => ({
    name: z === 1000 ? 'rest' : `rest${String(z)}`,
    frames: 24,
    heads: () => [{ who, x: 0, y: -20, z }],
  })),
  {
    name: 'sweep',
    frames: 120,
    heads: (t) => [{ who, x: 0, y: -20, z: 500 * 8 ** eased(t < 0.5 ? 2 * t : 2 - 2 * t) }],
  },
];

/** Two, then a third who comes nearer than both, then two who change places, then one alone. */
const group = (who: number): HeadSegment[] => [
  { name: 'rest', frames: 20, heads: () => [{ who, x: -350, y: -20, z: 1500 }] },
  {
    name: 'two',
    frames: 45,
    heads: (t) => [
      { who, x: -350, y: -20, z: 1500, yaw: 15 * wave(t) },
      { who: who + 1, x: 420, y: 0, z: 1900, yaw: -10 * wave(t) },
    ],
  },
  {
    name: 'third',
    frames: 120,
    heads: (t) => [
      { who, x: -350, y: -20, z: 1500 },
      { who: who + 1, x: 420, y: 0, z: 1900 },
      { who: who + 2, x: 60, y: 20, z: 2800 - 1900 * eased(2.5 * t) },
    ],
  },
  {
    name: 'cross',
    frames: 75,
    heads: (t) => [
      { who, x: -350 + 850 * eased(t), y: -20, z: 1500, yaw: 20 * Math.sin(Math.PI * t) },
      { who: who + 1, x: 420 - 900 * eased(t), y: 0, z: 1900, yaw: -20 * Math.sin(Math.PI * t) },
    ],
  },
  { name: 'alone', frames: 30, heads: () => [{ who: who + 1, x: -480, y: 0, z: 1900 }] },
];

const DIM = { light: 0.25, noise: 5 };

const dim = (who: number): HeadSegment[] => [
  { name: 'rest', frames: 24, heads: () => [{ who, x: 0, y: -20, z: 1000 }] },
  ...[1000, 2000].flatMap((z): HeadSegment[] => [
    { name: `dimrest${String(z)}`, frames: 30, ...DIM, heads: () => [{ who, x: 0, y: -20, z }] },
    { name: `dimyaw${String(z)}`, frames: 45, ...DIM, heads: (t) => [{ who, x: 0, y: -20, z, yaw: 30 * wave(t) }] },
  ]),
  { name: 'dark1000', frames: 30, light: 0.1, noise: 6, heads: () => [{ who, x: 0, y: -20, z: 1000 }] },
];

const blur = (who: number): HeadSegment[] => [
  { name: 'rest', frames: 24, heads: () => [{ who, x: 0, y: -20, z: 1500 }] },
  ...[1000, 2000].map((z): HeadSegment => ({
    name: `sway${String(z)}`,
    frames: 60,
    shutter: 0.8,
    moments: 6,
    heads: (t) => [{ who, x: 0.3 * z * wave(t), y: -20 + 20 * wave(3 * t), z, yaw: -12 * wave(t) }],
  })),
  walkPast('fastblur', 1500, who, { shutter: 0.9, moments: 6 }),
];

/** Each person at rest, near, turning: for the weights of the fit. */
const PATHS: Readonly<Record<string, (who: number) => HeadSegment[]>> = {
  turn06: (who) => turning(600, who),
  turn1: (who) => turning(1000, who),
  turn2: (who) => turning(2000, who),
  walk,
  far,
  group,
  dim,
  blur,
};

/** Names of the paths heads can take. */
export const HEAD_PATHS = Object.keys(PATHS);

/** The path of this name for this person (0 and up); null where there is none of that name. */
export const headPath = (name: string, who: number): readonly HeadSegment[] | null =>
  Object.hasOwn(PATHS, name) ? PATHS[name](who) : null;
