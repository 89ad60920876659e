import { ChangeDetectionStrategy, Component, type ElementRef, afterRenderEffect, computed, input, model, signal, viewChild } from '@angular/core';

type Edge = 'left' | 'right';

const loupePx = 132;
const enlarged = 6;

/** Where the two edges of a thing are marked in a held picture, px of the picture. */
export interface EdgePlaces {
  readonly left: number;
  readonly right: number;
}

/** A held picture with a line to drag onto each edge of a thing; arrow keys move it by half a pixel, with Shift by five. A loupe shows the place enlarged. */
@Component({
  selector: 'oriel-edge-marks',
  template: `
    <div class="picture" #frame [style.aspect-ratio]="picture().width + ' / ' + picture().height">
      <canvas #whole [width]="picture().width" [height]="picture().height" role="img" aria-label="The held picture"></canvas>
      @for (edge of edges; track edge) {
        <div
          class="mark"
          role="slider"
          tabindex="0"
          [attr.aria-label]="edge === 'left' ? 'Left edge of the card' : 'Right edge of the card'"
          [attr.aria-valuenow]="places()[edge]"
          aria-valuemin="0"
          [attr.aria-valuemax]="picture().width"
          [attr.aria-valuetext]="places()[edge].toFixed(1) + ' px'"
          [style.left.%]="(100 * places()[edge]) / picture().width"
          (pointerdown)="take(edge, $event)"
          (pointermove)="drag(edge, $event)"
          (focus)="looked.set(edge)"
          (keydown)="nudge(edge, $event)"
        ></div>
      }
    </div>
    <figure>
      <canvas #loupe [width]="size" [height]="size" role="img" [attr.aria-label]="'The ' + looked() + ' edge, six times larger'"></canvas>
      <figcaption class="figures">
        <strong>{{ (places().right - places().left).toFixed(1) }} px</strong> between the lines. Drag each onto an edge of the card; arrow keys move it by half a
        pixel.
      </figcaption>
    </figure>
  `,
  styleUrl: './edge-marks.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EdgeMarks {
  readonly picture = input.required<ImageBitmap>();
  readonly places = model.required<EdgePlaces>();

  protected readonly edges: readonly Edge[] = ['left', 'right'];
  protected readonly size = loupePx;
  protected readonly looked = signal<Edge>('left');
  private readonly heightShare = signal(0.5);
  private readonly frame = viewChild.required<ElementRef<HTMLElement>>('frame');
  private readonly whole = viewChild.required<ElementRef<HTMLCanvasElement>>('whole');
  private readonly loupe = viewChild.required<ElementRef<HTMLCanvasElement>>('loupe');
  private readonly middle = computed(() => ({ x: this.places()[this.looked()], y: this.heightShare() * this.picture().height }));

  constructor() {
    // A canvas that is given its size is emptied, so nothing is drawn before the template gave it.
    afterRenderEffect({ write: () => void this.whole().nativeElement.getContext('2d')?.drawImage(this.picture(), 0, 0) });
    afterRenderEffect({ write: () => this.enlarge() });
  }

  protected take(edge: Edge, event: PointerEvent): void {
    (event.currentTarget as HTMLElement).setPointerCapture(event.pointerId);
    this.looked.set(edge);
    this.drag(edge, event);
  }

  protected drag(edge: Edge, event: PointerEvent): void {
    if (event.buttons === 0) return;
    const box = this.frame().nativeElement.getBoundingClientRect();
    this.heightShare.set(Math.min(Math.max((event.clientY - box.top) / box.height, 0), 1));
    this.put(edge, ((event.clientX - box.left) / box.width) * this.picture().width);
  }

  protected nudge(edge: Edge, event: KeyboardEvent): void {
    const way = event.key === 'ArrowRight' ? 1 : event.key === 'ArrowLeft' ? -1 : 0;
    if (way === 0) return;
    event.preventDefault();
    this.put(edge, this.places()[edge] + way * (event.shiftKey ? 5 : 0.5));
  }

  /** The lines keep their order and stay in the picture. */
  private put(edge: Edge, px: number): void {
    const { left, right } = this.places();
    const kept = edge === 'left' ? Math.min(Math.max(px, 0), right - 1) : Math.max(Math.min(px, this.picture().width), left + 1);
    this.places.set({ left, right, [edge]: Math.round(kept * 2) / 2 });
  }

  private enlarge(): void {
    const context = this.loupe().nativeElement.getContext('2d');
    const { x, y } = this.middle();
    const seen = loupePx / enlarged;
    if (!context) return;
    context.imageSmoothingEnabled = false;
    context.clearRect(0, 0, loupePx, loupePx);
    context.drawImage(this.picture(), x - seen / 2, y - seen / 2, seen, seen, 0, 0, loupePx, loupePx);
    context.fillStyle = '#b78a3a';
    context.fillRect(loupePx / 2 - 0.5, 0, 1, loupePx);
  }
}
