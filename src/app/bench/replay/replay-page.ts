import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { MatButtonToggle, MatButtonToggleGroup } from '@angular/material/button-toggle';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatProgressBar } from '@angular/material/progress-bar';
import { MatOption, MatSelect } from '@angular/material/select';
import { Router, RouterLink } from '@angular/router';
import type { TrackerTuning } from '@oriel/shared/contracts/wall-set-up';
import { type Wish, wishes } from '@oriel/shared/replay/wishes';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import type { WholeRun } from '../runs/runs-store';
import { RunsStore } from '../runs/runs-store';
import { BenchSubject } from '../subject/bench-subject';
import type { FromReplay, ReplayAsked, TriedBoth } from './replay-messages';
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
  /** From the address, so that a reload forgets none of them: the run, what is wished, and the wall chosen here. */
  readonly runId = input.required<string>();
  readonly wish = input('balanced', { transform: (text: string | undefined): Wish => wishes.find((one) => one === text) ?? 'balanced' });
  readonly wall = input<string>();

  private readonly router = inject(Router);
  private readonly runs = inject(RunsStore);
  private readonly makeWorker = inject(REPLAY_WORKER);
  protected readonly bench = inject(BenchSubject);
  protected readonly loading = new Submission();
  protected readonly wishes = wishes;
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
  protected readonly onto = computed(() => {
    const of = (wallId: string | null | undefined) => this.bench.walls().find(({ id }) => id === wallId);
    return of(this.wall()) ?? of(this.whole()?.run.wallId) ?? this.bench.wall();
  });
  protected readonly wallId = computed(() => this.onto()?.id ?? null);
  private readonly tuning = computed(() => this.onto()?.setUp.tuning ?? this.whole()?.run.tuning ?? null);
  /** Today's setting where the wall was changed since the search. */
  protected readonly now = signal<TriedBoth | null>(null);
  /** Whose setting is today's: the wall's, or that of the recording where no wall is chosen. */
  protected readonly todayOf = signal('');
  protected readonly captureUnknown = computed(() => this.whole()?.samples.every((sample) => !captureKnown(sample)) ?? false);
  protected readonly putWords = computed(() => {
    const wall = this.onto();
    return wall ? `Put ${this.wish()} on ${wall.setUp.name}` : 'Choose a wall to put it on';
  });
  /** A wall's tuning with only what was searched changed. */
  protected readonly wished = computed(() => {
    const [both, wish] = [this.done(), this.wish()];
    return (tuning: TrackerTuning): TrackerTuning => (both ? wishedOver(tuning, both, wish) : tuning);
  });
  private worker: Worker | null = null;
  private searched: TrackerTuning | null = null;

  constructor() {
    effect(() => {
      if (this.runId()) untracked(() => void this.load());
    });
    effect(() => {
      const whole = this.whole();
      // Another wall has other settings of today.
      this.wallId();
      if (whole) untracked(() => this.search(whole));
    });
    effect(() => {
      const [whole, tuning] = [this.whole(), this.tuning()];
      if (whole && tuning) untracked(() => this.followToday(whole, tuning));
    });
    inject(DestroyRef).onDestroy(() => this.worker?.terminate());
  }

  protected load(): Promise<void> {
    return this.loading.run(async () => this.whole.set(await this.runs.read(this.runId())));
  }

  /** Changes what the address says of this page. */
  protected choose(chosen: { readonly wish: Wish } | { readonly wall: string }): void {
    void this.router.navigate([], { queryParams: chosen, queryParamsHandling: 'merge', replaceUrl: true });
  }

  private search({ run, samples }: WholeRun): void {
    const wall = this.onto();
    this.todayOf.set(wall ? wall.setUp.name : 'the recording');
    this.now.set(null);
    this.answer.set({ type: 'progress', share: 0 });
    this.searched = wall?.setUp.tuning ?? run.tuning;
    this.ask({ what: 'search', samples, today: this.searched }, (answer) => this.answer.set(answer));
  }

  /** A wall changed after the search, as by putting a setting on it, is judged anew; the search stands. */
  private followToday({ samples }: WholeRun, today: TrackerTuning): void {
    if (today === this.searched || !this.done()) return;
    this.ask({ what: 'today', samples, today }, (answer) => {
      if (answer.type === 'today') this.now.set(answer.tried);
    });
  }

  private ask(asked: ReplayAsked, hear: (answer: FromReplay) => void): void {
    this.worker?.terminate();
    const worker = (this.worker = this.makeWorker());
    worker.onmessage = ({ data }: MessageEvent<FromReplay>) => {
      hear(data);
      if (data.type !== 'progress') worker.terminate();
    };
    worker.onerror = () => hear({ type: 'failed' });
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
