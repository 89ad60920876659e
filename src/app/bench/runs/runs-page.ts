import {
  ChangeDetectionStrategy,
  Component,
  DOCUMENT,
  DestroyRef,
  type OnInit,
  computed,
  inject,
  signal,
} from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { RouterLink } from '@angular/router';
import { type RunHeader, renameRun } from '@oriel/shared/contracts/runs';
import { FailureNotice } from '../../core/failure-notice';
import { sayMoment } from '../../core/moments';
import { Submission } from '../../core/submission';
import { TextField } from '../../core/text-field';
import { accordingTo } from '../../core/zod-validator';
import { BenchSubject } from '../subject/bench-subject';
import { clockWords } from './clock-words';
import { MachineWords } from './machine-words';
import { csvOf, download, fileNameOf, jsonOf } from './run-files';
import type { WaitingRun } from './run-shelf';
import { RunsStore } from './runs-store';

/** The household's runs: stored, renamed, exported, compared two by two, deleted; and those that still wait in this browser. */
@Component({
  selector: 'oriel-runs-page',
  imports: [ReactiveFormsModule, RouterLink, MatButton, MatCheckbox, TextField, FailureNotice, MachineWords],
  templateUrl: './runs-page.html',
  styleUrl: './runs-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RunsPage implements OnInit {
  private readonly bench = inject(BenchSubject);
  private readonly document = inject(DOCUMENT);
  protected readonly runs = inject(RunsStore);
  protected readonly loading = new Submission();
  protected readonly change = new Submission();
  protected readonly storing = new Submission();
  protected readonly name = new FormControl('', {
    nonNullable: true,
    validators: accordingTo(renameRun.body.shape.name),
  });
  protected readonly form = new FormGroup({ name: this.name });
  protected readonly naming = new Submission(this.form);
  /** The run whose name is being typed, and the one whose deletion waits for a second press. */
  protected readonly renaming = signal<string | null>(null);
  protected readonly asked = signal<string | null>(null);
  /** The run whose export or deletion did not succeed. */
  protected readonly troubled = signal<string | null>(null);
  /** At most two, the one picked first first. */
  protected readonly picked = signal<readonly string[]>([]);
  protected readonly pair = computed(() =>
    this.picked().length === 2 ? { a: this.picked()[0], b: this.picked()[1] } : null,
  );

  constructor() {
    const window = this.document.defaultView!;
    const back = () => void this.storeWaiting();
    window.addEventListener('online', back);
    inject(DestroyRef).onDestroy(() => window.removeEventListener('online', back));
  }

  protected readonly say = (moment: string) => sayMoment(new Date(moment));
  protected readonly clock = clockWords;

  ngOnInit(): void {
    void this.load();
  }

  protected load(): Promise<void> {
    return this.loading.run(() => this.runs.load());
  }

  protected where({ wallId }: RunHeader): string {
    if (wallId === null) return 'this screen’s set-up';
    return this.bench.walls().find(({ id }) => id === wallId)?.setUp.name ?? 'a wall that was removed';
  }

  protected pick(runId: string, chosen: boolean): void {
    this.picked.update((picked) => (chosen ? [...picked, runId].slice(-2) : picked.filter((id) => id !== runId)));
  }

  protected startRenaming({ id, name }: RunHeader): void {
    this.naming.failure.set(null);
    this.name.setValue(name);
    this.renaming.set(id);
  }

  protected stopRenaming(): void {
    this.naming.failure.set(null);
    this.renaming.set(null);
  }

  protected rename(runId: string): Promise<void> {
    return this.naming.run(async () => {
      await this.runs.rename(runId, this.name.value);
      this.renaming.set(null);
    });
  }

  protected ask(runId: string): void {
    this.change.failure.set(null);
    this.asked.set(runId);
  }

  protected keep(): void {
    this.change.failure.set(null);
    this.asked.set(null);
  }

  protected remove(runId: string): Promise<void> {
    return this.changing(runId, async () => {
      await this.runs.remove(runId);
      this.asked.set(null);
      this.pick(runId, false);
    });
  }

  protected export({ id, name }: RunHeader, as: 'csv' | 'json'): Promise<void> {
    return this.changing(id, async () => {
      const whole = await this.runs.read(id);
      const text = as === 'csv' ? csvOf(whole) : jsonOf(whole);
      download(this.document, fileNameOf(name, as), text, as === 'csv' ? 'text/csv;charset=utf-8' : 'application/json');
    });
  }

  private changing(runId: string, change: () => Promise<void>): Promise<void> {
    if (this.change.busy()) return Promise.resolve();
    this.troubled.set(runId);
    return this.change.run(change);
  }

  protected storeWaiting(): Promise<void> {
    return this.storing.run(async () => {
      const answers = await Promise.allSettled(this.runs.waiting().map(({ id, body }) => this.runs.keep({ ...body, id })));
      const refused = answers.find((answer) => answer.status === 'rejected');
      if (refused) throw refused.reason;
    });
  }

  protected discard({ id }: WaitingRun): Promise<void> {
    return this.storing.run(async () => {
      await this.runs.discard(id);
      this.asked.set(null);
    });
  }
}
