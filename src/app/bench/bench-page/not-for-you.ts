import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { Session } from '../../core/session';

/** What whoever may not tune finds at the bench's addresses: why, and what to do. */
@Component({
  selector: 'oriel-not-for-you',
  imports: [MatButton, RouterLink],
  template: `
    <div class="page">
      <h1>The bench is for owners and tuners</h1>
      <p>Here they tune how walls follow. You are {{ role() }} in {{ household() }}: an owner can make you a tuner, on the page Household.</p>
      <a matButton="filled" routerLink="/scenes">Go to the scenes</a>
    </div>
  `,
  styles: `
    .page { display: grid; justify-items: start; gap: 12px; max-width: 640px; }
    p { margin: 0 0 8px; }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotForYou {
  private readonly session = inject(Session);
  protected readonly role = computed(() => `a ${this.session.role() ?? 'viewer'}`);
  protected readonly household = computed(() => this.session.household()?.householdName ?? 'this household');
}
