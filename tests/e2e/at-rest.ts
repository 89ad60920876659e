import type { Page } from '@playwright/test';
import { expect } from './fixtures';

/** What `read` comes to: its figure once a look `everyMs` later finds it moved by no more than `slack`. */
export async function atRest(read: () => Promise<number>, slack: number, everyMs = 150): Promise<number> {
  let before = Infinity;
  const moved = async () => {
    const now = await read();
    const by = Math.abs(now - before);
    before = now;
    return by;
  };
  await expect.poll(moved, { intervals: [everyMs], timeout: 15_000 }).toBeLessThanOrEqual(slack);
  return before;
}

/** Waits until so many frames were drawn. */
export const framesPass = (page: Page, count: number): Promise<void> =>
  page.evaluate(async (left) => {
    for (let i = 0; i < left; i++) await new Promise(requestAnimationFrame);
  }, count);
