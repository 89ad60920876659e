import { Injectable, inject, signal } from '@angular/core';
import { whoAmI } from '@oriel/shared/contracts/accounts';
import {
  type Household,
  type Invitation,
  changeRole,
  createHousehold,
  invite,
  leaveHousehold,
  listInvitations,
  readHousehold,
  removeMember,
  renameHousehold,
  withdrawInvitation,
} from '@oriel/shared/contracts/households';
import type { Role } from '@oriel/shared/contracts/role';
import { Api } from '../core/api';
import { Session } from '../core/session';

/** The present household, its members and, for owners, its open invitations. */
@Injectable()
export class HouseholdStore {
  private readonly api = inject(Api);
  private readonly session = inject(Session);
  private readonly current = signal<Household | null>(null);
  private readonly open = signal<readonly Invitation[]>([]);
  readonly household = this.current.asReadonly();
  readonly invitations = this.open.asReadonly();

  async load(): Promise<void> {
    const params = this.here();
    const { household } = await this.api.call(readHousehold, { params });
    this.current.set(household);
    if (this.session.isOwner()) this.open.set((await this.api.call(listInvitations, { params })).invitations);
  }

  async rename(name: string): Promise<void> {
    this.current.set((await this.api.call(renameHousehold, { params: this.here(), body: { name } })).household);
    await this.refreshSession();
  }

  async changeRole(accountId: string, role: Role): Promise<void> {
    const { household } = await this.api.call(changeRole, { params: { ...this.here(), accountId }, body: { role } });
    this.current.set(household);
    await this.refreshSession();
  }

  async remove(accountId: string): Promise<void> {
    this.current.set((await this.api.call(removeMember, { params: { ...this.here(), accountId } })).household);
  }

  async invite(email: string, role: Role): Promise<void> {
    this.open.set((await this.api.call(invite, { params: this.here(), body: { email, role } })).invitations);
  }

  async withdraw(invitationId: string): Promise<void> {
    const params = { ...this.here(), invitationId };
    this.open.set((await this.api.call(withdrawInvitation, { params })).invitations);
  }

  async leave(): Promise<void> {
    await this.api.call(leaveHousehold, { params: this.here() });
    await this.refreshSession();
    this.current.set(null);
  }

  async create(name: string): Promise<void> {
    const { household } = await this.api.call(createHousehold, { body: { name } });
    await this.refreshSession();
    this.session.choose(household.id);
  }

  private here() {
    return { householdId: this.session.householdId() };
  }

  private async refreshSession(): Promise<void> {
    const { account } = await this.api.call(whoAmI);
    if (account) this.session.enter(account);
  }
}
