import { usualTuning } from '@oriel/shared/contracts/new-wall';
import { madeUpRun, standsThenWalks } from '@oriel/shared/replay/testing';
import type { FromReplay } from './replay-messages';
import { searchBoth, tryBoth } from './search-both';

describe('searching both directions', () => {
  it('tells how far it has come, rising, and then both results', () => {
    const said: FromReplay[] = [];
    searchBoth(
      {
        samples: madeUpRun(standsThenWalks, { untilMs: 10_000, lateMs: 40, across: 0.5, along: 5 }),
        today: usualTuning,
      },
      (message) => said.push(message),
    );
    const shares = said.flatMap((message) => (message.type === 'progress' ? [message.share] : []));
    expect(shares.length).toBeGreaterThan(20);
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    const last = said[said.length - 1];
    expect(last.type === 'done' && 'found' in last.across && 'found' in last.along).toBe(true);
  });

  it('tries today’s setting alone as the search does, and gives nothing for a direction that is missing', () => {
    const path = (tMs: number): [number, number, number] => [standsThenWalks(tMs)[0], 0, 1000];
    const asked = { samples: madeUpRun(path, { untilMs: 10_000 }), today: usualTuning };
    const said: FromReplay[] = [];
    searchBoth(asked, (message) => said.push(message));
    const last = said[said.length - 1];
    const { across, along } = tryBoth(asked);
    expect(last.type === 'done' && 'found' in last.across && last.across.found.today).toEqual(across);
    expect(along).toBeNull();
  });

  it('says what to record where one direction is missing', () => {
    const said: FromReplay[] = [];
    const path = (tMs: number): [number, number, number] => [standsThenWalks(tMs)[0], 0, 1000];
    searchBoth({ samples: madeUpRun(path, { untilMs: 10_000 }), today: usualTuning }, (message) => said.push(message));
    const last = said[said.length - 1];
    expect(last.type === 'done' && 'refusal' in last.along && last.along.refusal).toContain('toward the glass');
  });
});
