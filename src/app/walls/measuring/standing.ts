import { DestroyRef, Injectable, computed, inject, signal } from '@angular/core';
import type { Point3 } from '@oriel/shared/projection/types';
import { FaceTracking, type TrackingSetUp } from '../../tracking/face-tracking';
import { trackingWords } from '../../tracking/tracking-words';

const secondsToGetThere = 6;
const readingMs = 3000;
/** A third of what a slow camera gives in that time. */
const fewestReadings = 10;

type Phase = { readonly kind: 'idle' } | { readonly kind: 'starting' } | { readonly kind: 'counting'; readonly seconds: number } | { readonly kind: 'reading' } | { readonly kind: 'unseen' };

/** Someone stands at the marked spot: counts down while they walk there, then reads where the tracker sees their eye for three seconds. */
@Injectable()
export class Standing {
  private readonly tracking = inject(FaceTracking);
  private readonly phase = signal<Phase>({ kind: 'idle' });
  private gathered: Point3[] = [];
  private attempt = 0;

  readonly busy = computed(() => ['starting', 'counting', 'reading'].includes(this.phase().kind));
  readonly seconds = computed(() => {
    const phase = this.phase();
    return phase.kind === 'counting' ? phase.seconds : null;
  });
  readonly words = computed(() => {
    const phase = this.phase();
    const state = this.tracking.state();
    if (phase.kind === 'unseen') return 'You were not seen for long enough. Make the light better, or stand nearer the middle of what the camera sees.';
    if (phase.kind === 'reading') return 'Stand still and look at the glass…';
    if (phase.kind === 'counting') return `Stand on the mark: ${phase.seconds}. ${state === 'following' ? 'You are seen.' : 'Nobody is seen yet.'}`;
    return phase.kind === 'starting' ? trackingWords[state] : '';
  });

  constructor() {
    const unwatch = this.tracking.watch(({ found, eye }) => {
      if (found && this.phase().kind === 'reading') this.gathered.push({ ...eye });
    });
    inject(DestroyRef).onDestroy(() => {
      unwatch();
      this.stop();
    });
  }

  /** The readings, or null where it was stopped or nobody was seen. The camera is released whatever happens. */
  async read(setUp: TrackingSetUp): Promise<readonly Point3[] | null> {
    this.stop();
    const attempt = this.attempt;
    const gone = () => attempt !== this.attempt;
    this.gathered = [];
    this.phase.set({ kind: 'starting' });
    await this.tracking.start(setUp);
    while (!gone() && this.tracking.state() === 'starting') await pause(100);
    for (let seconds = secondsToGetThere; seconds > 0 && !gone(); seconds--) {
      if (!this.watching()) return null;
      this.phase.set({ kind: 'counting', seconds });
      await pause(1000);
    }
    if (gone() || !this.watching()) return null;
    this.phase.set({ kind: 'reading' });
    await pause(readingMs);
    if (gone()) return null;
    this.tracking.stop();
    this.phase.set({ kind: this.gathered.length < fewestReadings ? 'unseen' : 'idle' });
    return this.gathered.length < fewestReadings ? null : this.gathered;
  }

  stop(): void {
    this.attempt++;
    this.tracking.stop();
    this.phase.set({ kind: 'idle' });
  }

  /** Whether the camera was given and is looked through; why not is in the words. */
  private watching(): boolean {
    return ['nobody', 'following'].includes(this.tracking.state());
  }
}

const pause = (ms: number) => new Promise<void>((resolve) => setTimeout(resolve, ms));
