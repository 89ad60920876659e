import { Injectable, computed, inject, signal } from '@angular/core';
import { type Account, type Membership, signOut, signOutEverywhere, whoAmI } from '@oriel/shared/contracts/accounts';
import type { Role } from '@oriel/shared/contracts/role';
import { Api } from './api';

const householdKey = 'oriel.household';

/** Who is signed in, and in which of their households they are. */
@Injectable({ providedIn: 'root' })
export class Session {
  private readonly api = inject(Api);
  private readonly chosenId = signal(localStorage.getItem(householdKey));

  readonly account = signal<Account | null>(null);
  /** Where this server shows the mail it cannot send; null when it has a mail server. */
  readonly mailPage = signal<string | null>(null);
  readonly household = computed<Membership | null>(() => {
    const memberships = this.account()?.memberships ?? [];
    return memberships.find((membership) => membership.householdId === this.chosenId()) ?? memberships[0] ?? null;
  });
  readonly role = computed(() => this.household()?.role ?? null);
  readonly mayDesign = computed(() => this.hasRole('owner', 'designer'));
  readonly mayTune = computed(() => this.hasRole('owner', 'tuner'));
  readonly isOwner = computed(() => this.hasRole('owner'));

  /** Asks the server; one that cannot be reached changes nothing, which at start leaves a stranger. */
  async load(): Promise<void> {
    const answer = await this.api.call(whoAmI).catch(() => null);
    if (!answer) return;
    this.account.set(answer.account);
    this.mailPage.set(answer.mailPage);
  }

  enter(account: Account): void {
    this.account.set(account);
  }

  choose(householdId: string): void {
    localStorage.setItem(householdKey, householdId);
    this.chosenId.set(householdId);
  }

  /** The present household's id. @throws Error when there is none; pages that need one are only reached with one (guards.ts). */
  householdId(): string {
    const household = this.household();
    if (!household) throw new Error('No household chosen');
    return household.householdId;
  }

  async leave(everywhere = false): Promise<void> {
    await this.api.call(everywhere ? signOutEverywhere : signOut);
    this.account.set(null);
  }

  private hasRole(...roles: Role[]): boolean {
    const role = this.role();
    return role !== null && roles.includes(role);
  }
}
