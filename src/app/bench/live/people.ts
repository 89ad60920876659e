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

/** The others in words: how many, and how far off. Their numbers are the tracker's own and say nothing to anybody. */
export function othersWords({ others }: People): string {
  if (others.length === 0) return 'nobody';
  const distances = others.map(({ eye }) => `${(eye.z / 1000).toFixed(1)} m`).join(', ');
  return `${others.length === 1 ? 'one more' : `${others.length} more`}, at ${distances}`;
}

/** For how long the same person has been followed. */
export function followedWords(ms: number): string {
  const seconds = Math.floor(ms / 1000);
  return seconds < 60 ? `${seconds} s` : `${Math.floor(seconds / 60)} min ${seconds % 60} s`;
}
