import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  signal,
  untracked,
} from '@angular/core';
import { MatButtonToggle, MatButtonToggleGroup } from '@angular/material/button-toggle';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatProgressBar } from '@angular/material/progress-bar';
import { MatOption, MatSelect } from '@angular/material/select';
import { RouterLink } from '@angular/router';
import type { TrackerTuning } from '@oriel/shared/contracts/wall-set-up';
import { type Wish, wishes } from '@oriel/shared/replay/wishes';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import type { WholeRun } from '../runs/runs-store';
import { RunsStore } from '../runs/runs-store';
import { BenchSubject } from '../subject/bench-subject';
import type { FromReplay, SearchAsked } from './replay-messages';
import { REPLAY_WORKER } from './replay-worker';
import { PutOnWall } from '../tuning/put-on-wall';
import { captureKnown } from '@oriel/shared/replay/capture-time';
import { TradeOff } from './trade-off';

/** A run through other settings: what they cost and bring, and the wished one onto a wall by one press. */
@Component({
  selector: 'oriel-replay-page',
  imports: [
    RouterLink,
    MatButtonToggle,
    MatButtonToggleGroup,
    MatFormField,
    MatLabel,
    MatSelect,
    MatOption,
    MatProgressBar,
    FailureNotice,
    PutOnWall,
    TradeOff,
  ],
  templateUrl: './replay-page.html',
  styleUrl: './replay-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReplayPage {
  /** From the address. */
  readonly runId = input.required<string>();

  private readonly runs = inject(RunsStore);
  private readonly makeWorker = inject(REPLAY_WORKER);
  protected readonly bench = inject(BenchSubject);
  protected readonly loading = new Submission();
  protected readonly wishes = wishes;
  protected readonly wish = signal<Wish>('balanced');
  protected readonly whole = signal<WholeRun | null>(null);
  protected readonly answer = signal<FromReplay | null>(null);
  protected readonly share = computed(() => {
    const answer = this.answer();
    return answer?.type === 'progress' ? answer.share : 0;
  });
  protected readonly done = computed(() => {
    const answer = this.answer();
    return answer?.type === 'done' ? answer : null;
  });
  /** The wall to change: the one chosen here as long as it is there, else the run's own, else the one on the bench. */
  protected readonly wallId = linkedSignal<string | null, string | null>({
    source: () => {
      const own = this.whole()?.run.wallId;
      return this.bench.walls().find(({ id }) => id === own)?.id ?? this.bench.wall()?.id ?? null;
    },
    computation: (usual, before) => this.bench.walls().find(({ id }) => id === before?.value)?.id ?? usual,
  });
  protected readonly wall = computed(() => this.bench.walls().find(({ id }) => id === this.wallId()) ?? null);
  /** Whose setting is today's: the wall's, or that of the recording where no wall is chosen. */
  protected readonly todayOf = signal('');
  protected readonly captureUnknown = computed(() => this.whole()?.samples.every((sample) => !captureKnown(sample)) ?? false);
  protected readonly putWords = computed(() => {
    const wall = this.wall();
    return wall ? `Put ${this.wish()} on ${wall.setUp.name}` : 'Choose a wall to put it on';
  });
  /** A wall's tuning with only what was searched changed. */
  protected readonly wished = computed(() => {
    const [both, wish] = [this.done(), this.wish()];
    return (tuning: TrackerTuning): TrackerTuning => (both ? wishedOver(tuning, both, wish) : tuning);
  });
  private worker: Worker | null = null;

  constructor() {
    effect(() => {
      if (this.runId()) untracked(() => void this.load());
    });
    effect(() => {
      const [whole, wallId] = [this.whole(), this.wallId()];
      if (whole) untracked(() => this.search(whole, wallId));
    });
    inject(DestroyRef).onDestroy(() => this.worker?.terminate());
  }

  protected load(): Promise<void> {
    return this.loading.run(async () => this.whole.set(await this.runs.read(this.runId())));
  }

  private search({ run, samples }: WholeRun, wallId: string | null): void {
    this.worker?.terminate();
    const wall = this.bench.walls().find(({ id }) => id === wallId);
    this.todayOf.set(wall ? wall.setUp.name : 'the recording');
    this.answer.set({ type: 'progress', share: 0 });
    const worker = (this.worker = this.makeWorker());
    worker.onmessage = ({ data }: MessageEvent<FromReplay>) => {
      this.answer.set(data);
      if (data.type !== 'progress') worker.terminate();
    };
    worker.onerror = () => this.answer.set({ type: 'failed' });
    const asked: SearchAsked = { samples, today: wall?.setUp.tuning ?? run.tuning };
    worker.postMessage(asked);
  }
}

function wishedOver(tuning: TrackerTuning, { across, along }: FromReplay & { type: 'done' }, wish: Wish): TrackerTuning {
  const changed = { ...tuning, filter: { ...tuning.filter } };
  if ('found' in across) {
    const { tuning: best } = across.found.best[wish];
    changed.filter.across = best.filter.across;
    changed.longestHorizonMs = best.longestHorizonMs;
  }
  if ('found' in along) changed.filter.along = along.found.best[wish].tuning.filter.along;
  return changed;
}
