import { usualTuning } from '@oriel/shared/contracts/new-wall';
import { csvOf, fileNameOf, jsonOf } from './run-files';
import type { WholeRun } from './runs-store';

const whole = (name: string): WholeRun => ({
  run: {
    id: '00000000-0000-4000-8000-000000000001',
    name,
    wallId: null,
    machine: 'one',
    tuning: usualTuning,
    recordedAt: '2026-01-05T10:00:00Z',
    recordedBy: 'Maud',
    durationMs: 33,
    sampleCount: 2,
    frameIntervalP50Ms: 16.7,
    frameIntervalP95Ms: 17,
  },
  samples: [
    { capturedMs: -40, receivedMs: 0, eye: [-12.5, 3, 1000], cropMs: 1, detectMs: 0, landmarksMs: 6, totalMs: 7.5 },
    { capturedMs: -7, receivedMs: 33, eye: null, cropMs: 1, detectMs: 4, landmarksMs: 0, totalMs: 5 },
  ],
});

describe('a run as CSV (RFC 4180)', () => {
  it('has a line a sample, ended by CRLF, empty where nobody was; figures stay figures', () => {
    expect(csvOf(whole('Hall'))).toBe(
      'run,captured_ms,received_ms,eye_x_mm,eye_y_mm,eye_z_mm,crop_ms,detect_ms,landmarks_ms,total_ms\r\n' +
        'Hall,-40,0,-12.5,3,1000,1,0,6,7.5\r\n' +
        'Hall,-7,33,,,,1,4,0,5\r\n',
    );
  });

  it('leaves out when a frame was captured where that is not known', () => {
    const { run, samples } = whole('Hall');
    const unknown = samples.map((sample) => ({ ...sample, capturedMs: sample.receivedMs }));
    expect(csvOf({ run, samples: unknown })).toContain('\r\nHall,,33,,,,1,4,0,5\r\n');
  });

  it.each([
    ['=HYPERLINK("x")', `"'=HYPERLINK(""x"")"`],
    ['+1', `'+1`],
    ['-1', `'-1`],
    ['@x', `'@x`],
    ['a,b', '"a,b"'],
    ['say "so"', '"say ""so"""'],
    ['two\nlines', '"two\nlines"'],
  ])('writes %s so that no spreadsheet calculates it or loses its place', (name, field) => {
    expect(csvOf(whole(name)).split('\r\n')[2].startsWith(`${field},`)).toBe(true);
  });
});

it('as JSON holds everything', () => {
  const { run, samples } = JSON.parse(jsonOf(whole('Hall'))) as WholeRun;
  expect({ run, samples }).toEqual(whole('Hall'));
});

it('gives file names that every system takes', () => {
  expect(fileNameOf('Hall: 5/1 <b>', 'csv')).toBe('Hall 51 b.csv');
  expect(fileNameOf('../..', 'json')).toBe('run.json');
});
