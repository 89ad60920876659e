import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router } from '@angular/router';
import { changePassword, rename } from '@oriel/shared/contracts/accounts';
import { passwordMinCharacters } from '@oriel/shared/contracts/fields';
import { Api } from '../../core/api';
import { FailureNotice } from '../../core/failure-notice';
import { Session } from '../../core/session';
import { Submission } from '../../core/submission';
import { TextField } from '../../core/text-field';
import { accordingTo } from '../../core/zod-validator';

/** A person's own account: name, password, and where they are signed in. */
@Component({
  selector: 'oriel-settings',
  imports: [ReactiveFormsModule, MatButton, TextField, FailureNotice],
  templateUrl: './settings.html',
  styleUrl: './settings.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Settings {
  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private readonly fields = inject(NonNullableFormBuilder);
  protected readonly session = inject(Session);
  protected readonly passwordHint = `At least ${passwordMinCharacters} characters`;

  protected readonly nameForm = this.fields.group({ name: [this.session.account()?.name ?? '', accordingTo(rename.body.shape.name)] });
  protected readonly naming = new Submission(this.nameForm);
  protected readonly named = signal(false);

  protected readonly passwordForm = this.fields.group({
    current: ['', accordingTo(changePassword.body.shape.current)],
    next: ['', accordingTo(changePassword.body.shape.next)],
  });
  protected readonly changing = new Submission(this.passwordForm);
  protected readonly changed = signal(false);
  protected readonly leaving = new Submission();

  protected rename(): Promise<void> {
    this.named.set(false);
    return this.naming.run(async () => {
      const { account } = await this.api.call(rename, { body: this.nameForm.getRawValue() });
      this.session.enter(account);
      this.named.set(true);
    });
  }

  protected changePassword(): Promise<void> {
    this.changed.set(false);
    return this.changing.run(async () => {
      await this.api.call(changePassword, { body: this.passwordForm.getRawValue() });
      this.passwordForm.reset();
      this.changed.set(true);
    });
  }

  protected leaveEverywhere(): Promise<void> {
    return this.leaving.run(async () => {
      await this.session.leave(true);
      await this.router.navigateByUrl('/sign-in');
    });
  }
}
