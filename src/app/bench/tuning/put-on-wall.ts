import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { TrackerTuning } from '@oriel/shared/contracts/wall-set-up';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { type Applied, BenchSubject } from '../subject/bench-subject';
import { tuningDifferences, type TuningDifference } from './tuning-words';

interface Change {
  readonly name: string;
  readonly before: TrackerTuning;
  readonly after: TrackerTuning;
}

type Outcome =
  | { readonly kind: 'done'; readonly change: Change; readonly differences: readonly TuningDifference[] }
  | { readonly kind: 'back'; readonly change: Change }
  | { readonly kind: 'moved'; readonly name: string; readonly by: string };

/** One press puts a setting on a wall; then it says what changed, and one more press goes back. */
@Component({
  selector: 'oriel-put-on-wall',
  imports: [MatButton, FailureNotice],
  template: `
    <button matButton="filled" type="button" [disabled]="saving.busy() || !wallId()" (click)="put()">{{ words() }}</button>
    <div role="status">
      @if (done(); as now) {
        @if (now.differences.length) {
          <p><strong>{{ now.change.name }} follows with this from now on.</strong> What changed:</p>
          <ul class="figures">
            @for (one of now.differences; track one.name) {
              <li>{{ one.name }}: {{ one.before }} → {{ one.after }}</li>
            }
          </ul>
        } @else {
          <p>{{ now.change.name }} follows with this already: nothing changed.</p>
        }
      }
      @if (back(); as now) {
        <p>{{ now.change.name }} follows as it did before.</p>
      }
      @if (moved(); as now) {
        <p>{{ now.by }} changed {{ now.name }} meanwhile. Their changes stay; nothing of yours is written yet. Press again to put only this over the newest.</p>
      }
    </div>
    @if (before().length) {
      @if (!done()) {
        <p>Before the bench last changed it, {{ wall()!.setUp.name }} followed otherwise:</p>
        <ul class="figures">
          @for (one of before(); track one.name) {
            <li>{{ one.name }}: {{ one.before }}, now {{ one.after }}</li>
          }
        </ul>
      }
      <button matButton="outlined" type="button" [disabled]="saving.busy()" (click)="goBack()">Go back to what it was</button>
    }
    <oriel-failure-notice [failure]="saving.failure()" />
  `,
  styles: `
    :host { display: grid; gap: 8px; justify-items: start; }
    p { margin: 0; }
    ul { margin: 4px 0 0; padding-left: 20px; }
    oriel-failure-notice { width: 100%; }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PutOnWall {
  readonly wallId = input.required<string | null>();
  /** On the button. */
  readonly words = input.required<string>();
  readonly change = input.required<(tuning: TrackerTuning) => TrackerTuning>();

  private readonly bench = inject(BenchSubject);
  protected readonly saving = new Submission();
  private readonly outcome = signal<Outcome | null>(null);
  protected readonly done = computed(() => ofKind(this.outcome(), 'done'));
  protected readonly back = computed(() => ofKind(this.outcome(), 'back'));
  protected readonly moved = computed(() => ofKind(this.outcome(), 'moved'));
  protected readonly wall = computed(() => this.bench.walls().find(({ id }) => id === this.wallId()) ?? null);
  /** What differs from how the wall followed before; the wall itself keeps that, so the way back is there on any later visit. */
  protected readonly before = computed(() => {
    const setUp = this.wall()?.setUp;
    return setUp?.followingBefore ? tuningDifferences({ ...setUp.tuning, ...setUp.followingBefore }, setUp.tuning) : [];
  });

  protected put(): Promise<void> {
    return this.save((wallId) => this.bench.apply(wallId, this.change()), (change) => ({
      kind: 'done',
      change,
      differences: tuningDifferences(change.before, change.after),
    }));
  }

  protected goBack(): Promise<void> {
    return this.save((wallId) => this.bench.goBack(wallId), (change) => ({ kind: 'back', change }));
  }

  private save(ask: (wallId: string) => Promise<Applied>, outcome: (change: Change) => Outcome): Promise<void> {
    return this.saving.run(async () => {
      const wallId = this.wallId();
      if (!wallId) return;
      const applied = await ask(wallId);
      const name = this.bench.walls().find(({ id }) => id === wallId)?.setUp.name ?? '';
      this.outcome.set(applied.kind === 'saved' ? outcome({ name, ...applied }) : { kind: 'moved', name, by: applied.by });
    });
  }
}

const ofKind = <K extends Outcome['kind']>(outcome: Outcome | null, kind: K) =>
  outcome?.kind === kind ? (outcome as Extract<Outcome, { kind: K }>) : null;
