import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';

/** Where one is, in the frame's head: the way back to the list, and the name of what is open. */
@Component({
  selector: 'oriel-crumb',
  imports: [RouterLink],
  template: `
    <nav aria-label="Where you are">
      <a [routerLink]="to()">{{ list() }}</a>
      <span aria-hidden="true">/</span>
      <h1>{{ name() }}</h1>
    </nav>
  `,
  styles: `
    :host { display: block; min-width: 0; }
    nav { display: flex; align-items: baseline; gap: 8px; min-width: 0; white-space: nowrap; color: var(--pencil); }
    a { padding: 8px 0; color: var(--pencil); text-decoration: none; }
    a:hover { color: var(--ink); }
    h1 { font: 600 14px/1.4 var(--sans); color: var(--ink); overflow: hidden; text-overflow: ellipsis; }
    @media (max-width: 760px) { a, span { display: none; } }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Crumb {
  /** The address of the list. */
  readonly to = input.required<string>();
  readonly list = input.required<string>();
  readonly name = input.required<string>();
}
