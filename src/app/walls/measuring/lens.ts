import type { WallCamera } from '@oriel/shared/contracts/wall-set-up';
import { measured } from '@oriel/shared/viewer/measuring/uncertainty';
import { unmeasured } from '../means/sources';

/** Where the lens is and how sure each of its figures is, mm from the centre of the glass. */
export function lensOf({ position, uncertainty }: WallCamera) {
  const u = uncertainty.positionMm ?? unmeasured.positionMm;
  return { x: measured(position.x, u), y: measured(position.y, u), z: measured(position.z, u) };
}
