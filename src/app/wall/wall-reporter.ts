import { DOCUMENT, Injectable, inject } from '@angular/core';
import { reportFromWall } from '@oriel/shared/contracts/wall-screen';
import { WallReport } from '@oriel/shared/contracts/walls';
import * as z from 'zod';
import { Api } from '../core/api';
import { toApiFailure } from '../core/api-failure';
import { ReportLog } from './report-log';
import { SelfCare } from './self-care';

/** What the playing page knows of itself; the rest of a report is added here. */
export type WallFacts = Omit<WallReport, 'at' | 'temperatureC' | 'lastError'>;

const storageKey = 'oriel.wall.reports';
const collectMs = 10_000;
const sendMs = 30_000;

/** Reports every ten seconds, sent every thirty; kept while the server cannot be reached, over a reload too. */
@Injectable()
export class WallReporter {
  private readonly api = inject(Api);
  private readonly care = inject(SelfCare);
  private readonly window = inject(DOCUMENT).defaultView!;
  private readonly log = new ReportLog(this.takeKept());
  private sending = false;

  /** Collects and sends until the returned function is called. */
  start(facts: () => WallFacts): () => void {
    const collecting = setInterval(() => this.collect(facts()), collectMs);
    const sending = setInterval(() => void this.send(), sendMs);
    const leaving = () => localStorage.setItem(storageKey, JSON.stringify(this.log.reports));
    this.window.addEventListener('pagehide', leaving);
    return () => {
      clearInterval(collecting);
      clearInterval(sending);
      this.window.removeEventListener('pagehide', leaving);
    };
  }

  /** Takes a report down; a change that should not be missed may do so between the usual ones. */
  collect(facts: WallFacts): void {
    // No browser tells a page how warm its computer is.
    this.log.add({ at: new Date().toISOString(), ...facts, temperatureC: null, lastError: this.care.lastError });
  }

  private async send(): Promise<void> {
    const reports = [...this.log.reports];
    if (this.sending || reports.length === 0) return;
    this.sending = true;
    try {
      await this.api.call(reportFromWall, { body: { reports } });
      this.log.sent(reports);
    } catch (error) {
      // What the server does not take now it will not take later; what did not reach it waits.
      const { status } = toApiFailure(error);
      if (status === 400 || status === 413 || status === 422) this.log.sent(reports);
    } finally {
      this.sending = false;
    }
  }

  private takeKept(): WallReport[] {
    try {
      const kept = z.array(WallReport).safeParse(JSON.parse(localStorage.getItem(storageKey) ?? '[]'));
      return kept.success ? kept.data : [];
    } catch {
      return [];
    } finally {
      localStorage.removeItem(storageKey);
    }
  }
}
