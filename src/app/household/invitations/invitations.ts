import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatOption, MatSelect, MatSelectTrigger } from '@angular/material/select';
import { invite } from '@oriel/shared/contracts/households';
import { everyRole, type Role } from '@oriel/shared/contracts/role';
import { FailureNotice } from '../../core/failure-notice';
import { Session } from '../../core/session';
import { Submission } from '../../core/submission';
import { TextField } from '../../core/text-field';
import { accordingTo } from '../../core/zod-validator';
import { HouseholdStore } from '../household-store';
import { roleWords } from '../role-words';

/** Invites by e-mail with a role, and shows who has not come yet. */
@Component({
  selector: 'oriel-invitations',
  imports: [DatePipe, ReactiveFormsModule, MatButton, MatFormField, MatHint, MatLabel, MatSelect, MatSelectTrigger, MatOption, TextField, FailureNotice],
  templateUrl: './invitations.html',
  styleUrl: './invitations.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Invitations {
  protected readonly store = inject(HouseholdStore);
  protected readonly mailPage = inject(Session).mailPage;
  protected readonly roles = everyRole;
  protected readonly words = roleWords;
  protected readonly form = inject(NonNullableFormBuilder).group({
    email: ['', accordingTo(invite.body.shape.email)],
    role: ['viewer' as Role],
  });
  protected readonly inviting = new Submission(this.form);
  protected readonly withdrawing = new Submission();
  protected readonly sentTo = signal('');

  protected invite(): Promise<void> {
    return this.inviting.run(async () => {
      const { email, role } = this.form.getRawValue();
      await this.store.invite(email, role);
      this.sentTo.set(email);
      this.form.reset();
    });
  }

  protected withdraw(invitationId: string): Promise<void> {
    return this.withdrawing.run(() => this.store.withdraw(invitationId));
  }
}
