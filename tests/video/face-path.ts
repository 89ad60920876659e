/** Where the face of one frame is: the midpoint between the pupils and their distance in pixels, roll in degrees, clockwise. */
export interface FacePose {
  readonly segment: string;
  readonly on: boolean;
  readonly x: number;
  readonly y: number;
  readonly ipd: number;
  readonly rollDeg: number;
}

/** What may change within a segment; the face is upright and there unless said otherwise. */
type Placing = Pick<FacePose, 'x' | 'y' | 'ipd'> & { readonly rollDeg?: number };

const TURN = 2 * Math.PI;

/** From 0 to 1 with no jerk at either end: 3t^2 - 2t^3. */
const eased = (t: number): number => {
  const clamped = Math.min(1, Math.max(0, t));
  return clamped * clamped * (3 - 2 * clamped);
};

/** A face that walks from one apparent size to another: even steps in distance, which is one over the size. */
const approaching = (fromIpd: number, toIpd: number, t: number): number => 1 / ((1 - t) / fromIpd + t / toIpd);

/** `frames` poses of a segment, with time from 0 to (nearly) 1. */
const segment = (name: string, frames: number, place: (t: number) => Placing): FacePose[] =>
  Array.from({ length: frames }, (_, k) => ({ segment: name, on: true, rollDeg: 0, ...place(k / frames) }));

const absent = (frames: number): FacePose[] =>
  Array.from({ length: frames }, () => ({ segment: 'absent', on: false, x: 0, y: 0, ipd: 1, rollDeg: 0 }));

/** For tuning on: still, from side to side, near and far, gone and back, rolling. 640 x 480. */
const train = (): FacePose[] => [
  ...segment('static', 90, () => ({ x: 320, y: 220, ipd: 58 })),
  ...segment('lateral', 150, (t) => ({
    x: 320 + 200 * Math.sin(TURN * t),
    y: 220 + 40 * Math.sin(2 * TURN * t),
    ipd: 58,
  })),
  ...segment('nearfar', 180, (t) => ({
    x: 320,
    y: 220,
    ipd: t < 1 / 3 ? approaching(58, 87, eased(3 * t)) : approaching(87, 23, eased(1.5 * (t - 1 / 3))),
  })),
  ...segment('far', 60, () => ({ x: 320, y: 220, ipd: 23 })),
  ...absent(30),
  ...segment('roll', 120, (t) => ({
    x: 320 + 120 * Math.sin(TURN * t),
    y: 220,
    ipd: 50,
    rollDeg: 20 * Math.sin(2 * TURN * t),
  })),
];

/** For reporting on, never for tuning: a walk past, two sudden changes of size, gone and back, walking away, nodding. 640 x 480. */
const held = (): FacePose[] => [
  ...segment('static', 60, () => ({ x: 250, y: 200, ipd: 40 })),
  ...segment('walk', 180, (t) => ({
    x: 90 + 460 * eased(1.4 * t),
    y: 210 + 18 * Math.sin(16 * t),
    ipd: 36 + 14 * Math.sin(Math.PI * t),
    rollDeg: 6 * Math.sin(9 * t),
  })),
  ...segment('jumpnear', 60, () => ({ x: 330, y: 250, ipd: 84, rollDeg: -5 })),
  ...segment('jumpfar', 75, () => ({ x: 420, y: 180, ipd: 24, rollDeg: 4 })),
  ...absent(30),
  ...segment('nearfar', 180, (t) => ({ x: 300 + 60 * Math.sin(5 * t), y: 230, ipd: approaching(80, 22, eased(t)) })),
  ...segment('nod', 90, (t) => ({
    x: 320,
    y: 220 + 70 * Math.sin(2 * TURN * t),
    ipd: 52,
    rollDeg: 12 * Math.sin(TURN * t),
  })),
];

/** The paths a face can take, by name. */
export const FACE_PATHS: Readonly<Record<string, () => FacePose[]>> = { train, held };
