/*
 * Landmarks draw a near face a little too small and a far one a little too large, so that distance reads too long near and too short far.
 * Measured on three rendered heads that face the camera (1280 px and 60 degrees across; npm run video:heads -- --path far, --who 0 to 2,
 * npm run bench:tracking without this correction), against 1 m:
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

/*
 * Landmarks draw a turned head too small as well, the more so the smaller it is in the picture, so that its distance reads too long: on
 * films of turning heads from two generators (npm run bench:tracking, segments yaw and mixed, read as perspective-place.ts does) by
 *
 *     0.15 (Z/Z0)^0.3 sin2 yaw,
 *
 * with the yaw that landmarks show, 27 degrees of 35. Yaw of 35 degrees at 0.6, 1 and 2 m so comes to 1.0 to 1.4, 1.4 to 2.2 and
 * 1.4 to 2.7 % rms.
 */
const TURN_LOSES = 0.15;
const TURN_POWER = 0.3;

/** By how much to multiply the distance read of a head turned so far, as it looks from the camera. */
export const trendOfTurn = (readMm: number, eyeDistanceMm: number, yawRad: number): number =>
  1 - TURN_LOSES * (readMm / eyeDistanceMm / NEUTRAL) ** TURN_POWER * Math.sin(yawRad) ** 2;

/*
 * Landmarks draw the whole face larger as its jaw opens, so that its distance reads too short: by 4 to 10 % for each eye distance between
 * the lips, in ten of eleven films of talking heads from two generators (npm run bench:tracking, segment talk). The photographs they are
 * made of smile, with a fifth of an eye distance between the lips: nothing changes there, nor below, where blur closes lips that are open.
 * How far a turned mouth is open is misjudged, so that the correction is gone at 20 degrees. Talking so comes from 0.7 to 1.8 % rms to
 * 0.4 to 1.2 %; a third face, whose mouth is closed at rest, stays at 1.0.
 */
const MOUTH_GAINS = 0.06;
const SMILING = 0.2;
const TOO_TURNED = Math.sin((20 * Math.PI) / 180) ** 2;

/**
 * By how much to multiply the distance read of someone whose inner lips are so far apart, in eye distances.
 * @param facing cosine of the angle between where the face looks and the line of sight.
 */
export const trendOfMouth = (opening: number, facing: number): number =>
  1 + MOUTH_GAINS * Math.max(0, opening - SMILING) * Math.max(0, 1 - (1 - facing ** 2) / TOO_TURNED);
