import { readdir } from 'node:fs/promises';
import { inProject } from '../../scripts/project.mjs';
import { expect, test } from './fixtures';
import { codeOn, keepsItsPage } from './walls/screen';
import { updatable } from './walls/updating';

/** A wall asks each hour whether there is a new version; here each second. */
function everyHourIsASecond(): void {
  const real = window.setInterval.bind(window);
  window.setInterval = ((act: () => void, everyMs = 0) => real(act, everyMs >= 3_600_000 ? 1000 : everyMs)) as typeof window.setInterval;
}

test('a wall takes up a new version by itself, and keeps none of what only other pages need', async ({ page: screen, baseURL, expectErrors }) => {
  test.setTimeout(120_000);
  // Lines to a server that is closed.
  expectErrors(/Failed to load resource/);
  const product = await updatable(baseURL!);
  try {
    await screen.addInitScript(everyHourIsASecond);
    await screen.goto(`${product.url}/wall`);
    await codeOn(screen);
    await keepsItsPage(screen);
    const scripts = await screen.evaluate(async () => {
      const urls = await Promise.all((await caches.keys()).map(async (name) => (await (await caches.open(name)).keys()).map(({ url }) => new URL(url).pathname)));
      return urls.flat().filter((path) => path.endsWith('.js'));
    });
    const built = (await readdir(inProject('dist', 'web'))).filter((name) => name.endsWith('.js'));
    expect(scripts.length, `scripts kept of ${built.length}`).toBeGreaterThan(5);
    expect(scripts.length, `scripts kept of ${built.length}`).toBeLessThan(built.length / 2);

    product.publish('en-IE');
    await expect(screen.locator('html')).toHaveAttribute('lang', 'en-IE', { timeout: 60_000 });
    await codeOn(screen);
  } finally {
    await product.close();
  }
});
