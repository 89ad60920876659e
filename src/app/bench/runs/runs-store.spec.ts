import { TestBed } from '@angular/core/testing';
import { usualTuning } from '@oriel/shared/contracts/new-wall';
import { Api } from '../../core/api';
import { Session } from '../../core/session';
import { RunShelf, type WaitingRun } from './run-shelf';
import { RunsStore } from './runs-store';

const samples = (count: number) =>
  Array.from({ length: count }, (_, i) => ({ capturedMs: i, receivedMs: i, eye: null, cropMs: 0, detectMs: 0, landmarksMs: 0, totalMs: 0 }));

const waitingRun = (id: string, count: number): WaitingRun => ({
  id,
  accountId: 'a',
  householdId: 'h',
  body: { id, name: id, wallId: null, machine: '', tuning: usualTuning, frameIntervalP50Ms: 0, frameIntervalP95Ms: 0, samples: samples(count) },
});

describe('runs that wait in this browser', () => {
  it('wait no longer once the server has them, unless they were recorded further since', async () => {
    let shelf = [waitingRun('answer lost', 3), waitingRun('gone on', 5), waitingRun('never sent', 3)];
    const stored = ['answer lost', 'gone on'].map((id) => ({ id, name: id, sampleCount: 3 }));
    TestBed.configureTestingModule({
      providers: [
        { provide: Api, useValue: { call: () => Promise.resolve({ runs: stored }) } },
        { provide: Session, useValue: { householdId: () => 'h' } },
        {
          provide: RunShelf,
          useValue: {
            waiting: () => Promise.resolve(shelf),
            drop: (id: string) => Promise.resolve(void (shelf = shelf.filter((run) => run.id !== id))),
          },
        },
      ],
    });
    const runs = TestBed.inject(RunsStore);
    await runs.load();
    expect(runs.waiting().map(({ id }) => id)).toEqual(['gone on', 'never sent']);
    expect(shelf.map(({ id }) => id)).toEqual(['gone on', 'never sent']);
  });
});
