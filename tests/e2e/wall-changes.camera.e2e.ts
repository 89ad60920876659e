import type { Page } from '@playwright/test';
import { expect, test } from './fixtures';
import { Desk } from './walls/desk';
import { pairedWall } from './walls/paired-wall';

/** When a screen first says that it shows what is asked for, on the clock that test and page share. */
const shownAt = (screen: Page, words: string): Promise<number> =>
  screen.evaluate(
    (name) =>
      new Promise<number>((resolve) => {
        const picture = document.querySelector('oriel-wall-picture .picture')!;
        const watch = new MutationObserver(() => {
          if (picture.getAttribute('aria-label') !== name) return;
          watch.disconnect();
          resolve(Date.now());
        });
        watch.observe(picture, { attributes: true, attributeFilter: ['aria-label'] });
      }),
    words,
  );

test('what is changed at the desk is seen on the wall within a second, as a median', async ({ page: screen, signedInPage, expectErrors }) => {
  // Sharper pictures of a scene on their way are not to be had once another is shown.
  expectErrors(/404.*\/api\/wall\/images/);
  const tuner = await signedInPage('tuner');
  await tuner.goto('/scenes');
  const desk = new Desk(tuner);
  const { wall, scene, other } = await pairedWall(desk, screen, 'Corridor', 'October on the ridge');
  await tuner.goto(`/walls/${wall.id}?step=scene`);
  const waits = [];
  for (const next of [other, scene, other, scene, other]) {
    const shown = shownAt(screen, `${next.document.name}, seen through the glass`);
    const choice = tuner.getByRole('radio', { name: next.document.name });
    await expect(choice).toBeEnabled();
    const before = Date.now();
    await choice.check();
    waits.push((await shown) - before);
  }
  // From the choice at the desk to the screen.
  expect(waits.toSorted((a, b) => a - b)[2], `ms: ${waits.join(', ')}`).toBeLessThan(1000);
});
