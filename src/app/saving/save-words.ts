import { clockTime } from '../core/moments';
import type { MovedOn, SaveState } from './autosave';

/** Where the scene stands, in words. */
export function saveWords(state: SaveState, saved: MovedOn): string {
  switch (state.kind) {
    case 'saved':
      return saved.savedAt ? `Saved ${clockTime(new Date(saved.savedAt))}, revision ${saved.revision}` : '';
    case 'waiting':
      return 'Not saved yet';
    case 'saving':
      return 'Saving…';
    case 'offline':
      return 'Not saved: no network, will save when it is back';
    case 'failed':
      return `Not saved: ${state.failure.failure.message}${state.retrying ? ' Trying again.' : ''}`;
    case 'conflict':
      return `Not saved: ${state.theirs.savedBy} saved revision ${state.theirs.revision} meanwhile`;
  }
}
