import * as z from 'zod';

/** A face that is truly there. */
export interface TrueFace {
  /** The pupils in pixels, the subject's own right and left. */
  readonly rightEye: readonly [number, number];
  readonly leftEye: readonly [number, number];
  /** The distance between the pupils in pixels, as it would be seen with the head facing the camera. */
  readonly ipdPx: number;
  /** The midpoint between the pupils in camera millimetres, x right, y down, z away; null where only the picture is known. */
  readonly eyeMm: readonly [number, number, number] | null;
  /** Whether the head faces the camera, to within five degrees each way. */
  readonly facing: boolean;
}

export interface TruthFrame {
  readonly number: number;
  readonly segment: string;
  readonly faces: readonly TrueFace[];
}

/** What is known of a video. */
export interface Truth {
  readonly fps: number;
  /** Field of view across the frame; null where distances are not known. */
  readonly hfovRad: number | null;
  readonly ipdMm: number;
  readonly frames: readonly TruthFrame[];
}

const FACING_DEGREES = 5;
const radians = (degrees: number): number => (degrees * Math.PI) / 180;
const point = z.tuple([z.number(), z.number()]);
const present = z.union([z.number(), z.boolean()]).transform(Number);
const video = { W: z.number().positive(), H: z.number().positive(), FPS: z.number().positive() };
const frame = { i: z.int(), seg: z.string().default('') };

/** A flat face that moves in the picture: pixels, roll in degrees. Where nobody is, nothing else need be said. */
const flatFace = z.object({ on: present, ipd: z.number(), re: point, le: point, roll: z.number().default(0) });
const flatFrame = z.union([
  z.object({ ...frame, ...flatFace.shape, on: present.refine((on) => on > 0) }),
  z.object({ ...frame, on: present.refine((on) => on === 0) }),
]);

const flatTruth = z.object({ ...video, frames: z.array(flatFrame).min(1) }).transform((truth): Truth => ({
  fps: truth.FPS,
  hfovRad: null,
  ipdMm: 63,
  frames: truth.frames.map((seen) => ({ number: seen.i, segment: seen.seg, faces: 're' in seen ? [flatFaceOf(seen)] : [] })),
}));

const flatFaceOf = ({ re, le, ipd, roll }: z.infer<typeof flatFace>): TrueFace => ({
  rightEye: re,
  leftEye: le,
  ipdPx: ipd,
  eyeMm: null,
  facing: Math.abs(roll) < FACING_DEGREES,
});

const head = z.object({
  re: point,
  le: point,
  mid: z.tuple([z.number(), z.number(), z.number().positive()]),
  yaw: z.number(),
  pitch: z.number(),
  roll: z.number(),
});

/** Heads that turn in space: millimetres of the camera, angles in degrees. */
const headTruth = z
  .object({
    ...video,
    hfov: z.number().positive().lt(180),
    ipdMm: z.number().positive(),
    frames: z.array(z.object({ ...frame, heads: z.array(head).default([]) })).min(1),
  })
  .transform((truth): Truth => {
    const hfovRad = radians(truth.hfov);
    const focalPx = truth.W / 2 / Math.tan(hfovRad / 2);
    const faceOf = ({ re, le, mid, yaw, pitch, roll }: z.infer<typeof head>): TrueFace => ({
      rightEye: re,
      leftEye: le,
      ipdPx: (focalPx * truth.ipdMm) / mid[2],
      eyeMm: mid,
      facing: [yaw, pitch, roll].every((angle) => Math.abs(angle) < FACING_DEGREES),
    });
    const frames = truth.frames.map(({ i, seg, heads }) => ({ number: i, segment: seg, faces: heads.map(faceOf) }));
    return { fps: truth.FPS, hfovRad, ipdMm: truth.ipdMm, frames };
  });

/** Either kind of truth, read from JSON. */
export const truthSchema = z.union([headTruth, flatTruth]);
