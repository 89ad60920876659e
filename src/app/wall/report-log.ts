import type { WallReport } from '@oriel/shared/contracts/walls';

/** About half an hour of reports, one every ten seconds; as many as the server takes at once. */
export const mostReports = 200;

/** Reports that wait to be sent, the newest 200. */
export class ReportLog {
  private waiting: WallReport[];

  constructor(kept: readonly WallReport[] = []) {
    this.waiting = kept.slice(-mostReports);
  }

  get reports(): readonly WallReport[] {
    return this.waiting;
  }

  add(report: WallReport): void {
    this.waiting.push(report);
    if (this.waiting.length > mostReports) this.waiting.shift();
  }

  /** Takes out what was sent; what was added meanwhile stays. */
  sent(reports: readonly WallReport[]): void {
    this.waiting = this.waiting.filter((report) => !reports.includes(report));
  }
}
