import sharp from 'sharp';
import { inProject } from '../../scripts/project.mjs';
import { expect, test } from './fixtures';

const ridge = inProject('assets', 'demo', 'photos', 'Ridge in October (Aitzol Berasategi, CC BY 4.0, resized).jpg');
const picture = async (name: string, colour: string) => ({
  name,
  mimeType: 'image/png',
  buffer: await sharp({ create: { width: 900, height: 600, channels: 3, background: colour } })
    .composite([{ input: Buffer.from(`<svg width="900" height="600"><text x="40" y="300" font-size="90">${name} ${Math.random()}</text></svg>`) }])
    .png()
    .toBuffer(),
});
const upload = 'input[type=file]:not([webkitdirectory])';

test('several photos are uploaded at once, found by name, binned and put back', async ({ signedInPage, expectToReadWell, expectErrors }) => {
  expectErrors(/415/);
  const page = await signedInPage('designer');
  await page.goto('/photos');
  const names = ['harbour', 'garden'].map((name) => `${name}-${Date.now()}.png`);
  const files = [await picture(names[0], '#335577'), await picture(names[1], '#557733')];
  await page.locator(upload).setInputFiles([...files, { name: 'letter.jpg', mimeType: 'image/jpeg', buffer: Buffer.from('Dear Oriel') }]);
  await expect(page.getByText('2 kept, 1 refused')).toBeVisible();
  await expect(page.getByText(/not a picture/)).toBeVisible();
  const tile = page.getByRole('button', { name: new RegExp(names[0]) });
  await expect(tile.locator('img.here')).toBeVisible({ timeout: 30_000 });
  await expectToReadWell(page);

  await page.locator(upload).setInputFiles([files[0]]);
  await expect(page.getByText('you have this one already')).toBeVisible();

  await page.getByLabel('Search photos').fill(names[1]);
  await expect(page.getByRole('button', { name: new RegExp(names[1]) }).first()).toBeVisible();
  await expect(tile).toHaveCount(0);
  await page.getByRole('checkbox', { name: `Select ${names[1]}` }).click();
  await page.getByRole('button', { name: 'Move to the bin' }).click();
  await expect(page.getByText('No photo answers')).toBeVisible();

  await page.goto('/photos/bin');
  await page.getByRole('checkbox', { name: `Select ${names[1]}` }).click();
  await expectToReadWell(page);
  await page.getByRole('button', { name: 'Put back' }).click();
  await expect(page.getByRole('checkbox', { name: `Select ${names[1]}` })).toHaveCount(0);
  await page.goto('/photos');
  await expect(page.getByRole('checkbox', { name: `Select ${names[1]}` })).toBeVisible();
});

test('an upload that loses the network goes on when it is back', async ({ signedInPage, expectErrors }) => {
  expectErrors(/ERR_/, /Failed to load resource/);
  const page = await signedInPage('designer');
  await page.goto('/photos');
  await page.route('**/photos', (route) => (route.request().method() === 'POST' ? route.abort() : route.continue()));
  const file = await picture(`interrupted-${Date.now()}.png`, '#773355');
  await page.locator(upload).setInputFiles([file]);
  await expect(page.getByText(/interrupted; goes on/)).toBeVisible();
  await page.unroute('**/photos');
  await expect(page.getByText('1 kept')).toBeVisible({ timeout: 20_000 });
});

test('a real photograph is looked at and becomes a scene', async ({ signedInPage, expectToReadWell }) => {
  const page = await signedInPage('designer');
  await page.goto('/photos');
  await page.locator(upload).setInputFiles([ridge]);
  await expect(page.getByText(/you have this one already|1 kept/)).toBeVisible({ timeout: 30_000 });
  const tile = page.getByRole('button', { name: /Ridge/ }).first();
  await expect(tile.locator('img.here')).toBeVisible({ timeout: 30_000 });
  await tile.click();
  await expect(page.getByRole('button', { name: 'The one after' })).toBeVisible();
  await expectToReadWell(page);
  await page.getByRole('button', { name: 'Make a scene' }).click();
  await expect(page).toHaveURL(/\/compose\//);
});

test('a viewer looks but has no way to change', async ({ signedInPage }) => {
  const page = await signedInPage('viewer');
  await page.goto('/photos');
  await expect(page.getByRole('heading', { name: 'Photos' })).toBeVisible();
  await expect(page.getByRole('button', { name: 'Upload photos' })).toHaveCount(0);
  await page.goto('/scenes');
  await expect(page.getByRole('heading', { name: 'October on the ridge' })).toBeVisible();
  await expect(page.getByRole('button', { name: 'New scene' })).toHaveCount(0);
});
