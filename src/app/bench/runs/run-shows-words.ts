import { canBeReplayed, judgedBy, showsAll, WELL_SHOWN, type Judged, type RunShows } from '@oriel/shared/replay/what-it-shows';

/** What a run is judged by, in the order in which it is recorded best. */
export const parts: readonly { readonly key: keyof RunShows; readonly name: string; readonly advice: string }[] = [
  { key: 'stillMs', name: 'Standing still', advice: 'stand still for ten seconds' },
  { key: 'acrossMs', name: 'From side to side', advice: 'walk past a few times' },
  { key: 'alongMs', name: 'Nearer and farther', advice: 'step toward the glass and back a few times' },
];

const verdicts: Readonly<Record<Judged, string>> = { 'too-little': 'too little to judge', roughly: 'enough to judge roughly', well: 'enough' };

export const secondsWords = (ms: number): string => (ms / 1000).toFixed(ms < 9950 ? 1 : 0);

/** One part in words: how long it is, of how much that is good. */
export const partWords = (shows: RunShows, key: keyof RunShows): string =>
  `${secondsWords(shows[key])} s, ${verdicts[judgedBy(shows, key)]}${judgedBy(shows, key) === 'well' ? '' : `; ${WELL_SHOWN[key] / 1000} s are good`}`;

/** Whether a run can be tuned by, and what it lacks. */
export function verdictWords(shows: RunShows): string {
  if (showsAll(shows)) return 'Enough to tune by.';
  if (!canBeReplayed(shows))
    return judgedBy(shows, 'stillMs') === 'too-little'
      ? 'Too little to tune by: nobody stands still for long enough, so neither jitter nor lag can be judged.'
      : 'Too little to tune by: nobody moves for long enough, so lag cannot be judged.';
  const none = parts.filter(({ key }) => judgedBy(shows, key) === 'too-little').map(({ name }) => name.toLowerCase());
  return none.length ? `It can be tuned by, but not ${none.join(', nor ')}.` : 'It can be tuned by; a little more would make the figures surer.';
}

/** What to do when recording goes on; empty where there is enough. */
export function adviceWords(shows: RunShows): string {
  const [first, ...rest] = parts.filter(({ key }) => judgedBy(shows, key) !== 'well').map(({ advice }) => advice);
  return first ? `${first[0].toUpperCase()}${[first.slice(1), ...rest].join(', then ')}.` : '';
}
