import { GeometryError } from '../../projection/geometry-error';
import { requirePositive } from '../../projection/requirements';
import { acrossFromFocal } from '../field-of-view';
import { type Measured, propagate } from './uncertainty';

/*
 * The field of view by hand. A thing of known width W, held square to the camera at a distance d from the front of the camera, is
 * seen w px wide:
 *
 *     w = f W / (d + o),
 *
 * with the focal length f in px and o the depth of the lens's centre behind that front (a pinhole camera). Two distances give both:
 *
 *     o = (w2 d2 - w1 d1) / (w1 - w2),      f = w1 w2 (d2 - d1) / (W (w1 - w2)).
 *
 * It fails where the two widths are the same. The error grows as they draw together: the farther distance should be at least twice
 * the nearer. A thing held askew reads narrower by the cosine of its turn (1.5 % at 10 degrees).
 */

/** The format ID-1 of ISO/IEC 7810 (bank and identity cards), mm, with the standard's tolerance of ±0.12 mm taken as rectangular. */
export const ID1_WIDTH: Measured = { value: 85.6, uncertainty: 0.12 / Math.sqrt(3) };
/** The long side of A4, ISO 216: 297 ± 2 mm, taken as rectangular. */
export const A4_LENGTH: Measured = { value: 297, uncertainty: 2 / Math.sqrt(3) };

/** A thing of known width seen at a known distance. */
export interface Sighting {
  /** From the front of the camera, mm. */
  readonly distanceMm: Measured;
  /** Between its two edges in the picture, px. */
  readonly widthPx: Measured;
}

export interface Lens {
  readonly focalPx: Measured;
  /** Field of view across the picture. */
  readonly hfovRad: Measured;
  /** How far behind the front of the camera the lens's centre lies, mm; before it where negative. */
  readonly behindFrontMm: Measured;
}

/**
 * Focal length, field of view and place of the lens from two sightings of one thing, each with its uncertainty.
 * @throws GeometryError where the farther sighting is not the narrower one.
 */
export function lensFromTwoDistances(sizeMm: Measured, first: Sighting, second: Sighting, pictureWidthPx: number): Lens {
  requirePositive('pictureWidthPx', pictureWidthPx);
  const [near, far] = first.distanceMm.value <= second.distanceMm.value ? [first, second] : [second, first];
  const inputs = [near.distanceMm, far.distanceMm, near.widthPx, far.widthPx, sizeMm];
  const focal = ([d1, d2, w1, w2, size]: number[]) => focalOf(size, d1, w1, d2, w2);
  return {
    focalPx: propagate(focal, inputs),
    hfovRad: propagate((x) => acrossFromFocal(focal(x), pictureWidthPx), inputs),
    behindFrontMm: propagate(([d1, d2, w1, w2]) => (w2 * d2 - w1 * d1) / (w1 - w2), inputs),
  };
}

function focalOf(sizeMm: number, d1: number, w1: number, d2: number, w2: number): number {
  requirePositive('sizeMm', sizeMm);
  requirePositive('widthPx', w2);
  if (d2 <= d1) throw new GeometryError('distanceMm', 'The two distances must differ by more than their uncertainty: move the card farther away for one of them.');
  if (w1 <= w2) throw new GeometryError('widthPx', 'Farther away the card must look narrower: mark its two edges again.');
  return (w1 * w2 * (d2 - d1)) / (sizeMm * (w1 - w2));
}
