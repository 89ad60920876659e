import * as z from 'zod';

const point = z.tuple([z.number(), z.number()]);

/** One frame of a video with a flat face: whether it is there (`on`), and where its pupils are in pixels; `ipd` in pixels, `roll` in degrees. */
const truthFrame = z.object({
  i: z.int(),
  on: z.union([z.number(), z.boolean()]).transform(Boolean),
  ipd: z.number(),
  re: point,
  le: point,
  roll: z.number(),
});

/** What is known of a video: its size, frames a second, and where the face is in every frame. */
export const truthSchema = z.object({
  W: z.int().positive(),
  H: z.int().positive(),
  FPS: z.number().positive(),
  frames: z.array(truthFrame).min(1),
});

export type Truth = z.infer<typeof truthSchema>;
export type TruthFrame = Truth['frames'][number];
