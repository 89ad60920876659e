import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { type Account, whoAmI } from '@oriel/shared/contracts/accounts';
import { createHousehold, readHousehold } from '@oriel/shared/contracts/households';
import type { Route } from '@oriel/shared/contracts/route';
import { Api } from '../../core/api';
import { forHouseholds } from '../../core/guards';
import { Session } from '../../core/session';
import { HouseholdPage } from './household-page';

describe('the household page for someone who belongs to none', () => {
  const membership = { householdId: 'new', householdName: 'Lark House', role: 'owner' } as const;
  const ada: Account = { id: 'ada', name: 'Ada', email: 'ada@example.org', memberships: [] };
  const household = { id: 'new', name: 'Lark House', members: [] };
  const replies = new Map<unknown, unknown>([
    [createHousehold, { household }],
    [readHousehold, { household }],
    [whoAmI, { account: { ...ada, memberships: [membership] }, mailPage: null }],
  ]);

  beforeEach(() => {
    const call = (route: Route) => Promise.resolve(replies.get(route) ?? { invitations: [] });
    TestBed.configureTestingModule({ providers: [provideRouter([]), { provide: Api, useValue: { call } }] });
    TestBed.inject(Session).enter(ada);
  });

  it('is where every page of a household leads', () => {
    const led = TestBed.runInInjectionContext(() => forHouseholds({} as never, {} as never));
    expect(String(led)).toBe('/household');
  });

  it('lets them make one, and shows it', async () => {
    const fixture = TestBed.createComponent(HouseholdPage);
    await fixture.whenStable();
    const element = fixture.nativeElement as HTMLElement;
    expect(element.querySelector('h1')?.textContent).toBe('No household');
    expect(element.querySelector('[role=alert]')).toBeNull();

    fixture.componentInstance['anotherForm'].setValue({ name: 'Lark House' });
    element.querySelector('form')!.dispatchEvent(new Event('submit'));
    await fixture.whenStable();
    expect(element.querySelector('h1')?.textContent).toBe('Lark House');
    expect(fixture.componentInstance['nameForm'].value.name).toBe('Lark House');
  });
});
