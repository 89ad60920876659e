import { newWall } from '@oriel/shared/contracts/new-wall';
import type { Wall, WallReport } from '@oriel/shared/contracts/walls';
import { describeChange, reportLines, sayLong, stateOf } from './wall-words';

const now = new Date(2026, 2, 14, 17, 5);
const ago = (ms: number) => new Date(now.getTime() - ms).toISOString();
const report: WallReport = { at: ago(5000), framesPerS: 40.2, trackedPerS: 28.7, ladderStep: 0, ladderWords: 'landmarks, a guard on every frame', renderer: 'css', tracking: 'following', latencyMs: 61.4, temperatureC: 48.3, lastError: null };
const wall = (part: Partial<Wall>): Wall => ({
  id: '5d0c0f0e-6a0e-4a57-9d5e-0d1f4b0d9a01',
  householdId: '5d0c0f0e-6a0e-4a57-9d5e-0d1f4b0d9a02',
  setUp: newWall('Landing'),
  revision: 1,
  savedAt: ago(0),
  savedBy: 'Ilse',
  pairedAt: ago(1e7),
  heardAt: ago(4000),
  report,
  ...part,
});

describe('a wall in words', () => {
  it.each([
    ['Never paired', 'idle', wall({ pairedAt: null, heardAt: null, report: null })],
    ['No screen is paired; one was last heard at 17:04', 'idle', wall({ pairedAt: null })],
    ['Paired; its screen has not reported yet', 'idle', wall({ heardAt: null, report: null })],
    ['Showing October on the ridge, 29 faces and 40 frames a second', 'well', wall({})],
    ['Showing October on the ridge', 'well', wall({ report: null })],
    ['Showing October on the ridge, but following nobody: its computer is too slow at present', 'amiss', wall({ report: { ...report, ladderStep: 7, ladderWords: 'no tracking' } })],
    ['Silent for 3 hours (last heard 14:02)', 'amiss', wall({ heardAt: new Date(2026, 2, 14, 14, 2).toISOString() })],
    ['Silent for 2 days (last heard on 12 March at 14:02)', 'amiss', wall({ heardAt: new Date(2026, 2, 12, 14, 2).toISOString() })],
  ])('is “%s”', (words, tone, one) => {
    expect(stateOf(one, 'October on the ridge', now)).toEqual({ tone, words });
  });

  it('asks for a scene where none is chosen', () => {
    expect(stateOf(wall({}), null, now).words).toContain('choose a scene');
  });

  it('is not yet silent within the time the contract gives it', () => {
    expect(stateOf(wall({ heardAt: ago(90_000) }), 'A', now).tone).toBe('well');
    expect(stateOf(wall({ heardAt: ago(90_001) }), 'A', now).words).toMatch(/^Silent for 1 minute /);
  });

  it('tells how it follows, how late it is and how warm', () => {
    expect(reportLines(wall({}), now)).toEqual(['following: landmarks, a guard on every frame, 61 ms behind', '48 °C inside']);
    expect(reportLines(wall({ report: { ...report, temperatureC: null, latencyMs: null, ladderWords: '', ladderStep: 2 } }), now)).toEqual(['following: step 2 of the ladder']);
  });

  it('tells nothing of how a silent wall follows', () => {
    expect(reportLines(wall({ heardAt: ago(90_001) }), now)).toEqual([]);
  });

  it('says spans in their largest whole unit', () => {
    expect([59_999, 60_000, 3_599_999, 3_600_000, 86_400_000].map(sayLong)).toEqual(['59 seconds', '1 minute', '59 minutes', '1 hour', '1 day']);
  });

  it('tells only what changes of a zone', () => {
    const zone = { leftMm: -700, rightMm: 700, lowestMm: -250, highestMm: 250, nearestMm: 1200, farthestMm: 3200 };
    expect(describeChange(zone, { ...zone, nearestMm: 1430 })).toBe('begins 1.43 m away instead of 1.2 m');
    expect(describeChange(zone, { ...zone, leftMm: -600, nearestMm: 1500, highestMm: 150 })).toBe(
      'begins 1.5 m away instead of 1.2 m, is 1.3 m across instead of 1.4 m and is 0.4 m high instead of 0.5 m',
    );
  });
});
