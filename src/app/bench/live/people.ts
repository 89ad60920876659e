import type { Point3 } from '@oriel/shared/projection/types';
import type { EyeSample } from '../../tracking/eye-sample';

/** Who is there: the one followed, and the others with where they are, each by a number that is theirs for as long as they stay. */
export interface People {
  readonly followed: number | null;
  readonly others: readonly { readonly id: number; readonly eye: Point3 }[];
}

export const NOBODY: People = { followed: null, others: [] };

/** A copy of who is in a sample, which itself is written over by the next. */
export const peopleIn = ({ found, viewer, others }: EyeSample): People => ({
  followed: found ? viewer : null,
  others: others.map(({ id, eye }) => ({ id, eye: { ...eye } })),
});

/** The others in words. */
export function othersWords({ others }: People): string {
  if (others.length === 0) return 'nobody';
  return others.map(({ id, eye }) => `person ${id} at ${(eye.z / 1000).toFixed(1)} m`).join(', ');
}
