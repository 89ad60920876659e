import type { Page } from '@playwright/test';
import { expect } from './fixtures';

/** Waits until so many frames were drawn, however long a laden machine takes over them. */
export const framesPass = (page: Page, count: number): Promise<void> =>
  page.evaluate(async (left) => {
    for (let i = 0; i < left; i++) await new Promise(requestAnimationFrame);
  }, count);

/** What `read` comes to: its figure once another look, so many frames later, finds it moved by no more than `slack`. */
export async function atRest(page: Page, read: () => Promise<number>, slack: number, frames = 12): Promise<number> {
  let before = Infinity;
  const moved = async () => {
    await framesPass(page, frames);
    const now = await read();
    const by = Math.abs(now - before);
    before = now;
    return by;
  };
  await expect.poll(moved, { intervals: [1], timeout: 15_000 }).toBeLessThanOrEqual(slack);
  return before;
}
