import { ChangeDetectionStrategy, Component, type OnInit, inject } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { createHousehold, renameHousehold } from '@oriel/shared/contracts/households';
import { FailureNotice } from '../../core/failure-notice';
import { Session } from '../../core/session';
import { Submission } from '../../core/submission';
import { TextField } from '../../core/text-field';
import { accordingTo } from '../../core/zod-validator';
import { HouseholdStore } from '../household-store';
import { Invitations } from '../invitations/invitations';
import { Members } from '../members/members';

@Component({
  selector: 'oriel-household-page',
  imports: [ReactiveFormsModule, MatButton, TextField, FailureNotice, Members, Invitations],
  providers: [HouseholdStore],
  templateUrl: './household-page.html',
  styleUrl: './household-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HouseholdPage implements OnInit {
  protected readonly store = inject(HouseholdStore);
  protected readonly session = inject(Session);
  private readonly fields = inject(NonNullableFormBuilder);
  protected readonly loading = new Submission();
  protected readonly nameForm = this.fields.group({ name: ['', accordingTo(renameHousehold.body.shape.name)] });
  protected readonly naming = new Submission(this.nameForm);
  protected readonly anotherForm = this.fields.group({ name: ['', accordingTo(createHousehold.body.shape.name)] });
  protected readonly creating = new Submission(this.anotherForm);

  ngOnInit(): void {
    void this.load();
  }

  protected load(): Promise<void> {
    return this.loading.run(async () => {
      if (!this.session.household()) return;
      await this.store.load();
      this.nameForm.setValue({ name: this.store.household()?.name ?? '' });
    });
  }

  protected rename(): Promise<void> {
    return this.naming.run(() => this.store.rename(this.nameForm.controls.name.value));
  }

  protected create(): Promise<void> {
    return this.creating.run(async () => {
      await this.store.create(this.anotherForm.controls.name.value);
      this.anotherForm.reset();
      await this.load();
    });
  }
}
