import type { SceneSetting } from './scene-geometry';
import type { Glass } from './types';

/** The visible surface of a screen of 16:9 with a diagonal of 1388 mm (54.7 inches), lying. */
const lying: Glass = { widthMm: 1210, heightMm: 681 };

export type Lie = 'landscape' | 'portrait';

/**
 * What a new scene is composed for until its room is known: a large screen at eye height, looked at from a sofa, passed by at the
 * nearest at arm's length and a half. Practice, not measurement; every figure is the designer's to change.
 */
export const livingRoom = (lie: Lie): SceneSetting => ({
  glass: lie === 'landscape' ? lying : { widthMm: lying.heightMm, heightMm: lying.widthMm },
  homeEye: { x: 0, y: 0, z: 1800 },
  zone: { leftMm: -700, rightMm: 700, lowestMm: -250, highestMm: 250, nearestMm: 1200, farthestMm: 3200 },
});

/** Depth of the farthest layer when a scene is made from several pictures, mm. */
export const farthestOfNewMm = 1200;
