import type { SceneDocument } from '@oriel/shared/contracts/scenes';

/** The scene as it is, as it was, and as it was before undoing. */
export interface History {
  readonly past: readonly SceneDocument[];
  readonly present: SceneDocument;
  readonly future: readonly SceneDocument[];
  /** What the newest step was part of, so that the next may join it. */
  readonly joining: Joining | null;
}

/** Steps with one key become one: the whole of a drag (`withinMs` infinite), or figures typed in quick succession. */
export interface Joining {
  readonly key: string;
  readonly at: number;
}

export const MOST_STEPS = 200;

export const beginHistory = (present: SceneDocument): History => ({ past: [], present, future: [], joining: null });

/** Records a step. The same scene again is no step. */
export function record(history: History, next: SceneDocument, joining: Joining | null = null, withinMs = Infinity): History {
  if (next === history.present) return history;
  const before = history.joining;
  const joins = joining !== null && before?.key === joining.key && joining.at - before.at <= withinMs;
  return {
    past: joins ? history.past : [...history.past, history.present].slice(-MOST_STEPS),
    present: next,
    future: [],
    joining,
  };
}

export function undo(history: History): History {
  if (history.past.length === 0) return history;
  return {
    past: history.past.slice(0, -1),
    present: history.past[history.past.length - 1],
    future: [history.present, ...history.future],
    joining: null,
  };
}

export function redo(history: History): History {
  if (history.future.length === 0) return history;
  return {
    past: [...history.past, history.present],
    present: history.future[0],
    future: history.future.slice(1),
    joining: null,
  };
}
