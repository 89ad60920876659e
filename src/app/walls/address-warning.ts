import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { addressWarnings } from './own-address';

/** Beside an address that is to be opened on a wall's screen: where it does not work, and what to do. Nothing where it does. */
@Component({
  selector: 'oriel-address-warning',
  template: `
    @if (warnings().length > 0) {
      <div role="note">
        @for (words of warnings(); track words) {
          <p>{{ words }}</p>
        }
      </div>
    }
  `,
  styles: ':host { display: block; } div { margin: 8px 0 12px; max-width: 72ch; padding: 8px 12px; border-left: 3px solid var(--brass-line); background: var(--zone); } p { margin: 0; max-width: 64ch; font-size: 13px; overflow-wrap: anywhere; } p + p { margin-top: 6px; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AddressWarning {
  readonly origin = input.required<string>();
  protected readonly warnings = computed(() => addressWarnings(this.origin()));
}
