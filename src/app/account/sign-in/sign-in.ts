import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { signIn } from '@oriel/shared/contracts/accounts';
import { Api } from '../../core/api';
import { FailureNotice } from '../../core/failure-notice';
import { Session } from '../../core/session';
import { Submission } from '../../core/submission';
import { TextField } from '../../core/text-field';
import { accordingTo } from '../../core/zod-validator';
import { mailedToken } from '../mailed-token';
import { Threshold } from '../threshold/threshold';

@Component({
  selector: 'oriel-sign-in',
  imports: [ReactiveFormsModule, RouterLink, MatButton, TextField, FailureNotice, Threshold],
  templateUrl: './sign-in.html',
  styleUrl: '../account-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignIn {
  /** Where to go on to. */
  readonly next = input<string>();

  private readonly api = inject(Api);
  private readonly session = inject(Session);
  private readonly router = inject(Router);
  private readonly token = mailedToken();
  protected readonly form = inject(NonNullableFormBuilder).group({
    email: ['', accordingTo(signIn.body.shape.email)],
    password: ['', accordingTo(signIn.body.shape.password)],
  });
  protected readonly submission = new Submission(this.form);

  protected signIn(): Promise<void> {
    return this.submission.run(async () => {
      const { account } = await this.api.call(signIn, { body: this.form.getRawValue() });
      this.session.enter(account);
      await this.router.navigateByUrl(this.ownAddress() ?? '/scenes');
    });
  }

  /** Only an address of this page: `//elsewhere` would leave it. */
  private ownAddress(): string | null {
    const next = this.next();
    if (!next?.startsWith('/') || next.startsWith('//')) return null;
    return this.token ? `${next}#${this.token}` : next;
  }
}
