import type { Glass, Point3 } from '@oriel/shared/projection/types';

/**
 * Where a camera on the frame stands once the glass is known to be of another size: one that stood outside an edge keeps its distance from
 * that edge, one before the glass keeps its place. Millimetres from the centre of the glass.
 */
export function cameraOnFrame(position: Point3, before: Glass, after: Glass): Point3 {
  return {
    x: fromEdge(position.x, before.widthMm / 2, after.widthMm / 2),
    y: fromEdge(position.y, before.heightMm / 2, after.heightMm / 2),
    z: position.z,
  };
}

const fromEdge = (place: number, before: number, after: number) =>
  Math.abs(place) >= before ? place + Math.sign(place) * (after - before) : place;
