import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { Session } from '../../core/session';
import { UploadQueue } from './upload-queue';

describe('the upload queue', () => {
  it('security: forgets what is under way and what is done when its person signs out', () => {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
    const membership = { householdId: 'here', householdName: 'Lark House', role: 'owner' } as const;
    const session = TestBed.inject(Session);
    session.enter({ id: 'ada', name: 'Ada', email: 'ada@example.org', memberships: [membership] });
    const queue = TestBed.inject(UploadQueue);
    TestBed.tick();
    queue.add(['a', 'b', 'c', 'd'].map((name) => new File(['x'], name)));
    const sent = TestBed.inject(HttpTestingController).match(() => true);
    expect(sent).toHaveLength(3);

    session.account.set(null);
    TestBed.tick();
    expect(queue.uploads()).toEqual([]);
    expect(sent.every(({ cancelled }) => cancelled)).toBe(true);
    TestBed.inject(HttpTestingController).verify();
  });
});
