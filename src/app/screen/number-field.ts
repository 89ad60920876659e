import { ChangeDetectionStrategy, Component, effect, input, model, untracked } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatError, MatFormField, MatHint, MatLabel, MatSuffix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type * as z from 'zod';
import { accordingTo } from '../core/zod-validator';

/** A labelled figure with its unit. `value` changes only to what the schema allows; what is typed stays, with the schema's words beside it. */
@Component({
  selector: 'oriel-number-field',
  imports: [ReactiveFormsModule, MatFormField, MatLabel, MatInput, MatError, MatHint, MatSuffix],
  template: `
    <mat-form-field>
      <mat-label>{{ label() }}</mat-label>
      <input matInput type="number" inputmode="decimal" [formControl]="control" [step]="step()" />
      <span matTextSuffix>{{ unit() }}</span>
      @if (hint()) {
        <mat-hint>{{ hint() }}</mat-hint>
      }
      <mat-error>{{ control.errors?.['contract'] }}</mat-error>
    </mat-form-field>
  `,
  styles: ':host, mat-form-field { display: block; min-width: 0; } mat-form-field { width: 100%; } :host ::ng-deep .mat-mdc-form-field-infix { width: 90px; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NumberField {
  readonly label = input.required<string>();
  readonly unit = input.required<string>();
  readonly schema = input.required<z.ZodType<number>>();
  readonly value = model.required<number>();
  readonly hint = input('');
  readonly step = input(1);
  /** Digits shown after the point of a value that was not typed. */
  readonly digits = input(1);

  protected readonly control = new FormControl<number | null>(null);

  constructor() {
    effect(() => this.control.setValidators(accordingTo(this.schema())));
    effect(() => {
      const value = this.value();
      const { control } = this;
      if (control.invalid || control.value !== value)
        untracked(() => control.setValue(Number(value.toFixed(this.digits())), { emitEvent: false }));
    });
    this.control.valueChanges.pipe(takeUntilDestroyed()).subscribe((typed) => {
      this.control.markAsTouched();
      if (typed !== null && this.control.valid) this.value.set(typed);
    });
  }
}
