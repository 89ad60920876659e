import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { askPasswordReset } from '@oriel/shared/contracts/accounts';
import { Api } from '../../core/api';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { TextField } from '../../core/text-field';
import { accordingTo } from '../../core/zod-validator';
import { MailSent } from '../mail-sent/mail-sent';
import { Threshold } from '../threshold/threshold';

@Component({
  selector: 'oriel-ask-reset',
  imports: [ReactiveFormsModule, RouterLink, MatButton, TextField, FailureNotice, MailSent, Threshold],
  template: `
    <oriel-threshold>
      @if (sentTo(); as address) {
        <oriel-mail-sent [address]="address">If an account uses it, the link inside sets a new password. It works once, for an hour.</oriel-mail-sent>
      } @else {
        <h1>A new password</h1>
        <p>Tell us your address, and we send you a link that sets a new password.</p>
        <form [formGroup]="form" (ngSubmit)="ask()" novalidate>
          <oriel-text-field [control]="form.controls.email" label="E-mail" type="email" autocomplete="username" />
          <oriel-failure-notice [failure]="submission.failure()" />
          <button matButton="filled" type="submit" [disabled]="submission.busy()">Send the link</button>
        </form>
      }
      <p class="links"><a routerLink="/sign-in">Back to sign-in</a></p>
    </oriel-threshold>
  `,
  styleUrl: '../account-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AskReset {
  private readonly api = inject(Api);
  protected readonly form = inject(NonNullableFormBuilder).group({ email: ['', accordingTo(askPasswordReset.body.shape.email)] });
  protected readonly submission = new Submission(this.form);
  protected readonly sentTo = signal<string | null>(null);

  protected ask(): Promise<void> {
    return this.submission.run(async () => {
      await this.api.call(askPasswordReset, { body: this.form.getRawValue() });
      this.sentTo.set(this.form.controls.email.value);
    });
  }
}
