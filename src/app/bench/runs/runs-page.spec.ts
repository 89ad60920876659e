import { provideZonelessChangeDetection, signal } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { usualTuning } from '@oriel/shared/contracts/new-wall';
import type { RunHeader } from '@oriel/shared/contracts/runs';
import { BenchSubject } from '../subject/bench-subject';
import type { WaitingRun } from './run-shelf';
import { RunsPage } from './runs-page';
import { RunsStore } from './runs-store';

const run = (id: string, name: string): RunHeader => ({
  id,
  name,
  wallId: null,
  machine: 'one',
  tuning: usualTuning,
  recordedAt: '2026-01-05T10:00:00Z',
  recordedBy: 'Maud',
  durationMs: 61_000,
  sampleCount: 1800,
  frameIntervalP50Ms: 16.7,
  frameIntervalP95Ms: 17,
});

describe('the page of runs', () => {
  let fixture: ComponentFixture<RunsPage>;
  const removed: string[] = [];
  const kept: string[] = [];
  const runs = signal<readonly RunHeader[]>([]);
  const waiting = signal<readonly WaitingRun[]>([]);
  const element = () => fixture.nativeElement as HTMLElement;
  const button = (name: string) =>
    [...element().querySelectorAll('button')].find(
      (one) => (one.getAttribute('aria-label') ?? one.textContent).trim() === name,
    );
  const press = async (name: string) => {
    button(name)!.click();
    await fixture.whenStable();
  };

  beforeEach(async () => {
    removed.length = kept.length = 0;
    runs.set([run('1', 'Hall'), run('2', 'Stairs')]);
    waiting.set([]);
    const store = {
      runs,
      waiting,
      load: () => Promise.resolve(),
      remove: (id: string) => Promise.resolve(void removed.push(id)),
      keep: ({ id }: { id: string }) => Promise.resolve(void kept.push(id)),
    };
    TestBed.configureTestingModule({
      imports: [RunsPage],
      providers: [
        provideZonelessChangeDetection(),
        provideRouter([]),
        { provide: RunsStore, useValue: store },
        { provide: BenchSubject, useValue: { walls: signal([]) } },
      ],
    });
    fixture = TestBed.createComponent(RunsPage);
    await fixture.whenStable();
  });

  it('asks in place before it deletes', async () => {
    await press('Delete Hall');
    expect(removed).toEqual([]);
    await press('Keep');
    await press('Delete Hall');
    await press('Delete now');
    expect(removed).toEqual(['1']);
  });

  it('ends renaming with Escape', async () => {
    await press('Rename Hall');
    const field = element().querySelector('form input')!;
    field.dispatchEvent(new KeyboardEvent('keydown', { key: 'Escape', bubbles: true }));
    await fixture.whenStable();
    expect(element().querySelector('form')).toBeNull();
  });

  it('compares the two that are ticked', async () => {
    for (const box of element().querySelectorAll<HTMLInputElement>('input[type=checkbox]')) box.click();
    await fixture.whenStable();
    const link = [...element().querySelectorAll('a')].find((one) => one.textContent.includes('Compare'));
    expect(link?.getAttribute('href')).toBe('/bench/runs/compare?a=1&b=2');
  });

  it('shows what waits in this browser, and stores it once the network is back', async () => {
    const body = {
      id: 'x',
      name: 'Cut off',
      wallId: null,
      machine: 'one',
      tuning: usualTuning,
      frameIntervalP50Ms: 0,
      frameIntervalP95Ms: 0,
      samples: [],
    };
    waiting.set([{ id: 'x', accountId: 'a', householdId: 'h', body }]);
    await fixture.whenStable();
    expect(element().textContent).toContain('not stored yet');
    window.dispatchEvent(new Event('online'));
    await fixture.whenStable();
    expect(kept).toEqual(['x']);
  });

  it('says what the place is for while it is empty', async () => {
    runs.set([]);
    await fixture.whenStable();
    expect(element().textContent).toContain('never a picture');
  });
});
