import { ChangeDetectionStrategy, Component, computed, model } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { Icon } from '../core/icon/icon';
import { card, pxMmFromCard } from './screen-measure';

const leastPx = 120;
const mostPx = 900;

/** A card drawn on the screen, to be made as wide as a real one held to it: that gives the size of a px. */
@Component({
  selector: 'oriel-card-outline',
  imports: [MatIconButton, Icon],
  templateUrl: './card-outline.html',
  styleUrl: './card-outline.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CardOutline {
  /** Size of one CSS px, mm. */
  readonly pxMm = model.required<number>();

  protected readonly least = leastPx;
  protected readonly most = mostPx;
  protected readonly shape = card.widthMm / card.heightMm;
  protected readonly cardPx = computed(() => card.widthMm / this.pxMm());

  protected fit(widthPx: number): void {
    this.pxMm.set(pxMmFromCard(Math.min(mostPx, Math.max(leastPx, widthPx))));
  }

  /** Dragging the card's right edge resizes it about its left edge. */
  protected drag(event: PointerEvent, outline: HTMLElement): void {
    const handle = event.currentTarget as HTMLElement;
    if (event.type === 'pointerdown') handle.setPointerCapture(event.pointerId);
    if (event.buttons > 0) this.fit(event.clientX - outline.getBoundingClientRect().left);
  }
}
