/** Whoever does something in a household, as one of its members. */
export interface ActingMember {
  readonly householdId: string;
  readonly accountId: string;
}
