import fc from 'fast-check';
import type { SceneSetting } from '../scene-geometry';

/** Generators of sound inputs for the property tests of the pinhole model. */
export const figure = (min: number, max: number) => fc.double({ min, max, noNaN: true, noDefaultInfinity: true });

export const anyEye = fc.record({ x: figure(-3000, 3000), y: figure(-2000, 2000), z: figure(200, 6000) });

/** Depths that every eye above stands in front of. */
export const anyDepth = figure(-150, 20_000);

export const anyGlass = fc.record({ widthMm: figure(100, 3000), heightMm: figure(100, 3000) });

export const anyZone = fc
  .tuple(figure(-3000, 3000), figure(0, 4000), figure(-1500, 1500), figure(0, 2000), figure(200, 3000), figure(0, 4000))
  .map(([leftMm, width, lowestMm, height, nearestMm, length]) => ({
    leftMm,
    rightMm: leftMm + width,
    lowestMm,
    highestMm: lowestMm + height,
    nearestMm,
    farthestMm: nearestMm + length,
  }));

export const anySetting: fc.Arbitrary<SceneSetting> = fc.record({ glass: anyGlass, homeEye: anyEye, zone: anyZone });

export const anyRectangle = fc.record({
  xMm: figure(-1000, 1000),
  yMm: figure(-1000, 1000),
  widthMm: figure(1, 3000),
  heightMm: figure(1, 3000),
});

/** A share of a range: three of them place an eye in a zone. */
export const share = figure(0, 1);

export const within = (low: number, high: number, t: number) => low + (high - low) * t;
