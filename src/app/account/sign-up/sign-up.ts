import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { signUp } from '@oriel/shared/contracts/accounts';
import { Api } from '../../core/api';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { TextField } from '../../core/text-field';
import { accordingTo } from '../../core/zod-validator';
import { MailSent } from '../mail-sent/mail-sent';
import { Threshold } from '../threshold/threshold';

@Component({
  selector: 'oriel-sign-up',
  imports: [ReactiveFormsModule, RouterLink, MatButton, TextField, FailureNotice, MailSent, Threshold],
  templateUrl: './sign-up.html',
  styleUrl: '../account-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignUp {
  private readonly api = inject(Api);
  protected readonly form = inject(NonNullableFormBuilder).group({
    email: ['', accordingTo(signUp.body.shape.email)],
  });
  protected readonly submission = new Submission(this.form);
  protected readonly sentTo = signal<string | null>(null);

  protected signUp(): Promise<void> {
    return this.submission.run(async () => {
      await this.api.call(signUp, { body: this.form.getRawValue() });
      this.sentTo.set(this.form.controls.email.value);
    });
  }
}
