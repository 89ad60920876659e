import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { machineName } from './machine';

/** A machine by its short name, and on demand all that was recorded of it. */
@Component({
  selector: 'oriel-machine-words',
  template: `
    @if (short() === words()) {
      {{ words() }}
    } @else {
      <details>
        <summary>{{ short() }}</summary>
        {{ words() }}
      </details>
    }
  `,
  styles: `
    :host { display: block; overflow-wrap: anywhere; }
    summary { width: fit-content; cursor: pointer; list-style-position: inside; }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MachineWords {
  /** As recorded. */
  readonly words = input.required<string>();
  protected readonly short = computed(() => machineName(this.words()));
}
