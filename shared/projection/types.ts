/**
 * Plain data of the pinhole model. Right-handed, millimetres: origin at the centre of the glass, +x to the viewer's right,
 * +y up, +z out of the glass toward the viewer. A layer at depth d lies in the plane z = -d.
 */
export interface Point2 {
  readonly x: number;
  readonly y: number;
}

/** A point in front of or behind the glass; for an eye, z > 0. */
export interface Point3 extends Point2 {
  readonly z: number;
}

/** The visible surface of the screen, the plane z = 0. */
export interface Glass {
  readonly widthMm: number;
  readonly heightMm: number;
}

/** The box of eye positions a wall must serve; left and lowest are signed positions, so leftMm < rightMm and lowestMm < highestMm. */
export interface ViewingZone {
  readonly leftMm: number;
  readonly rightMm: number;
  readonly lowestMm: number;
  readonly highestMm: number;
  readonly nearestMm: number;
  readonly farthestMm: number;
}

/** A rectangle in a plane parallel to the glass: its centre and its size. */
export interface Rectangle {
  readonly xMm: number;
  readonly yMm: number;
  readonly widthMm: number;
  readonly heightMm: number;
}
