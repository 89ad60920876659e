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
import { keepRun, type RunSample } from '@oriel/shared/contracts/runs';
import { canBeReplayed, NOTHING_SHOWN, showsAll, whatItShows, type RunShows } from '@oriel/shared/replay/what-it-shows';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { TextField } from '../../core/text-field';
import { accordingTo } from '../../core/zod-validator';
import { BenchSubject } from '../subject/bench-subject';
import { clockWords } from './clock-words';
import { machineWords } from './machine';
import { RunRecorder } from './run-recorder';
import type { RunBody } from './run-shelf';
import { RunShowsList } from './run-shows';
import { adviceWords, parts, verdictWords } from './run-shows-words';
import { RunsStore } from './runs-store';

/** While it is recorded, a run is put on this browser's shelf this often. */
const SHELVED_EVERY_MS = 15_000;
const LEAST_SAMPLES = 2;
/** While it is recorded it is told this often how much there is to judge by, and only until there is enough: judging costs what is measured. */
const JUDGED_EVERY_MS = 1000;
/** No more than this is looked at for it. */
const JUDGED_LATELY_MS = 120_000;

/** Records a run, names it and stores it; until it is stored it stays in this browser. */
@Component({
  selector: 'oriel-record-run',
  imports: [ReactiveFormsModule, RouterLink, MatButton, TextField, FailureNotice, RunShowsList],
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
  protected readonly replayable = signal(false);
  protected readonly shelved = signal(true);
  /** Whether a recording was stopped that holds nothing. */
  protected readonly tooFew = signal(false);
  /** Whether discarding waits for a second press. */
  protected readonly asked = signal(false);
  protected readonly remaining = computed(() => clockWords(this.recorder.remainingMs()));
  protected readonly shows = signal<RunShows>(NOTHING_SHOWN);
  protected readonly verdict = computed(() => verdictWords(this.shows()));
  protected readonly advice = computed(() => adviceWords(this.shows()));
  protected readonly mayGoOn = computed(
    () => this.recorded()?.wallId === this.bench.subject().wallId && !this.recorder.full(),
  );
  protected readonly waitsForNetwork = computed(() => this.shelved() && this.storing.failure()?.offline === true);
  protected readonly parts = parts;
  private id = '';
  /** What stood on the bench when recording began. */
  private subject = this.bench.subject();

  constructor() {
    const shelving = setInterval(() => void this.shelve(), SHELVED_EVERY_MS);
    const judging = setInterval(() => this.judge(), JUDGED_EVERY_MS);
    const back = () => this.waitsForNetwork() && void this.store();
    this.window.addEventListener('online', back);
    effect(() => {
      if (this.recorder.recording() && (this.recorder.full() || this.bench.subject().wallId !== this.subject.wallId))
        untracked(() => void this.stop());
    });
    inject(DestroyRef).onDestroy(() => {
      clearInterval(shelving);
      clearInterval(judging);
      this.window.removeEventListener('online', back);
      if (this.recorder.recording()) void this.stop();
    });
  }

  protected start(): void {
    this.id = crypto.randomUUID();
    this.subject = this.bench.subject();
    this.storedId.set(null);
    this.tooFew.set(false);
    this.storing.failure.set(null);
    this.shows.set(NOTHING_SHOWN);
    this.name.setValue(
      `${this.subject.name}, ${new Date().toLocaleString('en-GB', { dateStyle: 'medium', timeStyle: 'short' })}`,
    );
    this.recorder.start();
  }

  /** Records on in the same run, where the same stands on the bench; what there is stays on the shelf meanwhile. */
  protected goOn(): void {
    this.recorded.set(null);
    this.asked.set(false);
    this.recorder.goOn();
  }

  protected async stop(): Promise<void> {
    const body = this.bodyOf(this.recorder.stop());
    this.tooFew.set(body.samples.length < LEAST_SAMPLES);
    if (this.tooFew()) return;
    this.shows.set(whatItShows(body.samples));
    this.recorded.set(body);
    this.shelved.set(await this.runs.shelve(body));
  }

  protected store(): Promise<void> {
    return this.storing.run(async () => {
      const recorded = this.recorded();
      if (!recorded) return;
      const body = { ...recorded, name: this.name.value };
      // Under the name just typed, in case the server is not reached.
      await this.runs.shelve(body);
      const { id } = await this.runs.keep(body);
      this.recorded.set(null);
      this.replayable.set(canBeReplayed(this.shows()));
      this.storedId.set(id);
    });
  }

  protected async discard(): Promise<void> {
    this.recorded.set(null);
    this.asked.set(false);
    this.storing.failure.set(null);
    await this.runs.discard(this.id);
  }

  private judge(): void {
    if (!this.recorder.recording() || showsAll(this.shows())) return;
    this.shows.set(mostOf(this.shows(), this.recorder.lately(JUDGED_LATELY_MS)));
  }

  private async shelve(): Promise<void> {
    if (!this.recorder.recording()) return;
    const body = this.bodyOf(this.recorder.soFar());
    if (body.samples.length >= LEAST_SAMPLES) await this.runs.shelve(body);
  }

  private bodyOf(recording: ReturnType<RunRecorder['soFar']>): RunBody {
    const { wallId, tuning } = this.subject;
    return {
      id: this.id,
      name: this.name.value,
      wallId,
      machine: machineWords(this.window.navigator, this.window.screen),
      tuning,
      ...recording,
    };
  }
}

/** What was shown before does not go when it is too long ago to be looked at again. */
function mostOf(before: RunShows, samples: readonly RunSample[]): RunShows {
  const now = whatItShows(samples);
  return {
    stillMs: Math.max(before.stillMs, now.stillMs),
    acrossMs: Math.max(before.acrossMs, now.acrossMs),
    alongMs: Math.max(before.alongMs, now.alongMs),
  };
}
