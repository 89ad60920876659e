import { ChangeDetectionStrategy, Component, DestroyRef, type ElementRef, computed, effect, inject, signal, untracked, viewChild } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { acrossFromFocal } from '@oriel/shared/viewer/field-of-view';
import { CORNER_COUNT } from '@oriel/shared/viewer/measuring/board';
import { type Measured, measured, propagate } from '@oriel/shared/viewer/measuring/uncertainty';
import { BoardFinder } from '../../calibration/board-finder';
import type { BoardView, MeasuredLens } from '../../calibration/board-messages';
import { greyOf } from '../../calibration/grey-picture';
import { enoughViews, fewestViews, isNewView } from '../../calibration/view-choice';
import { OpenedHeading } from '../../core/opened-heading';
import { plainMm } from '../../figures/words';
import { degrees } from '../../screen/screen-measure';
import { worthWords } from '../means/sources';
import { WallKeeper } from '../set-up/wall-keeper';
import { LiveCamera } from './live-camera';

const pauseMs = 150;

/** The field of view from several views of the printed board, gathered while it is moved before the camera. */
@Component({
  selector: 'oriel-board-measure',
  imports: [MatButton, RouterLink, OpenedHeading],
  providers: [LiveCamera, BoardFinder],
  templateUrl: './board-measure.html',
  styleUrl: './measure.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BoardMeasure {
  private readonly keeper = inject(WallKeeper);
  private readonly finder = inject(BoardFinder);
  protected readonly live = inject(LiveCamera);
  private readonly video = viewChild<ElementRef<HTMLVideoElement>>('video');
  private readonly overlay = viewChild<ElementRef<HTMLCanvasElement>>('overlay');
  private readonly views = signal<readonly BoardView[]>([]);
  private before: BoardView | null = null;
  private width = 0;
  private destroyed = false;

  protected readonly seen = signal(0);
  protected readonly problem = signal('');
  protected readonly lens = signal<MeasuredLens | null>(null);
  protected readonly count = computed(() => this.views().length);
  protected readonly words = computed(() => {
    if (this.count() >= enoughViews) return 'Enough views are gathered.';
    const kept = `${this.count()} of ${enoughViews} views`;
    if (this.seen() === 0) return `${kept}. No board is seen: hold it flat, well lit, whole in the picture.`;
    return `${kept}, ${this.seen()} of ${CORNER_COUNT} corners seen. Hold it still for a moment, then tilt it, and bring it to the corners of the picture.`;
  });
  /** The field across follows from the focal length alone; its spread is the calibration's own. */
  protected readonly field = computed<Measured | null>(() => {
    const lens = this.lens();
    return lens && propagate(([focal]) => acrossFromFocal(focal, this.width), [measured(lens.focalPx, lens.focalSpreadPx)]);
  });
  protected readonly result = computed(() => {
    const [field, lens] = [this.field(), this.lens()];
    if (!field || !lens) return '';
    return `${plainMm(degrees(field.value), 2)}° ± ${plainMm(degrees(field.uncertainty), 2)}° across, corners met to ${plainMm(lens.rmsPx, 2)} px. ${worthWords(this.keeper.setUp()!, { hfovRad: field.uncertainty })}`;
  });
  protected readonly doubtful = computed(() => (this.lens()?.rmsPx ?? 0) > 1);

  constructor() {
    inject(DestroyRef).onDestroy(() => (this.destroyed = true));
    effect(() => {
      // What is gathered must not start another gathering.
      if (this.live.stream()) untracked(() => void this.gather());
    });
  }

  protected again(): void {
    this.views.set([]);
    this.lens.set(null);
    this.problem.set('');
    void this.live.start();
  }

  protected take(field: Measured): void {
    const { uncertainty } = this.keeper.setUp()!.camera;
    this.keeper.camera({ hfovRad: field.value, uncertainty: { ...uncertainty, hfovRad: field.uncertainty } });
    this.live.stop();
  }

  private async gather(): Promise<void> {
    const stream = this.live.stream();
    try {
      while (!this.destroyed && this.live.stream() === stream && this.count() < enoughViews) {
        await this.lookOnce();
        await new Promise((resolve) => setTimeout(resolve, pauseMs));
      }
    } catch (cause) {
      this.problem.set(cause instanceof Error ? cause.message : 'The board could not be looked for.');
    }
    if (this.live.stream() === stream) this.live.stop();
  }

  private async lookOnce(): Promise<void> {
    const video = this.video()?.nativeElement;
    if (!video?.videoWidth) return;
    const { grey, width, height } = greyOf(video);
    const view = await this.finder.look(grey, width, height);
    if (this.destroyed) return;
    this.width = width;
    this.seen.set(view.ids.length);
    this.draw(view, width, height);
    const { before } = this;
    this.before = view;
    if (!isNewView(view, before, this.views(), width)) return;
    this.views.update((kept) => [...kept, view]);
    if (this.count() >= fewestViews) this.lens.set(await this.finder.measure(this.views(), width, height));
  }

  private draw({ corners }: BoardView, width: number, height: number): void {
    const canvas = this.overlay()?.nativeElement;
    const context = canvas?.getContext('2d');
    if (!canvas || !context) return;
    canvas.width = width;
    canvas.height = height;
    context.fillStyle = '#b78a3a';
    for (let i = 0; i < corners.length; i += 2) context.fillRect(corners[i] - 4, corners[i + 1] - 4, 8, 8);
  }
}
