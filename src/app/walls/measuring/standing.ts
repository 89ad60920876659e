import { DestroyRef, Injectable, computed, inject, signal } from '@angular/core';
import type { Point3 } from '@oriel/shared/projection/types';
import { FaceTracking, type TrackingSetUp } from '../../tracking/face-tracking';
import { trackingWords } from '../../tracking/tracking-words';

const secondsToGetThere = 6;
const readingMs = 3000;
/** Whoever steps aside for a moment may come back. */
const longestReadingMs = 15_000;
/** A third of what a slow camera gives in three seconds. */
const fewestReadings = 10;

type Phase =
  | { readonly kind: 'idle' | 'starting' }
  | { readonly kind: 'counting'; readonly seconds: number }
  | { readonly kind: 'reading' | 'done' | 'unseen'; readonly readings: number }
  | { readonly kind: 'without'; readonly why: string };

/** Someone stands at the marked spot: counts down while they walk there, then reads for three seconds where the tracker sees their eye. */
@Injectable()
export class Standing {
  private readonly tracking = inject(FaceTracking);
  private readonly phase = signal<Phase>({ kind: 'idle' });
  private gathered: Point3[] = [];
  /** When the first reading came. */
  private sinceMs: number | null = null;
  private attempt = 0;

  readonly busy = computed(() => ['starting', 'counting', 'reading'].includes(this.phase().kind));
  /** The camera's picture while somebody walks to the spot and stands there. */
  readonly picture = computed(() => (this.busy() ? this.tracking.picture() : null));
  readonly seen = computed(() => this.tracking.state() === 'following');
  readonly seconds = computed(() => {
    const phase = this.phase();
    return phase.kind === 'counting' ? phase.seconds : null;
  });
  /** How many readings there are so far; null while none are taken. */
  readonly readings = computed(() => {
    const phase = this.phase();
    return phase.kind === 'reading' ? phase.readings : null;
  });
  /** How much of the reading is done, 0 to 1. */
  readonly share = signal(0);
  readonly words = computed(() => {
    const phase = this.phase();
    switch (phase.kind) {
      case 'idle':
        return '';
      case 'starting':
        return trackingWords[this.tracking.state()];
      case 'without':
        return phase.why;
      case 'counting':
        return this.seen() ? 'You are seen. Stand on the mark and look at the glass.' : 'Nobody is seen yet. Stand on the mark and look at the glass.';
      case 'reading':
        return this.seen() ? 'You are seen. Stand still and look at the glass.' : 'Nobody is seen. Face the glass, and step nearer the middle of the picture.';
      case 'done':
        return `Done, ${phase.readings} readings. You may move.`;
      case 'unseen':
        return `${phase.readings === 0 ? 'No face was found' : `A face was found in ${phase.readings} frames only, ${fewestReadings} are needed`}. Let light fall on your face, none from behind; take off a cap; stand where the camera sees you, between the dashed lines of the drawing. Then start again.`;
    }
  });

  constructor() {
    const unwatch = this.tracking.watch(({ found, eye }) => {
      if (!found || this.phase().kind !== 'reading') return;
      this.gathered.push({ ...eye });
      this.sinceMs ??= performance.now();
      this.share.set(Math.min(1, (performance.now() - this.sinceMs) / readingMs));
      this.phase.set({ kind: 'reading', readings: this.gathered.length });
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
    this.sinceMs = null;
    this.share.set(0);
    this.phase.set({ kind: 'starting' });
    await this.tracking.start(setUp);
    while (!gone() && this.tracking.state() === 'starting') await pause(100);
    for (let seconds = secondsToGetThere; seconds > 0 && !gone(); seconds--) {
      if (!this.watching()) return this.goWithout();
      this.phase.set({ kind: 'counting', seconds });
      await pause(1000);
    }
    if (gone()) return null;
    this.phase.set({ kind: 'reading', readings: 0 });
    for (let waitedMs = 0; waitedMs < longestReadingMs && this.share() < 1 && !gone(); waitedMs += 100) {
      if (!this.watching()) return this.goWithout();
      await pause(100);
    }
    if (gone()) return null;
    this.tracking.stop();
    const enough = this.gathered.length >= fewestReadings;
    this.phase.set({ kind: enough ? 'done' : 'unseen', readings: this.gathered.length });
    return enough ? this.gathered : null;
  }

  stop(): void {
    this.attempt++;
    this.tracking.stop();
    this.phase.set({ kind: 'idle' });
  }

  private goWithout(): null {
    const why = trackingWords[this.tracking.state()];
    this.stop();
    this.phase.set({ kind: 'without', why });
    return null;
  }

  /** Whether the camera was given and is looked through. */
  private watching(): boolean {
    return ['nobody', 'following'].includes(this.tracking.state());
  }
}

const pause = (ms: number) => new Promise<void>((resolve) => setTimeout(resolve, ms));
