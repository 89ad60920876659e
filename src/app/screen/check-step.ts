import { ChangeDetectionStrategy, Component, DestroyRef, computed, effect, inject, model, signal, untracked } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import type { Point3 } from '@oriel/shared/projection/types';
import { plainMm } from '../figures/words';
import { FaceTracking } from '../tracking/face-tracking';
import { trackingWords } from '../tracking/tracking-words';
import { CameraDrawing } from './camera-drawing';
import type { ScreenSetUp } from './screen-set-up';
import { trackingSetUp } from './tracking-set-up';

const words = { ...trackingWords, following: 'Following you. Move your head to the left: in the plan the dot should move left.' };

/** The third step: the eye as this set-up sees it, live, and what to beware of. */
@Component({
  selector: 'oriel-check-step',
  imports: [MatButton, MatCheckbox, CameraDrawing],
  providers: [FaceTracking],
  templateUrl: './check-step.html',
  styleUrl: './check-step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CheckStep {
  readonly setUp = model.required<ScreenSetUp>();

  private readonly tracking = inject(FaceTracking);
  private readonly seen = signal<Point3 | null>(null);
  protected readonly mm = (figure: number) => plainMm(figure, 0);
  protected readonly words = computed(() => words[this.tracking.state()]);
  protected readonly running = computed(() => ['asking', 'starting', 'nobody', 'following'].includes(this.tracking.state()));
  protected readonly eye = computed(() => (this.tracking.state() === 'following' ? this.seen() : null));

  constructor() {
    inject(DestroyRef).onDestroy(this.tracking.watch(({ found, eye }) => this.seen.set(found ? { ...eye } : null)));
    effect(() => {
      const setUp = trackingSetUp(this.setUp());
      if (untracked(this.running)) this.tracking.change(setUp);
    });
  }

  protected start(): void {
    void this.tracking.start(trackingSetUp(this.setUp()));
  }

  protected stop(): void {
    this.tracking.stop();
  }

  protected mirror(mirrored: boolean): void {
    this.setUp.update((before) => ({ ...before, camera: { ...before.camera, mirrored } }));
  }
}
