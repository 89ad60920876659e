import type { Page } from '@playwright/test';

const stepMs = 40;
const wheelPx = 700;
/** Where the thumb is taken hold of, below the top of the sheet, and from the right edge; px. */
const grip = { downPx: 24, inPx: 6 };

interface Place {
  readonly topPx: number;
  readonly viewPx: number;
  readonly heightPx: number;
}

const place = (page: Page): Promise<Place> =>
  page.locator('oriel-contact-sheet .scroller').evaluate(({ scrollTop, clientHeight, scrollHeight }) => ({ topPx: scrollTop, viewPx: clientHeight, heightPx: scrollHeight }));

const atEnd = ({ topPx, viewPx, heightPx }: Place): boolean => topPx + viewPx >= heightPx - 2;

export const toTop = (page: Page): Promise<void> => page.locator('oriel-contact-sheet .scroller').evaluate((scroller) => scroller.scrollTo(0, 0));

/** Turns the wheel as a hand does, as fast as it goes, until the last photo; calls `midway` once on the way, while still turning. */
export async function byWheel(page: Page, midway: () => Promise<unknown>): Promise<{ px: number }> {
  const box = (await page.locator('oriel-contact-sheet .scroller').boundingBox())!;
  await page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
  let taken: Promise<unknown> | null = null;
  for (let still = 0; still < 50; ) {
    const before = await place(page);
    await page.mouse.wheel(0, wheelPx);
    await page.waitForTimeout(stepMs);
    if (before.topPx > 60_000) taken ??= midway();
    still = atEnd(await place(page)) ? still + 1 : 0;
  }
  await taken;
  return { px: (await place(page)).topPx };
}

/** Drags the thumb of the scroll bar down and up again, the second time at one go. @throws Error where the sheet did not follow. */
export async function byScrollBar(page: Page, midway: () => Promise<unknown>): Promise<{ px: number }> {
  const box = (await page.locator('oriel-contact-sheet .scroller').boundingBox())!;
  const x = box.x + box.width - grip.inPx;
  const [top, bottom] = [box.y + grip.downPx, box.y + box.height - grip.downPx];
  await page.mouse.move(x, top);
  await page.mouse.down();
  for (let i = 1; i <= 100; i++) {
    await page.mouse.move(x, top + ((bottom - top) * i) / 100);
    await page.waitForTimeout(stepMs);
    if (i === 50) await midway();
  }
  const { topPx } = await place(page);
  for (let i = 9; i >= 4; i--) {
    await page.mouse.move(x, top + ((bottom - top) * i) / 10);
    await page.waitForTimeout(stepMs);
  }
  await page.mouse.up();
  if (topPx < 10 * box.height) throw new Error(`The scroll bar was dragged to its end, and the sheet went only ${topPx} px.`);
  return { px: topPx };
}
