import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';

/** What is done with a result: it is taken, or, where it is doubted, measured again first of all. */
@Component({
  selector: 'oriel-take-result',
  imports: [MatButton],
  template: `
    @if (doubt()) {
      <p role="alert">{{ doubt() }}</p>
      <button matButton="filled" type="button" (click)="again.emit()">Measure again</button>
      <button matButton type="button" (click)="take.emit()">Take it all the same</button>
    } @else {
      <button matButton="filled" type="button" (click)="take.emit()">Take it</button>
    }
  `,
  styles: ':host { display: flex; flex-wrap: wrap; gap: 8px; } p { flex: 1 0 100%; margin: 0; color: var(--not-clear); }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TakeResult {
  /** Why the result is doubted; empty where it is not. */
  readonly doubt = input.required<string>();
  readonly again = output();
  readonly take = output();
}
