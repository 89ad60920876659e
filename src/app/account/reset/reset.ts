import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { resetPassword } from '@oriel/shared/contracts/accounts';
import { passwordMinCharacters } from '@oriel/shared/contracts/fields';
import { Api } from '../../core/api';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { TextField } from '../../core/text-field';
import { accordingTo } from '../../core/zod-validator';
import { mailedToken, wholeToken } from '../mailed-token';
import { Threshold } from '../threshold/threshold';

@Component({
  selector: 'oriel-reset',
  imports: [ReactiveFormsModule, RouterLink, MatButton, TextField, FailureNotice, Threshold],
  template: `
    <oriel-threshold>
      <h1>Set a new password</h1>
      @if (done()) {
        <p role="status">Your password is changed, and you are signed out everywhere.</p>
        <a matButton="filled" routerLink="/sign-in">Sign in</a>
      } @else {
        <form [formGroup]="form" (ngSubmit)="reset()" novalidate>
          <oriel-text-field [control]="form.controls.password" label="New password" type="password" autocomplete="new-password" [hint]="passwordHint" />
          <oriel-failure-notice [failure]="submission.failure()" />
          <button matButton="filled" type="submit" [disabled]="submission.busy()">Set the password</button>
        </form>
        <p class="links"><a routerLink="/forgotten">Ask for another link</a></p>
      }
    </oriel-threshold>
  `,
  styleUrl: '../account-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Reset {
  private readonly api = inject(Api);
  private readonly token = mailedToken();
  protected readonly passwordHint = `At least ${passwordMinCharacters} characters`;
  protected readonly form = inject(NonNullableFormBuilder).group({ password: ['', accordingTo(resetPassword.body.shape.password)] });
  protected readonly submission = new Submission(this.form);
  protected readonly done = signal(false);

  protected reset(): Promise<void> {
    return this.submission.run(async () => {
      await this.api.call(resetPassword, { body: { token: wholeToken(this.token), ...this.form.getRawValue() } });
      this.done.set(true);
    });
  }
}
