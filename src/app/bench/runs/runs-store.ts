import { Injectable, computed, inject, signal } from '@angular/core';
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
  /** What the server has does not wait, whatever this browser still keeps of it. */
  readonly waiting = computed(() => this.kept().filter((run) => !this.isStored(run)));

  async load(): Promise<void> {
    await this.look();
    this.known.set((await this.api.call(listRuns, { params: this.here() })).runs);
    // Sent, but the answer was lost on its way.
    for (const run of this.kept()) if (this.isStored(run)) await this.shelf.drop(run.id).catch(() => undefined);
  }

  /** Finds what waits in this browser; a browser that keeps nothing has nothing waiting. */
  async look(): Promise<void> {
    this.kept.set(await this.shelf.waiting().catch(() => []));
  }

  /** Puts a run on the shelf of this browser, where it stays until the server has it. Says whether the browser could keep it. */
  shelve(body: RunBody): Promise<boolean> {
    return this.shelf.keep(body).then(
      () => true,
      () => false,
    );
  }

  /** Sends a run to the server and takes it off the shelf. @throws ApiFailure; the run then still waits. */
  async keep(body: RunBody): Promise<RunHeader> {
    try {
      const run = await this.send(body);
      await this.shelf.drop(body.id).catch(() => undefined);
      this.known.update((runs) => runs && [run, ...runs.filter(({ id }) => id !== run.id)]);
      return run;
    } catch (error) {
      throw toApiFailure(error);
    } finally {
      await this.look();
    }
  }

  /** A run whose wall was removed meanwhile is kept without it. */
  private async send(body: RunBody): Promise<RunHeader> {
    try {
      return (await this.api.call(keepRun, { params: this.here(), body })).run;
    } catch (error) {
      if (body.wallId === null || toApiFailure(error).failure.code !== 'wall-not-here') throw error;
      return this.send({ ...body, wallId: null });
    }
  }

  async discard(id: string): Promise<void> {
    await this.shelf.drop(id);
    await this.look();
  }

  read(runId: string): Promise<WholeRun> {
    return this.api.call(readRun, { params: { runId } });
  }

  /** Over the name it has here. @throws ApiFailure `renamed-meanwhile`: it then has the newer name here, and the next time goes over that. */
  async rename(runId: string, name: string): Promise<void> {
    const was = this.known()?.find(({ id }) => id === runId)?.name ?? '';
    try {
      const { run } = await this.api.call(renameRun, { params: { runId }, body: { name, was } });
      this.renamed(runId, run.name);
    } catch (error) {
      const { failure } = toApiFailure(error);
      if (failure.code === 'renamed-meanwhile') this.renamed(runId, String(failure.detail?.['name']));
      throw error;
    }
  }

  /** One that somebody else deleted meanwhile is gone all the same. */
  async remove(runId: string): Promise<void> {
    try {
      await this.api.call(removeRun, { params: { runId } });
    } catch (error) {
      if (toApiFailure(error).status !== 404) throw error;
    }
    this.known.update((runs) => runs?.filter(({ id }) => id !== runId) ?? null);
  }

  /** One that was recorded further since it was sent is not. */
  private isStored({ id, body }: WaitingRun): boolean {
    return this.known()?.some((run) => run.id === id && run.sampleCount >= body.samples.length) ?? false;
  }

  private renamed(runId: string, name: string): void {
    this.known.update((runs) => runs?.map((own) => (own.id === runId ? { ...own, name } : own)) ?? null);
  }

  private here() {
    return { householdId: this.session.householdId() };
  }
}
