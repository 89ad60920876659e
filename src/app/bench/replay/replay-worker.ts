import { InjectionToken } from '@angular/core';

/** Makes the worker in which runs are replayed. */
export const REPLAY_WORKER = new InjectionToken<() => Worker>('replay worker', {
  providedIn: 'root',
  factory: () => () => new Worker(new URL('./replay.worker', import.meta.url), { type: 'module' }),
});
