import {
  ChangeDetectionStrategy,
  Component,
  DOCUMENT,
  DestroyRef,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { keepRun } from '@oriel/shared/contracts/runs';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { TextField } from '../../core/text-field';
import { accordingTo } from '../../core/zod-validator';
import { BenchSubject } from '../subject/bench-subject';
import { clockWords } from './clock-words';
import { machineWords } from './machine';
import { RunRecorder } from './run-recorder';
import type { RunBody } from './run-shelf';
import { RunsStore } from './runs-store';

/** While it is recorded, a run is put on this browser's shelf this often. */
const SHELVED_EVERY_MS = 15_000;
const LEAST_SAMPLES = 2;

/** Records a run, names it and stores it; until it is stored it stays in this browser. */
@Component({
  selector: 'oriel-record-run',
  imports: [ReactiveFormsModule, RouterLink, MatButton, TextField, FailureNotice],
  templateUrl: './record-run.html',
  styleUrl: './record-run.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RecordRun {
  /** Whether there is anything to record. */
  readonly ready = input(false);

  private readonly bench = inject(BenchSubject);
  private readonly runs = inject(RunsStore);
  private readonly window = inject(DOCUMENT).defaultView!;
  protected readonly recorder = inject(RunRecorder);
  protected readonly name = new FormControl('', {
    nonNullable: true,
    validators: accordingTo(keepRun.body.shape.name),
  });
  protected readonly form = new FormGroup({ name: this.name });
  protected readonly storing = new Submission(this.form);
  /** The run recorded last, while it is not stored. */
  protected readonly recorded = signal<RunBody | null>(null);
  protected readonly storedId = signal<string | null>(null);
  protected readonly shelved = signal(true);
  protected readonly remaining = computed(() => clockWords(this.recorder.remainingMs()));
  private id = '';

  constructor() {
    const shelving = setInterval(() => void this.shelve(), SHELVED_EVERY_MS);
    effect(() => {
      if (this.recorder.recording() && this.recorder.full()) untracked(() => void this.stop());
    });
    inject(DestroyRef).onDestroy(() => {
      clearInterval(shelving);
      if (this.recorder.recording()) void this.stop();
    });
  }

  protected start(): void {
    this.id = crypto.randomUUID();
    this.storedId.set(null);
    this.storing.failure.set(null);
    this.name.setValue(
      `${this.bench.subject().name}, ${new Date().toLocaleString('en-GB', { dateStyle: 'medium', timeStyle: 'short' })}`,
    );
    this.recorder.start();
  }

  protected async stop(): Promise<void> {
    const body = this.bodyOf(this.recorder.stop());
    if (body.samples.length < LEAST_SAMPLES) return;
    this.recorded.set(body);
    this.shelved.set(await this.runs.shelve(this.id, body));
  }

  protected store(): Promise<void> {
    return this.storing.run(async () => {
      const body = this.recorded();
      if (!body) return;
      const { id } = await this.runs.keep(this.id, { ...body, name: this.name.value });
      this.recorded.set(null);
      this.storedId.set(id);
    });
  }

  protected async discard(): Promise<void> {
    this.recorded.set(null);
    this.storing.failure.set(null);
    await this.runs.discard(this.id);
  }

  private async shelve(): Promise<void> {
    if (!this.recorder.recording()) return;
    const body = this.bodyOf(this.recorder.soFar());
    if (body.samples.length >= LEAST_SAMPLES) await this.runs.shelve(this.id, body);
  }

  private bodyOf(recording: ReturnType<RunRecorder['soFar']>): RunBody {
    const { wallId, tuning } = this.bench.subject();
    return {
      name: this.name.value,
      wallId,
      machine: machineWords(this.window.navigator, this.window.screen),
      tuning,
      ...recording,
    };
  }
}
