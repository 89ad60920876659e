/*
 * Landmarks draw a near face a little too small and a far one a little too large, so that distance reads too long near and too short far.
 * Measured on three rendered heads that face the camera (1280 px and 60 degrees across), against 1 m:
 *
 *     0.5 m  +0.6 +1.8 +0.6 %   0.6 m  +0.9 +1.4 +0.8 %   2 m  -0.8 -1.2 -0.8 %   3 m  -1.3 -2.6 -0.7 %   4 m  -1.4 -2.7 -1.2 %
 *
 * What counts is how large the face is in the picture, so that a wrong eye distance still scales everything by one factor. A power of
 * the distance in eye distances takes most of it back, and changes nothing at 1 m for eyes 63 mm apart.
 */
const NEUTRAL = 1000 / 63;
const POWER = 0.012;

/** By how much to multiply a distance read from landmarks of someone whose eyes are so far apart, both in mm. */
export const trendOfDistance = (readMm: number, eyeDistanceMm: number): number =>
  (readMm / eyeDistanceMm / NEUTRAL) ** POWER;
