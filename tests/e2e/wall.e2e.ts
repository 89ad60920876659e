import type { Page } from '@playwright/test';
import { reportFromWall } from '@oriel/shared/contracts/wall-screen';
import { expect, test } from './fixtures';
import { Desk } from './walls/desk';
import { hurried } from './walls/hurry';
import { pairedWall } from './walls/paired-wall';
import { codeOn, picturesOn, readyForOffline, shownLayers } from './walls/screen';

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
  const { wall, other } = await pairedWall(desk, screen, 'Hall', 'October on the ridge');
  await expect(label(screen)).toHaveAccessibleName(/October on the ridge/);
  expect((await desk.wall(wall.id)).pairedAt).not.toBeNull();
  await expectToReadWell(screen);

  await desk.change(wall.id, { sceneId: other.id });
  await expect(label(screen)).toHaveAccessibleName(`${other.document.name}, seen through the glass`);
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
  test.setTimeout(90_000);
  await screen.addInitScript(hurried);
  expectErrors(/ERR_INTERNET_DISCONNECTED/, /Failed to load resource/);
  const tuner = await signedInPage('tuner');
  await tuner.goto('/scenes');
  const desk = new Desk(tuner);
  const { wall } = await pairedWall(desk, screen, 'Landing', 'October on the ridge');
  await readyForOffline(screen);
  await context.setOffline(true);
  const from = Date.now();
  // What the server tells is thinned to the newest of every five seconds: in eleven of them one such slice lies wholly, whenever they begin.
  const longEnough = from + 11_000;
  await screen.waitForRequest((request) => request.url().endsWith(reportFromWall.path) && reportFromWall.body!.parse(request.postDataJSON()).reports.some(({ at }) => Date.parse(at) > longEnough));
  const until = Date.now();
  const during = async () => (await desk.reports(wall.id)).filter(({ at }) => Date.parse(at) > from && Date.parse(at) < until);
  expect(await during()).toEqual([]);
  await context.setOffline(false);
  await expect.poll(async () => (await during()).length, { timeout: 20_000 }).toBeGreaterThanOrEqual(1);
  const report = async () => (await desk.wall(wall.id)).report;
  await expect.poll(report, { timeout: 20_000 }).toMatchObject({ renderer: 'css', temperatureC: null, tracking: 'nobody' });
  expect((await report())!.framesPerS).toBeGreaterThan(0);
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
