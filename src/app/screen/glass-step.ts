import { ChangeDetectionStrategy, Component, DOCUMENT, computed, inject, model, signal } from '@angular/core';
import { MatButtonToggle, MatButtonToggleGroup } from '@angular/material/button-toggle';
import { MatButton } from '@angular/material/button';
import * as z from 'zod';
import { CardOutline } from './card-outline';
import { NumberField } from './number-field';
import { diagonalOf, glassFromDiagonal, mmPerInch, nominalPxMm } from './screen-measure';

type Unit = 'inch' | 'cm';

const unitMm: Readonly<Record<Unit, number>> = { inch: mmPerInch, cm: 10 };

/** The first step: how large the glass is, by a card held to it or by its diagonal. */
@Component({
  selector: 'oriel-glass-step',
  imports: [MatButtonToggle, MatButtonToggleGroup, MatButton, CardOutline, NumberField],
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
  protected readonly nominalPxMm = nominalPxMm;

  protected readonly glass = computed(() => ({ widthMm: this.screen.width * this.pxMm(), heightMm: this.screen.height * this.pxMm() }));
  protected readonly diagonal = computed(() => diagonalOf(this.glass()) / unitMm[this.unit()]);
  protected readonly inches = computed(() => diagonalOf(this.glass()) / mmPerInch);
  protected readonly diagonalRule = computed(() => {
    const of = (mm: number) => Number((mm / unitMm[this.unit()]).toPrecision(2));
    return z.number().min(of(100), `At least ${of(100)}`).max(of(5000), `At most ${of(5000)}`);
  });

  protected fitDiagonal(length: number): void {
    this.pxMm.set(glassFromDiagonal(length * unitMm[this.unit()], this.screen.width, this.screen.height).widthMm / this.screen.width);
  }
}
