import { ChangeDetectionStrategy, Component, DOCUMENT, computed, inject, model, signal } from '@angular/core';
import { MatButtonToggle, MatButtonToggleGroup } from '@angular/material/button-toggle';
import { MatButton, MatIconButton } from '@angular/material/button';
import * as z from 'zod';
import { Icon } from '../core/icon/icon';
import { NumberField } from './number-field';
import { card, diagonalOf, glassFromDiagonal, mmPerInch, nominalPxMm, pxMmFromCard } from './screen-measure';

type Unit = 'inch' | 'cm';

const unitMm: Readonly<Record<Unit, number>> = { inch: mmPerInch, cm: 10 };
const leastCardPx = 120;
const mostCardPx = 900;

/** The first step: how large the glass is, by a card held to it or by its diagonal. */
@Component({
  selector: 'oriel-glass-step',
  imports: [MatButtonToggle, MatButtonToggleGroup, MatButton, MatIconButton, Icon, NumberField],
  templateUrl: './glass-step.html',
  styleUrl: './glass-step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GlassStep {
  /** Size of one CSS px, mm. */
  readonly pxMm = model.required<number>();

  private readonly screen = inject(DOCUMENT).defaultView!.screen;
  protected readonly way = signal<'card' | 'diagonal'>('card');
  protected readonly unit = signal<Unit>('inch');
  protected readonly least = leastCardPx;
  protected readonly most = mostCardPx;
  protected readonly nominalPxMm = nominalPxMm;
  protected readonly shape = card.widthMm / card.heightMm;

  protected readonly cardPx = computed(() => card.widthMm / this.pxMm());
  protected readonly glass = computed(() => ({ widthMm: this.screen.width * this.pxMm(), heightMm: this.screen.height * this.pxMm() }));
  protected readonly diagonal = computed(() => diagonalOf(this.glass()) / unitMm[this.unit()]);
  protected readonly inches = computed(() => diagonalOf(this.glass()) / mmPerInch);
  protected readonly diagonalRule = computed(() => {
    const of = (mm: number) => Number((mm / unitMm[this.unit()]).toPrecision(2));
    return z.number().min(of(100), `At least ${of(100)}`).max(of(5000), `At most ${of(5000)}`);
  });

  protected fitCard(widthPx: number): void {
    this.pxMm.set(pxMmFromCard(Math.min(mostCardPx, Math.max(leastCardPx, widthPx))));
  }

  protected fitDiagonal(length: number): void {
    this.pxMm.set(glassFromDiagonal(length * unitMm[this.unit()], this.screen.width, this.screen.height).widthMm / this.screen.width);
  }

  /** Dragging the card's right edge resizes it about its left edge. */
  protected drag(event: PointerEvent, outline: HTMLElement): void {
    const handle = event.currentTarget as HTMLElement;
    if (event.type === 'pointerdown') handle.setPointerCapture(event.pointerId);
    if (event.buttons > 0) this.fitCard(event.clientX - outline.getBoundingClientRect().left);
  }
}
