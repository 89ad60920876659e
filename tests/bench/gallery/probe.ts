import type { Page } from '@playwright/test';
import { quantile, rounded } from '../tracking/statistics';

/** How frames followed each other while the sheet was scrolled, ms, and how the page did otherwise. */
export interface Scrolled {
  readonly frames: number;
  readonly medianMs: number;
  readonly p95Ms: number;
  readonly longestMs: number;
  /** Of a hundred frames, those longer than three of a screen at 60 frames a second. */
  readonly slowPct: number;
  readonly seconds: number;
}

/** What the sheet holds at rest. */
export interface Rest {
  /** Tiles in sight. */
  readonly tiles: number;
  /** Of those, without their picture half a second after the last movement. */
  readonly blank: number;
  /** Until every tile in sight had its picture, ms; null where some never came within ten seconds. */
  readonly wholeAfterMs: number | null;
}

type Probed = Window & { orielFrames: number[]; orielStop: boolean };

/** Begins to note when frames begin. */
export const watchFrames = (page: Page): Promise<void> =>
  page.evaluate(() => {
    const probed = window as unknown as Probed;
    probed.orielFrames = [];
    probed.orielStop = false;
    const note = (tMs: number): void => {
      probed.orielFrames.push(tMs);
      if (!probed.orielStop) requestAnimationFrame(note);
    };
    requestAnimationFrame(note);
  });

export async function framesSeen(page: Page): Promise<Scrolled> {
  const times = await page.evaluate(() => {
    const probed = window as unknown as Probed;
    probed.orielStop = true;
    return probed.orielFrames;
  });
  const intervals = times.slice(1).map((tMs, i) => tMs - times[i]);
  return {
    frames: intervals.length,
    medianMs: rounded(quantile(intervals, 0.5)),
    p95Ms: rounded(quantile(intervals, 0.95)),
    longestMs: rounded(Math.max(...intervals)),
    slowPct: rounded((100 * intervals.filter((ms) => ms > 50).length) / intervals.length),
    seconds: rounded((times[times.length - 1] - times[0]) / 1000),
  };
}

/** Waits for the pictures in sight. To be called as soon as the sheet has come to rest. */
export const rest = (page: Page): Promise<Rest> =>
  page.evaluate(async () => {
    const from = performance.now();
    const inSight = (): Element[] => {
      const box = document.querySelector('oriel-contact-sheet .scroller')!.getBoundingClientRect();
      return [...document.querySelectorAll('oriel-contact-sheet .tile')].filter((tile) => {
        const { top, bottom } = tile.getBoundingClientRect();
        return bottom > box.top && top < box.bottom;
      });
    };
    const blank = (): number => inSight().filter((tile) => !tile.querySelector('img.here')).length;
    const later = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));
    let wholeAfterMs: number | null = null;
    let afterHalfASecond: number | null = null;
    while (performance.now() - from < 10_000 && (wholeAfterMs === null || afterHalfASecond === null)) {
      const [sinceMs, missing] = [performance.now() - from, blank()];
      if (inSight().length > 0 && missing === 0) wholeAfterMs ??= Math.round(sinceMs);
      if (sinceMs >= 500) afterHalfASecond ??= missing;
      await later(20);
    }
    return { tiles: inSight().length, blank: afterHalfASecond ?? blank(), wholeAfterMs };
  });

/** Heap after a collection of garbage, MB, and elements and nodes of the page. */
export async function held(page: Page): Promise<{ heapMB: number; nodes: number; tiles: number }> {
  const session = await page.context().newCDPSession(page);
  await session.send('HeapProfiler.collectGarbage');
  const { usedSize } = await session.send('Runtime.getHeapUsage');
  const { nodes } = await session.send('Memory.getDOMCounters');
  await session.detach();
  return { heapMB: rounded(usedSize / 1e6), nodes, tiles: await page.locator('oriel-contact-sheet .tile').count() };
}
