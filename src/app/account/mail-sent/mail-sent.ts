import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { Session } from '../../core/session';

/** Says where a message went, and where to read it when this server sends no mail. */
@Component({
  selector: 'oriel-mail-sent',
  template: `
    <h1>We have written to you</h1>
    <p role="status">A message is on its way to <strong>{{ address() }}</strong>. <ng-content /></p>
    @if (session.mailPage(); as page) {
      <p>This Oriel has no mail server, so it keeps its messages itself: <a [href]="page" target="_blank">read them here</a>.</p>
    } @else {
      <p class="marginal">Nothing there after a few minutes? Look among the unwanted mail, or try again.</p>
    }
  `,
  styles: 'h1 { margin-bottom: 12px; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MailSent {
  readonly address = input.required<string>();
  protected readonly session = inject(Session);
}
