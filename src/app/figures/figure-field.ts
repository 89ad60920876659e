import { ChangeDetectionStrategy, Component, type ElementRef, Injector, afterNextRender, computed, inject, input, linkedSignal, output, viewChild } from '@angular/core';
import { ownId } from '../core/own-id';
import { plainMm, readFigure, signedMm } from './words';

/**
 * One figure, typed or stepped: arrows by one step, with Shift by ten. What cannot be taken stays there and says why, until it is mended,
 * Escape puts the figure back, or the figure changes elsewhere.
 */
@Component({
  selector: 'oriel-figure-field',
  template: `
    <label [attr.for]="id" [class.unseen]="bare()">{{ label() }}</label>
    <span class="box" [class.wrong]="problem()">
      <input
        #field
        type="text"
        inputmode="decimal"
        role="spinbutton"
        autocomplete="off"
        [id]="id"
        [value]="typed() ?? shown()"
        [readOnly]="readOnly()"
        [attr.data-settled]="typed() === null ? '' : null"
        [attr.aria-valuenow]="value()"
        [attr.aria-valuetext]="shown() + ' ' + unit()"
        [attr.aria-valuemin]="least()"
        [attr.aria-valuemax]="most()"
        [attr.aria-invalid]="problem() ? true : null"
        [attr.aria-describedby]="problem() ? id + '-problem' : null"
        (input)="typed.set(field.value)"
        (focus)="field.select()"
        (blur)="take()"
        (keydown)="key($event)"
      />
      @if (!bare()) {
        <span class="unit" aria-hidden="true">{{ unit() }}</span>
      }
    </span>
    @if (problem()) {
      <span class="problem" role="alert" [id]="id + '-problem'">{{ problem() }}</span>
    }
  `,
  styleUrl: './figure-field.scss',
  host: { '[class.bare]': 'bare()', '(document:keydown.escape)': 'giveUp()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FigureField {
  readonly label = input.required<string>();
  readonly value = input.required<number>();
  readonly unit = input('mm');
  readonly least = input(-100_000);
  readonly most = input(100_000);
  readonly step = input(1);
  /** Digits shown after the point. */
  readonly decimals = input(1);
  /** Whether a plus is shown too, as for depths. */
  readonly signed = input(false);
  /** Whether label and unit stand elsewhere, as in a column. */
  readonly bare = input(false);
  readonly readOnly = input(false);
  readonly figure = output<number>();

  protected readonly id = ownId('figure');
  protected readonly typed = linkedSignal<number, string | null>({ source: this.value, computation: () => null });
  protected readonly problem = linkedSignal({ source: this.value, computation: () => '' });
  protected readonly shown = computed(() => (this.signed() ? signedMm : plainMm)(this.value(), this.decimals()));
  private readonly injector = inject(Injector);
  private readonly field = viewChild.required<ElementRef<HTMLInputElement>>('field');

  focus(): void {
    this.field().nativeElement.focus();
  }

  protected take(): void {
    const text = this.typed();
    if (text === null || text === this.shown()) return this.putBack();
    const figure = readFigure(text);
    const problem = this.problemOf(figure);
    this.problem.set(problem);
    if (figure === null || problem) return;
    this.typed.set(null);
    this.figure.emit(figure);
  }

  protected key(event: KeyboardEvent): void {
    if (event.key === 'Enter') this.take();
    if (event.key === 'Escape') {
      this.putBack();
      event.stopPropagation();
    }
    if (event.key !== 'ArrowUp' && event.key !== 'ArrowDown') return;
    event.preventDefault();
    if (this.readOnly()) return;
    const by = this.step() * (event.shiftKey ? 10 : 1) * (event.key === 'ArrowUp' ? 1 : -1);
    const next = Math.min(Math.max(this.value() + by, this.least()), this.most());
    this.putBack();
    if (next === this.value()) return;
    this.figure.emit(next);
    // A row that moves in the ledger takes the focus from its field.
    afterNextRender(() => this.focus(), { injector: this.injector });
  }

  /** Escape is heard from everywhere: what was refused when the field was left has no focus any more. */
  protected giveUp(): void {
    if (this.problem()) this.putBack();
  }

  private putBack(): void {
    this.typed.set(null);
    this.problem.set('');
  }

  private problemOf(figure: number | null): string {
    if (figure === null) return 'Write a figure, such as 180';
    if (figure < this.least()) return `At least ${plainMm(this.least(), this.decimals())} ${this.unit()}`;
    if (figure > this.most()) return `At most ${plainMm(this.most(), this.decimals())} ${this.unit()}`;
    return '';
  }
}
