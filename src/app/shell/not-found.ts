import { ChangeDetectionStrategy, Component } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';

@Component({
  selector: 'oriel-not-found',
  imports: [MatButton, RouterLink],
  template: `
    <main class="page">
      <a class="name" routerLink="/" aria-label="Oriel">Oriel</a>
      <svg viewBox="0 0 320 96" aria-hidden="true">
        <path class="sight" d="M160 88 34 12M160 88 286 12" />
        <path class="glass" d="M72 36H248" />
        <circle cx="160" cy="88" r="5" />
      </svg>
      <h1>There is nothing at this address</h1>
      <p>The link may be old, or a letter may be missing.</p>
      <a matButton="filled" routerLink="/">Go to your scenes</a>
    </main>
  `,
  styles: `
    main { display: grid; justify-items: start; gap: 12px; padding-top: 14vh; max-width: 560px; }
    .name { font: italic 500 44px/1 var(--serif); color: var(--ink); text-decoration: none; }
    svg { width: min(320px, 100%); margin: 20px 0 16px; fill: none; stroke: var(--ink); }
    circle { fill: var(--sheet); stroke-width: 2; }
    .glass { stroke-width: 4; }
    .sight { stroke: var(--pencil); }
    p { margin: 0 0 8px; }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotFound {}
