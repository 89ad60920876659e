import type { FacePose } from '../video/face-path';
import { makeWall, wallNow } from './bench/household';
import { expect, test } from './fixtures';

/** Four seconds still, then six from side to side, and so on over again. */
const poses: FacePose[] = [
  ...Array.from({ length: 120 }, () => ({ segment: 'still', on: true, x: 320, y: 220, ipd: 62, rollDeg: 0 })),
  ...Array.from({ length: 180 }, (_, i) => ({
    segment: 'walks',
    on: true,
    x: 320 + 150 * Math.sin((2 * Math.PI * 2 * i) / 180),
    y: 220,
    ipd: 62,
    rollDeg: 0,
  })),
];
test.use({ filmedFace: { name: 'bench', poses } });

test('live figures, landmarks on request, a run recorded while the network is gone, stored, replayed and put on the wall', async ({
  signedInPage,
  expectErrors,
}) => {
  test.setTimeout(180_000);
  const page = await signedInPage('tuner');
  await page.goto('/scenes');
  const wall = await makeWall(page, `Stairs ${Math.random().toString(36).slice(2, 8)}`);
  await page.goto('/bench');
  await page.getByLabel('On the bench').click();
  await page.getByRole('option', { name: wall.setUp.name }).click();

  await expect(page.locator('video')).toHaveCount(0);
  await page.getByRole('button', { name: 'Start the camera' }).click();
  await expect(page.getByText('Following somebody.')).toBeVisible({ timeout: 60_000 });
  await expect(page.getByText(/^\d+ s$/)).toBeVisible();
  const ladder = page.locator('oriel-instrument').filter({ has: page.getByRole('heading', { name: 'Ladder' }) });
  await expect(ladder).toContainText(/of 8: .*median step \d/);
  await expect(page.locator('video')).toHaveCount(0);
  await page.getByRole('button', { name: 'Show the camera picture' }).click();
  await expect(page.locator('oriel-camera-picture video')).toBeVisible();
  const drawn = () =>
    page.locator('oriel-camera-picture canvas').evaluate((canvas: HTMLCanvasElement) => {
      const { data } = canvas.getContext('2d')!.getImageData(0, 0, canvas.width, canvas.height);
      return data.reduce((count, value, i) => count + (i % 4 === 3 && value > 0 ? 1 : 0), 0);
    });
  await expect.poll(drawn, { timeout: 10_000 }).toBeGreaterThan(300);
  await page.getByRole('button', { name: 'Hide the camera picture' }).click();
  await expect(page.locator('video')).toHaveCount(0);

  await page.getByRole('button', { name: 'Start recording' }).click();
  await expect(page.getByRole('timer')).toContainText('left of ten minutes');
  await page.waitForTimeout(1200);
  await page.getByRole('button', { name: 'Stop recording' }).click();
  await expect(page.getByText('Too little to tune by')).toBeVisible();
  await page.getByRole('button', { name: 'Go on recording' }).click();
  await page.waitForTimeout(22_000);
  await page.getByRole('button', { name: 'Stop recording' }).click();
  await expect(page.getByText('It can be tuned by')).toBeVisible();

  expectErrors(/ERR_INTERNET_DISCONNECTED|Failed to load resource/);
  await page.context().setOffline(true);
  const name = `Recorded ${Math.random().toString(36).slice(2, 8)}`;
  await page.getByLabel('Name of the run').fill(name);
  await page.getByRole('button', { name: 'Store the run' }).click();
  await expect(page.getByRole('alert')).toContainText('cannot be reached');
  await expect(page.getByText('stored by itself once the network is back')).toBeVisible();
  // The tab is closed meanwhile: the run waits in the browser, under its name.
  const runs = await page.context().newPage();
  await page.close();
  await page.context().setOffline(false);
  await runs.goto('/bench/runs');
  await expect(runs.getByRole('heading', { name: 'Kept in this browser' })).toBeVisible();
  await runs.getByRole('button', { name: 'Store now' }).click();
  await expect(runs.getByRole('heading', { name: 'Kept in this browser' })).toHaveCount(0);
  await runs.getByRole('link', { name, exact: true }).click();

  const put = runs.getByRole('button', { name: `Put balanced on ${wall.setUp.name}` });
  await expect(put).toBeVisible({ timeout: 90_000 });
  await put.click();
  await expect(runs.getByText('from now on')).toBeVisible();
  expect((await wallNow(runs, wall.id)).revision).toBe(wall.revision + 1);
});

// What is measured where a mirror is held: bench-mirror.e2e.ts.
test('the mirror test says so when the camera sees no blink, and stops at once on Escape', async ({ signedInPage }) => {
  test.setTimeout(120_000);
  const page = await signedInPage('tuner');
  await page.goto('/bench/mirror');
  await expect(page.getByText('The screen will blink.')).toBeVisible();
  const start = page.getByRole('button', { name: 'start' });
  await start.click();
  await expect(page.locator('.blinking')).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(page.locator('.blinking')).toHaveCount(0);
  await start.click();
  await expect(page.getByRole('heading', { name: 'The camera saw no blink' })).toBeVisible({ timeout: 60_000 });
  await expect(page.getByText('no mirror in it that shows this screen')).toBeVisible();
  await expect(page.getByText('nothing is changed')).toBeVisible();
});
