import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { confirmSignUp } from '@oriel/shared/contracts/accounts';
import { passwordMinCharacters } from '@oriel/shared/contracts/fields';
import { Api } from '../../core/api';
import { FailureNotice } from '../../core/failure-notice';
import { Session } from '../../core/session';
import { Submission } from '../../core/submission';
import { TextField } from '../../core/text-field';
import { accordingTo } from '../../core/zod-validator';
import { mailedToken, wholeToken } from '../mailed-token';
import { Threshold } from '../threshold/threshold';

/** What the mailed link of a sign-up opens: the household and its first owner are named here. */
@Component({
  selector: 'oriel-confirm',
  imports: [ReactiveFormsModule, RouterLink, MatButton, TextField, FailureNotice, Threshold],
  templateUrl: './confirm.html',
  styleUrl: '../account-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Confirm {
  private readonly api = inject(Api);
  private readonly session = inject(Session);
  private readonly router = inject(Router);
  private readonly token = mailedToken();
  protected readonly passwordHint = `At least ${passwordMinCharacters} characters`;
  protected readonly form = inject(NonNullableFormBuilder).group({
    name: ['', accordingTo(confirmSignUp.body.shape.name)],
    householdName: ['', accordingTo(confirmSignUp.body.shape.householdName)],
    password: ['', accordingTo(confirmSignUp.body.shape.password)],
  });
  protected readonly submission = new Submission(this.form);

  protected confirm(): Promise<void> {
    return this.submission.run(async () => {
      const { account } = await this.api.call(confirmSignUp, { body: { token: wholeToken(this.token), ...this.form.getRawValue() } });
      this.session.enter(account);
      await this.router.navigateByUrl('/photos');
    });
  }
}
