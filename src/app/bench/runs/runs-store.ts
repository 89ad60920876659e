import { Injectable, inject, signal } from '@angular/core';
import {
  type RunHeader,
  type RunSample,
  keepRun,
  listRuns,
  readRun,
  removeRun,
  renameRun,
} from '@oriel/shared/contracts/runs';
import { Api } from '../../core/api';
import { toApiFailure } from '../../core/api-failure';
import { Session } from '../../core/session';
import { RunShelf, type RunBody, type WaitingRun } from './run-shelf';

export interface WholeRun {
  readonly run: RunHeader;
  readonly samples: readonly RunSample[];
}

/** The household's runs on the server, and those that wait in this browser. */
@Injectable({ providedIn: 'root' })
export class RunsStore {
  private readonly api = inject(Api);
  private readonly session = inject(Session);
  private readonly shelf = inject(RunShelf);
  private readonly known = signal<readonly RunHeader[] | null>(null);
  private readonly kept = signal<readonly WaitingRun[]>([]);
  /** Null until they were asked for. */
  readonly runs = this.known.asReadonly();
  readonly waiting = this.kept.asReadonly();

  async load(): Promise<void> {
    await this.look();
    this.known.set((await this.api.call(listRuns, { params: this.here() })).runs);
  }

  /** Finds what waits in this browser; a browser that keeps nothing has nothing waiting. */
  async look(): Promise<void> {
    this.kept.set(await this.shelf.waiting().catch(() => []));
  }

  /** Puts a run on the shelf of this browser, where it stays until the server has it. Says whether the browser could keep it. */
  shelve(id: string, body: RunBody): Promise<boolean> {
    return this.shelf.keep(id, body).then(
      () => true,
      () => false,
    );
  }

  /** Sends a run to the server and takes it off the shelf. @throws ApiFailure; the run then still waits. */
  async keep(id: string, body: RunBody): Promise<RunHeader> {
    try {
      const { run } = await this.api.call(keepRun, { params: this.here(), body });
      await this.shelf.drop(id).catch(() => undefined);
      this.known.update((runs) => runs && [run, ...runs]);
      return run;
    } catch (error) {
      throw toApiFailure(error);
    } finally {
      await this.look();
    }
  }

  async discard(id: string): Promise<void> {
    await this.shelf.drop(id);
    await this.look();
  }

  read(runId: string): Promise<WholeRun> {
    return this.api.call(readRun, { params: { runId } });
  }

  async rename(runId: string, name: string): Promise<void> {
    const { run } = await this.api.call(renameRun, { params: { runId }, body: { name } });
    this.known.update((runs) => runs?.map((own) => (own.id === runId ? run : own)) ?? null);
  }

  async remove(runId: string): Promise<void> {
    await this.api.call(removeRun, { params: { runId } });
    this.known.update((runs) => runs?.filter(({ id }) => id !== runId) ?? null);
  }

  private here() {
    return { householdId: this.session.householdId() };
  }
}
