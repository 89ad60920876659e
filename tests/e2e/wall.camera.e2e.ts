import type { Page } from '@playwright/test';
import type { FacePose } from '../video/face-path';
import { expect, test } from './fixtures';
import { Desk } from './walls/desk';
import { codeOn, placeOf, readyForOffline, shownLayers } from './walls/screen';
import { plugged, unplug } from './walls/unplugging';

/** Someone who sways before the camera, from one side to the other in three seconds. */
const poses: FacePose[] = Array.from({ length: 90 }, (_, i) => ({
  segment: 'sway',
  on: true,
  x: 320 + 120 * Math.sin((2 * Math.PI * i) / 90),
  y: 230,
  ipd: 58,
  rollDeg: 0,
}));
test.use({ filmedFace: { name: 'sways', poses } });

const figures = (page: Page) => page.locator('oriel-read-out dd');

/** How far the nearest layer moves in six seconds, px: about 14 with this film; drift, which is slower, moves it by 5 at most. */
async function sweep(page: Page): Promise<number> {
  const places: number[] = [];
  for (let look = 0; look < 40; look++) {
    places.push(await placeOf(page));
    await page.waitForTimeout(150);
  }
  return Math.max(...places) - Math.min(...places);
}

const follows = (page: Page) => expect.poll(async () => Number(await figures(page).nth(1).innerText()), { timeout: 60_000 }).toBeGreaterThan(5);

test('a wall follows whoever passes, goes on without a network, and comes back when its camera was unplugged', async ({ page: screen, context, signedInPage, expectErrors }) => {
  test.setTimeout(240_000);
  expectErrors(/ERR_INTERNET_DISCONNECTED/, /Failed to load resource/);
  await context.addInitScript(plugged);
  const tuner = await signedInPage('tuner');
  await tuner.goto('/scenes');
  const desk = new Desk(tuner);
  const ridge = (await desk.scenes()).find(({ document }) => document.name === 'October on the ridge')!;
  const wall = await desk.newWall('Gallery', ridge.id);
  await screen.goto('/wall');
  await desk.pair(wall.id, await codeOn(screen));
  await expect(shownLayers(screen)).toHaveCount(ridge.document.layers.length, { timeout: 20_000 });
  await screen.keyboard.press('i');
  await follows(screen);
  const followed = await sweep(screen);
  expect(followed).toBeGreaterThan(9);

  await unplug(screen);
  await expect.poll(async () => Number(await figures(screen).nth(1).innerText())).toBe(0);
  await follows(screen);

  await readyForOffline(screen);
  await context.setOffline(true);
  const afresh = await context.newPage();
  await screen.close();
  await afresh.goto('/wall');
  await expect(shownLayers(afresh)).toHaveCount(ridge.document.layers.length);
  await afresh.keyboard.press('i');
  await follows(afresh);
  expect(await sweep(afresh)).toBeGreaterThan(followed / 2);
});
