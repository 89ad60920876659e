import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormField } from '@angular/material/form-field';
import { MatOption, MatSelect, type MatSelectChange, MatSelectTrigger } from '@angular/material/select';
import { Router } from '@angular/router';
import type { Member } from '@oriel/shared/contracts/households';
import { everyRole, type Role } from '@oriel/shared/contracts/role';
import { FailureNotice } from '../../core/failure-notice';
import { Session } from '../../core/session';
import { Submission } from '../../core/submission';
import { HouseholdStore } from '../household-store';
import { roleWords } from '../role-words';

/** Who belongs to the household; an owner changes roles and removes, everyone may leave. Removing asks once more in place. */
@Component({
  selector: 'oriel-members',
  imports: [MatButton, MatFormField, MatSelect, MatSelectTrigger, MatOption, FailureNotice],
  templateUrl: './members.html',
  styleUrl: './members.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Members {
  protected readonly store = inject(HouseholdStore);
  protected readonly session = inject(Session);
  private readonly router = inject(Router);
  protected readonly roles = everyRole;
  protected readonly words = roleWords;
  protected readonly change = new Submission();
  /** The account whose removal waits for a second press. */
  protected readonly asked = signal<string | null>(null);

  protected isMe(member: Member): boolean {
    return member.accountId === this.session.account()?.id;
  }

  protected async changeRole(member: Member, { source, value }: MatSelectChange<Role>): Promise<void> {
    await this.change.run(() => this.store.changeRole(member.accountId, value));
    if (this.change.failure()) source.value = member.role;
  }

  protected remove(member: Member): Promise<void> {
    return this.change.run(async () => {
      this.asked.set(null);
      if (!this.isMe(member)) return this.store.remove(member.accountId);
      await this.store.leave();
      await this.router.navigateByUrl('/scenes');
    });
  }
}
