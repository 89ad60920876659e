import { ChangeDetectionStrategy, Component, type OnInit, computed, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { Name, Password, passwordMinCharacters } from '@oriel/shared/contracts/fields';
import { acceptInvitation, readInvitation } from '@oriel/shared/contracts/households';
import type { ReplyOf } from '@oriel/shared/contracts/route';
import { Api } from '../../core/api';
import { FailureNotice } from '../../core/failure-notice';
import { Session } from '../../core/session';
import { Submission } from '../../core/submission';
import { TextField } from '../../core/text-field';
import { accordingTo } from '../../core/zod-validator';
import { mailedToken, wholeToken } from '../mailed-token';
import { Threshold } from '../threshold/threshold';

/** What a mailed invitation opens: join as who you are, sign in first, or make an account. */
@Component({
  selector: 'oriel-invitation',
  imports: [ReactiveFormsModule, RouterLink, MatButton, TextField, FailureNotice, Threshold],
  templateUrl: './invitation.html',
  styleUrl: '../account-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InvitationPage implements OnInit {
  private readonly api = inject(Api);
  private readonly router = inject(Router);
  protected readonly token = mailedToken();
  protected readonly session = inject(Session);
  protected readonly passwordHint = `At least ${passwordMinCharacters} characters`;
  protected readonly form = inject(NonNullableFormBuilder).group({ name: ['', accordingTo(Name)], password: ['', accordingTo(Password)] });
  protected readonly reading = new Submission();
  protected readonly joining = new Submission(this.form);
  protected readonly joiningAsMember = new Submission();
  protected readonly invitation = signal<ReplyOf<typeof readInvitation> | null>(null);
  protected readonly isForMe = computed(() => this.session.account()?.email === this.invitation()?.email);

  ngOnInit(): void {
    void this.read();
  }

  protected read(): Promise<void> {
    return this.reading.run(async () => this.invitation.set(await this.api.call(readInvitation, { body: { token: wholeToken(this.token) } })));
  }

  protected join(): Promise<void> {
    return this.joiningAsMember.run(() => this.accept());
  }

  protected joinWithNewAccount(): Promise<void> {
    return this.joining.run(() => this.accept(this.form.getRawValue()));
  }

  private async accept(newAccount?: { name: string; password: string }): Promise<void> {
    const { account, householdId } = await this.api.call(acceptInvitation, { body: { token: this.token, newAccount } });
    this.session.enter(account);
    this.session.choose(householdId);
    await this.router.navigateByUrl('/scenes');
  }
}
