import * as z from 'zod';
import { nominalPxMm } from './screen-measure';

const cameraSides = ['above', 'below', 'left', 'right'] as const;
export type CameraSide = (typeof cameraSides)[number];

const mm = (least: number, most: number) => z.number().min(least, `At least ${least} mm`).max(most, `At most ${most} mm`);

/** What was measured of a screen and its camera; kept for one browser. */
export const ScreenSetUp = z.object({
  version: z.literal(1),
  glass: z.object({ widthMm: mm(40, 10_000), heightMm: mm(40, 10_000) }),
  /** The screen it was measured on, in px, so that another screen is noticed. */
  screenPx: z.object({ width: z.number().positive(), height: z.number().positive() }),
  /** Size of one device pixel, which zooming the page does not change. */
  devicePxMm: z.number().positive().max(10),
  /** Whether a person measured, or the usual measures are taken. */
  measured: z.boolean(),
  camera: z.object({
    /** Outside the middle of which edge of the glass. */
    side: z.enum(cameraSides),
    /** From that edge of the glass to the lens. */
    offsetMm: mm(0, 2000),
    /** How far the camera is turned down, degrees; up is negative. */
    downDegrees: z.number().min(-60).max(60),
    /** Horizontal field of view. */
    fieldDegrees: z.number().min(20, 'At least 20 degrees').max(140, 'At most 140 degrees'),
    /** Whether the camera delivers its picture as a mirror would. */
    mirrored: z.boolean(),
  }),
});
export type ScreenSetUp = z.infer<typeof ScreenSetUp>;
export type CameraSetUp = ScreenSetUp['camera'];

/** The few properties of `window` that a set-up starts from. */
export interface ScreenFacts {
  readonly screen: { readonly width: number; readonly height: number };
  readonly devicePixelRatio: number;
}

export const usualCamera: CameraSetUp = { side: 'above', offsetMm: 10, downDegrees: 0, fieldDegrees: 60, mirrored: false };

/** The set-up of a screen whose px measure `pxMm`, on its own or with a camera already described. */
export function setUpOf(facts: ScreenFacts, pxMm: number, measured: boolean, camera: CameraSetUp = usualCamera): ScreenSetUp {
  const { width, height } = facts.screen;
  return {
    version: 1,
    glass: { widthMm: width * pxMm, heightMm: height * pxMm },
    screenPx: { width, height },
    devicePxMm: pxMm / facts.devicePixelRatio,
    measured,
    camera,
  };
}

/** The usual measures: 96 px to the inch, a camera of 60 degrees in the upper frame. */
export function usualSetUp(facts: ScreenFacts): ScreenSetUp {
  return setUpOf(facts, nominalPxMm, false);
}

/** Whether a set-up was made on this screen, upright or turned. */
export function isOfThisScreen({ screenPx }: ScreenSetUp, { screen }: ScreenFacts): boolean {
  const same = screenPx.width === screen.width && screenPx.height === screen.height;
  return same || (screenPx.width === screen.height && screenPx.height === screen.width);
}

/** The lens, mm from the centre of the glass; it is taken to lie in the plane of the glass. */
export function cameraPosition({ glass, camera }: Pick<ScreenSetUp, 'glass' | 'camera'>): { x: number; y: number; z: number } {
  const across = glass.widthMm / 2 + camera.offsetMm;
  const up = glass.heightMm / 2 + camera.offsetMm;
  switch (camera.side) {
    case 'above':
      return { x: 0, y: up, z: 0 };
    case 'below':
      return { x: 0, y: -up, z: 0 };
    case 'left':
      return { x: -across, y: 0, z: 0 };
    case 'right':
      return { x: across, y: 0, z: 0 };
  }
}
