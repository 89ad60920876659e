import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { ApiFailure } from './api-failure';
import { Icon } from './icon/icon';

/** The one place where a failed request is shown: what happened, what to do, and a way to try again. */
@Component({
  selector: 'oriel-failure-notice',
  imports: [MatButton, Icon],
  template: `
    @if (failure(); as shown) {
      <div class="notice" role="alert">
        <oriel-icon name="warning" />
        <div>
          <strong>{{ shown.failure.message }}</strong>
          <span>{{ shown.failure.remedy }}</span>
          @if (shown.status >= 500 && shown.failure.reference) {
            <span class="marginal">Reference {{ shown.failure.reference }}</span>
          }
        </div>
        @if (retryable() && shown.mayPass) {
          <button matButton="outlined" type="button" (click)="retry.emit()">Try again</button>
        }
      </div>
    }
  `,
  styles: `
    :host { display: block; }
    :host(.none) { display: none; }
    .notice { display: flex; gap: 12px; align-items: flex-start; padding: 12px 14px; border: 1px solid var(--not-clear); border-radius: var(--corner); background: var(--sheet); }
    oriel-icon { color: var(--not-clear); margin-top: 1px; }
    div > div { flex: 1; display: grid; gap: 2px; }
  `,
  host: { '[class.none]': '!failure()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FailureNotice {
  readonly failure = input<ApiFailure | null>(null);
  /** Whether trying again is offered, where it can help. */
  readonly retryable = input(false);
  readonly retry = output();
}
