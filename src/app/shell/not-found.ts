import { ChangeDetectionStrategy, Component } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';

@Component({
  selector: 'oriel-not-found',
  imports: [MatButton, RouterLink],
  template: `
    <main class="page">
      <h1>There is nothing at this address</h1>
      <p>The link may be old, or a letter may be missing.</p>
      <a matButton="filled" routerLink="/">Go to your scenes</a>
    </main>
  `,
  styles: 'main { padding-top: 18vh; max-width: 560px; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotFound {}
