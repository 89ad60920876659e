import type { Page } from '@playwright/test';
import { expect, test } from './fixtures';
import { hurried } from './walls/hurry';
import { Desk } from './walls/desk';
import { codeOn, picturesOn, readyForOffline, shownLayers } from './walls/screen';

/** A screen in a context of its own, paired with a new wall that shows this scene. */
async function pairedWall(desk: Desk, screen: Page, name: string, sceneName: string) {
  const scenes = await desk.scenes();
  const scene = scenes.find(({ document }) => document.name === sceneName)!;
  // Of the demo's own, for others come and go meanwhile.
  const other = scenes.find(({ document }) => document.name === 'Seeds before the wind')!;
  const wall = await desk.newWall(name, scene.id);
  await screen.goto('/wall');
  await desk.pair(wall.id, await codeOn(screen));
  await expect(shownLayers(screen)).toHaveCount(scene.document.layers.length, { timeout: 20_000 });
  return { wall, scene, other };
}

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

const label = (page: Page) => page.getByRole('img', { name: /seen through the glass/ });

test('a new screen shows a code, is paired from the desk, and follows what is changed there', async ({ page: screen, signedInPage, expectToReadWell, expectErrors }) => {
  // Sharper pictures of a scene on their way are not to be had once another is shown.
  expectErrors(/404.*\/api\/wall\/images/);
  const tuner = await signedInPage('tuner');
  await tuner.goto('/scenes');
  const desk = new Desk(tuner);

  await screen.goto('/wall');
  expect(await codeOn(screen)).toMatch(/^[2-9A-HJ-NP-Z]{6}$/);
  await expect(screen.getByText(/Good for (10|9) minutes/)).toBeVisible();
  await expect(screen.getByRole('img', { name: new RegExp(`/walls\\?code=${await codeOn(screen)}$`) })).toBeVisible();
  const { wall, scene, other } = await pairedWall(desk, screen, 'Hall', 'October on the ridge');
  await expect(label(screen)).toHaveAccessibleName(/October on the ridge/);
  expect((await desk.wall(wall.id)).pairedAt).not.toBeNull();
  await expectToReadWell(screen);

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
  await expect(shownLayers(screen)).toHaveCount(other.document.layers.length);

  await desk.change(wall.id, { sceneId: null });
  await expect(screen.getByText('Nothing is chosen to be shown on Hall.')).toBeVisible();
  await expect(shownLayers(screen)).toHaveCount(0);
  await expectToReadWell(screen);

  await desk.unpair(wall.id);
  await codeOn(screen);
  expect(await screen.evaluate(async () => [localStorage.getItem('oriel.wall'), await caches.has('oriel-wall-pictures')])).toEqual([null, false]);
});

test('a screen that starts without a network shows its picture, and hears of changes when the network is back', async ({ page: screen, context, signedInPage, expectErrors }) => {
  expectErrors(/ERR_INTERNET_DISCONNECTED/, /Failed to load resource/);
  const tuner = await signedInPage('tuner');
  await tuner.goto('/scenes');
  const desk = new Desk(tuner);
  const { wall, scene, other } = await pairedWall(desk, screen, 'Stairs', 'October on the ridge');
  await readyForOffline(screen);
  const pictures = await picturesOn(screen);
  expect(pictures.some((address) => !address.endsWith('/320'))).toBe(true);

  await context.setOffline(true);
  const afresh = await context.newPage();
  await screen.close();
  await afresh.goto('/wall');
  await expect(shownLayers(afresh)).toHaveCount(scene.document.layers.length);
  await expect.poll(() => picturesOn(afresh)).toEqual(pictures);

  await desk.change(wall.id, { sceneId: other.id });
  await context.setOffline(false);
  await expect(label(afresh)).toHaveAccessibleName(`${other.document.name}, seen through the glass`);
});

test('reports reach the desk, those of the time without a network too', async ({ page: screen, context, signedInPage, expectErrors }) => {
  await screen.addInitScript(hurried);
  expectErrors(/ERR_INTERNET_DISCONNECTED/, /Failed to load resource/);
  const tuner = await signedInPage('tuner');
  await tuner.goto('/scenes');
  const desk = new Desk(tuner);
  const { wall } = await pairedWall(desk, screen, 'Landing', 'October on the ridge');
  await context.setOffline(true);
  const from = Date.now();
  await screen.waitForTimeout(3500);
  const during = async () => (await desk.reports(wall.id)).filter(({ at }) => Date.parse(at) > from && Date.parse(at) < from + 3500);
  expect(await during()).toEqual([]);
  await context.setOffline(false);
  await expect.poll(async () => (await during()).length, { timeout: 20_000 }).toBeGreaterThanOrEqual(2);
  const { report } = await desk.wall(wall.id);
  expect(report).toMatchObject({ renderer: 'css', temperatureC: null, tracking: 'nobody' });
  expect(report!.framesPerS).toBeGreaterThan(0);
});

test('an ordinary page registers no service worker, and after a wall was shown in the same browser it still comes from the server', async ({ page }) => {
  await page.goto('/sign-in');
  expect(await page.evaluate(async () => (await navigator.serviceWorker.getRegistrations()).length)).toBe(0);
  await page.goto('/wall');
  await page.waitForFunction(() => navigator.serviceWorker.controller !== null, undefined, { timeout: 60_000 });
  const [reply] = await Promise.all([page.waitForResponse((response) => response.url().endsWith('/sign-in')), page.goto('/sign-in')]);
  expect(reply.status()).toBe(200);
  const kept = await page.evaluate(async () => {
    const urls = await Promise.all((await caches.keys()).map(async (name) => (await (await caches.open(name)).keys()).map(({ url }) => new URL(url).pathname)));
    return urls.flat();
  });
  expect(kept.filter((path) => /^\/(api|mail|health|ready)/.test(path))).toEqual([]);
});
