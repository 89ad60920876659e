import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { MatSelectHarness } from '@angular/material/select/testing';
import { provideRouter } from '@angular/router';
import { Session } from '../../core/session';
import { HouseholdStore } from '../household-store';
import { Members } from './members';

describe('the members', () => {
  it('shows the role someone still has when its change was refused', async () => {
    const owner = { accountId: 'ada', name: 'Ada', email: 'ada@example.org', role: 'owner', joinedAt: '' } as const;
    const store = { household: signal({ members: [owner] }), changeRole: () => Promise.reject(new Error('the last owner')) };
    const session = { account: signal(null), isOwner: signal(true) };
    TestBed.configureTestingModule({
      providers: [provideRouter([]), { provide: HouseholdStore, useValue: store }, { provide: Session, useValue: session }],
    });
    const fixture = TestBed.createComponent(Members);
    const role = await TestbedHarnessEnvironment.loader(fixture).getHarness(MatSelectHarness);
    expect(await role.getValueText()).toMatch(/^owner/);
    await role.clickOptions({ text: /^viewer/ });
    expect((fixture.nativeElement as HTMLElement).querySelector('[role=alert]')).not.toBeNull();
    expect(await role.getValueText()).toMatch(/^owner/);
  });
});
