import { provideZonelessChangeDetection, signal } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { usualTuning } from '@oriel/shared/contracts/new-wall';
import { madeUpRun, standsThenWalks } from '@oriel/shared/replay/testing';
import type { EyeSample } from '../../tracking/eye-sample';
import { ApiFailure } from '../../core/api-failure';
import { BenchSubject } from '../subject/bench-subject';
import { RecordRun } from './record-run';
import { RunRecorder } from './run-recorder';
import type { RunBody } from './run-shelf';
import { RunsStore } from './runs-store';

describe('recording a run, before the camera', () => {
  let fixture: ComponentFixture<RecordRun>;
  let recorder: RunRecorder;
  let reached: boolean;
  const subject = signal({ wallId: null as string | null, name: 'This screen', tuning: usualTuning });
  const shelved: RunBody[] = [];
  const stored: RunBody[] = [];
  const discarded: string[] = [];
  const text = () => (fixture.nativeElement as HTMLElement).textContent;
  const press = async (name: string) => {
    const found = [...(fixture.nativeElement as HTMLElement).querySelectorAll('button')].find((one) => one.textContent.trim() === name);
    expect(found, name).toBeDefined();
    found!.click();
    await fixture.whenStable();
  };
  /** So much of somebody who stands still for six seconds and then walks, from so many seconds on. */
  const film = (fromMs: number, toMs: number) => {
    for (const { capturedMs, receivedMs, eye } of madeUpRun(standsThenWalks, { untilMs: toMs, lateMs: 40 }))
      if (capturedMs >= fromMs)
        recorder.take({
          found: true,
          eye: { x: eye![0], y: eye![1], z: eye![2] },
          capturedMs,
          receivedMs,
          timings: { cropMs: 1, detectMs: 1, landmarksMs: 1, totalMs: 3 },
        } as EyeSample);
  };

  beforeEach(async () => {
    shelved.length = stored.length = discarded.length = 0;
    reached = true;
    subject.set({ wallId: null, name: 'This screen', tuning: usualTuning });
    const runs = {
      shelve: (body: RunBody) => Promise.resolve(shelved.push(body) > 0),
      keep: (body: RunBody) => {
        if (!reached) return Promise.reject(new ApiFailure(0, { code: 'unreachable', message: 'Not reached.', remedy: '', reference: '' }));
        stored.push(body);
        return Promise.resolve({ id: body.id });
      },
      discard: (id: string) => Promise.resolve(void discarded.push(id)),
    };
    TestBed.configureTestingModule({
      providers: [
        provideZonelessChangeDetection(),
        provideRouter([]),
        RunRecorder,
        { provide: RunsStore, useValue: runs },
        { provide: BenchSubject, useValue: { subject } },
      ],
    });
    recorder = TestBed.inject(RunRecorder);
    fixture = TestBed.createComponent(RecordRun);
    fixture.componentRef.setInput('ready', true);
    await fixture.whenStable();
  });

  it('says as it stops that there is too little to judge, and goes on in the same run', async () => {
    await press('Start recording');
    film(0, 1200);
    await press('Stop recording');
    expect(text()).toContain('Too little to tune by');
    await press('Go on recording');
    film(1200, 14_000);
    await press('Stop recording');
    expect(text()).toContain('It can be tuned by');
    expect(text()).not.toContain('Too little');
    await press('Store the run');
    expect(text()).toContain('Replay it through other settings');
    expect(stored.map(({ samples }) => samples.length)).toEqual([420]);
    expect(new Set([...shelved, ...stored].map(({ id }) => id)).size).toBe(1);
  });

  it('keeps a run under the name just typed while the server is not reached, and stores it once the network is back', async () => {
    await press('Start recording');
    film(0, 9000);
    await press('Stop recording');
    reached = false;
    const name = (fixture.nativeElement as HTMLElement).querySelector('input')!;
    name.value = 'Stairs, dim';
    name.dispatchEvent(new Event('input'));
    await press('Store the run');
    expect(text()).toContain('stored by itself once the network is back');
    expect(shelved.at(-1)!.name).toBe('Stairs, dim');
    reached = true;
    window.dispatchEvent(new Event('online'));
    await fixture.whenStable();
    expect(stored.map(({ name }) => name)).toEqual(['Stairs, dim']);
  });

  it('asks before it discards, and stops where something else is put on the bench', async () => {
    await press('Start recording');
    film(0, 3000);
    subject.set({ wallId: 'w', name: 'Hall', tuning: usualTuning });
    await fixture.whenStable();
    expect(text()).not.toContain('Go on recording');
    await press('Discard, record another');
    expect(discarded).toEqual([]);
    await press('Discard now');
    expect(discarded.length).toBe(1);
    expect(shelved[0].wallId).toBeNull();
  });
});
