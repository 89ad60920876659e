import type { Point3 } from '@oriel/shared/projection/types';
import { steadyMeanOf } from '@oriel/shared/viewer/measuring/uncertainty';

/** Who stands still sways by a few mm and a tracker wavers by some more; this spread of single readings, mm, is a step or a turn (practice). */
const steppedMm = 40;

/** Whether whoever stood at the spot plainly moved: sideways or up and down, since a distance wavers by itself. At least two readings. */
export const movedAtSpot = (eyes: readonly Point3[]): boolean =>
  [eyes.map(({ x }) => x), eyes.map(({ y }) => y)].some((along) => steadyMeanOf(along).uncertainty > steppedMm);

/** Why a measurement at the spot is doubted: somebody moved, or it is less sure than what stands; empty where neither is so. */
export function doubtOf(eyes: readonly Point3[], sure: number, stands: number, standsWords: string): string {
  const again = 'You moved, or the tape is off: measure again.';
  if (sure > stands) return `${again} What stands now is surer, ${standsWords}.`;
  return movedAtSpot(eyes) ? again : '';
}
