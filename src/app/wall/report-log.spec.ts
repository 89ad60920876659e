import type { WallReport } from '@oriel/shared/contracts/walls';
import { ReportLog, mostReports } from './report-log';

const report = (second: number): WallReport => ({
  at: new Date(second * 1000).toISOString(),
  framesPerS: 60,
  trackedPerS: 29,
  ladderStep: 1,
  ladderWords: 'landmarks',
  renderer: 'css',
  tracking: 'following',
  latencyMs: 40,
  temperatureC: null,
  lastError: null,
});

describe('ReportLog', () => {
  it('keeps the newest 200 through a night without a network', () => {
    const log = new ReportLog();
    for (let s = 0; s < 1000; s++) log.add(report(s));
    expect(log.reports).toHaveLength(mostReports);
    expect(log.reports.at(-1)).toEqual(report(999));
  });

  it('loses nothing that was added while others were sent', () => {
    const log = new ReportLog([report(1), report(2)]);
    const sending = [...log.reports];
    log.add(report(3));
    log.sent(sending);
    expect(log.reports).toEqual([report(3)]);
  });
});
