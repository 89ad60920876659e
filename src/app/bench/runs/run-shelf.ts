import { Injectable, inject } from '@angular/core';
import type { keepRun } from '@oriel/shared/contracts/runs';
import type { BodyOf } from '@oriel/shared/contracts/route';
import { Session } from '../../core/session';

export type RunBody = BodyOf<typeof keepRun>;

/** A run that is in this browser because the server does not have it yet. */
export interface WaitingRun {
  /** The run's own: the key it is kept under. */
  readonly id: string;
  readonly accountId: string;
  readonly householdId: string;
  readonly body: RunBody;
}

const store = 'runs';

/** Runs recorded and not yet stored, in this browser's IndexedDB: a lost network or a closed tab loses none. */
@Injectable({ providedIn: 'root' })
export class RunShelf {
  private readonly session = inject(Session);
  private database: Promise<IDBDatabase> | null = null;

  /** Keeps a run, over what was kept under its id. */
  async keep(body: RunBody): Promise<void> {
    const run: WaitingRun = { id: body.id, accountId: this.accountId(), householdId: this.session.householdId(), body };
    await this.ask('readwrite', (runs) => runs.put(run));
  }

  async drop(id: string): Promise<void> {
    await this.ask('readwrite', (runs) => runs.delete(id));
  }

  /** This person's runs of this household. */
  async waiting(): Promise<WaitingRun[]> {
    const all = await this.ask<WaitingRun[]>('readonly', (runs) => runs.getAll());
    return all.filter(
      ({ accountId, householdId }) => accountId === this.accountId() && householdId === this.session.householdId(),
    );
  }

  private accountId(): string {
    return this.session.account()?.id ?? '';
  }

  private async ask<T>(mode: IDBTransactionMode, use: (runs: IDBObjectStore) => IDBRequest<T>): Promise<T> {
    const database = await (this.database ??= opened());
    return answerOf(use(database.transaction(store, mode).objectStore(store)));
  }
}

function opened(): Promise<IDBDatabase> {
  const request = indexedDB.open('oriel-bench', 1);
  request.onupgradeneeded = () => request.result.createObjectStore(store, { keyPath: 'id' });
  return answerOf(request);
}

const answerOf = <T>(request: IDBRequest<T>): Promise<T> =>
  new Promise((resolve, reject) => {
    request.onsuccess = () => resolve(request.result);
    request.onerror = () => reject(request.error ?? new Error('The browser’s storage did not answer.'));
  });
