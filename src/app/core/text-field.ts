import { ChangeDetectionStrategy, Component, type ElementRef, input, viewChild } from '@angular/core';
import { type FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { ownId } from './own-id';

/** One labelled line of text, with the contract's words when it is not right. */
@Component({
  selector: 'oriel-text-field',
  imports: [ReactiveFormsModule, MatFormField, MatLabel, MatInput, MatError, MatHint],
  template: `
    <mat-form-field>
      <mat-label>{{ label() }}</mat-label>
      <input #field matInput [formControl]="control()" [type]="type()" [autocomplete]="autocomplete()" [attr.list]="suggestions().length > 0 ? listId : null" />
      @if (suggestions().length > 0) {
        <datalist [id]="listId">
          @for (text of suggestions(); track text) {
            <option [value]="text"></option>
          }
        </datalist>
      }
      @if (hint()) {
        <mat-hint>{{ hint() }}</mat-hint>
      }
      <mat-error>{{ control().errors?.['contract'] }}</mat-error>
    </mat-form-field>
  `,
  styles: ':host, mat-form-field { display: block; width: 100%; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TextField {
  readonly control = input.required<FormControl<string>>();
  readonly label = input.required<string>();
  readonly type = input<'text' | 'email' | 'password'>('text');
  readonly autocomplete = input('off');
  readonly hint = input('');
  /** What may well be meant; anything else may be typed too. */
  readonly suggestions = input<readonly string[]>([]);
  protected readonly listId = ownId('suggestions');
  private readonly field = viewChild.required<ElementRef<HTMLInputElement>>('field');

  focus(): void {
    this.field().nativeElement.focus();
  }
}
