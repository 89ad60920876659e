import type { Locator, Page } from '@playwright/test';
import type { Scene } from '@oriel/shared/contracts/scenes';
import { ask, demoScene } from './asking';
import { expect, test } from './fixtures';

/** A scene of this test's own: a copy of the demo's ridge. */
async function ownScene(page: Page): Promise<Scene> {
  await page.goto('/scenes');
  const ridge = await demoScene(page);
  const document = { ...ridge.document, name: `Ridge ${Date.now()}` };
  return (await ask<{ scene: Scene }>(page, 'POST', `/api/scenes/${ridge.id}/duplicates`, { document })).scene;
}

const read = async (page: Page, id: string) => (await ask<{ scene: Scene }>(page, 'GET', `/api/scenes/${id}`)).scene;
const depthOf = (scene: Scene, layer: string) => scene.document.layers.find(({ name }) => name === layer)?.depthMm;

async function compose(page: Page, scene: Scene): Promise<void> {
  await page.goto(`/compose/${scene.id}`);
  await expect(saveState(page)).toContainText(/revision \d/i);
  await expect(page.getByTestId('glass').locator('img')).toHaveCount(scene.document.layers.length);
}

const saveState = (page: Page) => page.getByTestId('save-state');
const depthSlider = (page: Page, layer: string) => page.getByTestId('plan').getByRole('slider', { name: `Depth of ${layer}` });
const depthField = (page: Page, layer: string) => page.getByRole('spinbutton', { name: `Depth of ${layer}` });

const figureIn = async (field: Locator) => Number(await field.getAttribute('aria-valuenow'));

async function typeDepth(page: Page, layer: string, mm: number): Promise<void> {
  await depthField(page, layer).fill(String(mm));
  await depthField(page, layer).press('Enter');
}

async function centreOf(locator: Locator): Promise<{ x: number; y: number }> {
  const box = await locator.boundingBox();
  if (!box) throw new Error('Not on the page');
  return { x: box.x + box.width / 2, y: box.y + box.height / 2 };
}

async function drag(page: Page, from: { x: number; y: number }, by: { x: number; y: number }): Promise<void> {
  await page.mouse.move(from.x, from.y);
  await page.mouse.down();
  await page.mouse.move(from.x + by.x, from.y + by.y, { steps: 8 });
  await page.mouse.up();
}

/** The glass once its pictures have come in their final sharpness. */
async function pictureOf(page: Page): Promise<Buffer> {
  await page.waitForLoadState('networkidle');
  await page.mouse.move(5, 5);
  return page.getByTestId('glass').screenshot({ animations: 'disabled' });
}

test('a layer dragged in the plan changes depth, and not one pixel of the picture from the home eye', async ({ signedInPage }) => {
  const page = await signedInPage('designer');
  const scene = await ownScene(page);
  await compose(page, scene);
  await page.getByRole('button', { name: /^Ridge/ }).click();
  const before = await pictureOf(page);

  await drag(page, await centreOf(depthSlider(page, 'Ridge')), { x: 0, y: -24 });
  await expect(depthSlider(page, 'Ridge')).not.toHaveAttribute('aria-valuenow', String(depthOf(scene, 'Ridge')));
  const depth = Number(await depthSlider(page, 'Ridge').getAttribute('aria-valuenow'));
  expect(depth).toBeGreaterThan(620);
  expect(depth % 10, 'round depths').toBe(0);
  expect((await pictureOf(page)).equals(before)).toBe(true);

  await expect(saveState(page)).toContainText('revision 2');
  expect(depthOf(await read(page, scene.id), 'Ridge')).toBe(depth);

  // From anywhere else the picture does change: what stayed the same above is not a picture that stands still.
  await page.getByRole('button', { name: 'Walk past' }).click();
  await page.getByRole('button', { name: 'Pause the walk' }).click();
  await page.getByRole('slider', { name: 'Place on the walk past' }).fill('0');
  expect((await pictureOf(page)).equals(before)).toBe(false);
  await page.getByRole('button', { name: 'Back to the home eye' }).click();
  expect((await pictureOf(page)).equals(before)).toBe(true);

  await page.keyboard.press('Control+z');
  await expect(depthSlider(page, 'Ridge')).toHaveAttribute('aria-valuenow', String(depthOf(scene, 'Ridge')));
});

test('depth by keyboard and by typing, place by keyboard; each step can be undone', async ({ signedInPage }) => {
  const page = await signedInPage('designer');
  const scene = await ownScene(page);
  await compose(page, scene);
  await page.getByRole('button', { name: /^Larches/ }).click();
  await depthSlider(page, 'Larches').focus();
  await page.keyboard.press('Shift+ArrowUp');
  await expect(depthSlider(page, 'Larches')).toHaveAttribute('aria-valuetext', '340 mm behind the glass');
  await page.keyboard.press('PageDown');
  await expect(depthSlider(page, 'Larches')).toHaveAttribute('aria-valuetext', '330 mm behind the glass');

  await typeDepth(page, 'Larches', -12.5);
  await expect(depthSlider(page, 'Larches')).toHaveAttribute('aria-valuetext', '12.5 mm in front of the glass');
  await depthField(page, 'Larches').fill('near');
  await depthField(page, 'Larches').press('Enter');
  await expect(page.getByRole('alert')).toHaveText('Write a figure, such as 180');
  await depthField(page, 'Larches').press('Escape');

  const across = page.getByRole('spinbutton', { name: 'Centre, right' });
  const x = await figureIn(across);
  await page.getByRole('button', { name: /^Place Larches/ }).focus();
  await page.keyboard.press('Shift+ArrowRight');
  await expect.poll(() => figureIn(across)).toBeCloseTo(x + 10, 6);
  await page.keyboard.press('Control+z');
  await expect.poll(() => figureIn(across)).toBeCloseTo(x, 6);
});

test('a layer is placed and sized in the elevation as far as the pointer goes', async ({ signedInPage }) => {
  const page = await signedInPage('designer');
  const scene = await ownScene(page);
  await compose(page, scene);
  const glass = await page.getByTestId('glass').boundingBox();
  if (!glass) throw new Error('No glass');
  const pxPerMm = glass.width / scene.document.glass.widthMm;
  const at = { x: glass.x + glass.width * 0.86, y: glass.y + glass.height * 0.75 };
  await page.mouse.click(at.x, at.y);
  await expect(page.getByRole('button', { name: /^Spruce and hedge/ })).toHaveAttribute('aria-expanded', 'true');
  const spruce = scene.document.layers.find(({ name }) => name === 'Spruce and hedge')!;
  const across = page.getByRole('spinbutton', { name: 'Centre, right' });

  await drag(page, at, { x: -60, y: 0 });
  await expect.poll(() => figureIn(across)).toBeCloseTo(spruce.placed.xMm - 60 / pxPerMm, 0);

  await page.keyboard.press('Control+z');
  await expect(across).toHaveAttribute('aria-valuenow', String(spruce.placed.xMm));
});

test('two people on one scene: neither is overwritten unasked', async ({ signedInPage, expectErrors }) => {
  expectErrors(/409/);
  const mine = await signedInPage('designer');
  const scene = await ownScene(mine);
  const hers = await signedInPage('owner');
  await compose(mine, scene);
  await compose(hers, scene);
  await typeDepth(hers, 'Ridge', 700);
  await expect(saveState(hers)).toContainText('revision 2');

  await typeDepth(mine, 'Ridge', 500);
  const dialog = mine.getByRole('dialog');
  await expect(dialog).toContainText('Ottilie Aldermoor saved this scene meanwhile');
  await dialog.getByRole('button', { name: 'Decide later' }).click();
  await expect(saveState(mine)).toContainText('Not saved: Ottilie Aldermoor saved revision 2 meanwhile');
  expect(depthOf(await read(mine, scene.id), 'Ridge')).toBe(700);

  await mine.getByRole('button', { name: 'Decide', exact: true }).click();
  await dialog.getByRole('button', { name: 'Take theirs' }).click();
  await expect(depthField(mine, 'Ridge')).toHaveValue('+700');
  await expect(saveState(mine)).toContainText('Saved');

  await typeDepth(hers, 'Ridge', 710);
  await expect(saveState(hers)).toContainText('revision 3');
  await typeDepth(mine, 'Ridge', 510);
  await dialog.getByRole('button', { name: 'Keep mine as a copy' }).click();
  await expect(mine).not.toHaveURL(new RegExp(scene.id));
  await expect(depthField(mine, 'Ridge')).toHaveValue('+510');
  expect(depthOf(await read(mine, scene.id), 'Ridge')).toBe(710);

  await compose(mine, scene);
  await typeDepth(hers, 'Ridge', 720);
  await expect(saveState(hers)).toContainText('revision 4');
  await typeDepth(mine, 'Ridge', 520);
  await dialog.getByRole('button', { name: 'Save mine over theirs' }).click();
  await expect(saveState(mine)).toContainText('revision 5');
  expect(depthOf(await read(mine, scene.id), 'Ridge')).toBe(520);
});

test('a lost network is shown and caught up', async ({ signedInPage, expectErrors }) => {
  expectErrors(/ERR_INTERNET_DISCONNECTED|Failed to load resource/);
  const page = await signedInPage('designer');
  const scene = await ownScene(page);
  await compose(page, scene);
  await page.context().setOffline(true);
  await typeDepth(page, 'Sky', 900);
  await expect(saveState(page)).toContainText('Not saved: no network, will save when it is back');
  await typeDepth(page, 'Sky', 880);
  await page.context().setOffline(false);
  await expect(saveState(page)).toContainText(/Saved .*, revision 2/);
  expect(depthOf(await read(page, scene.id), 'Sky')).toBe(880);
});

test('a closed tab loses nothing, with a network or without', async ({ signedInPage, expectErrors }) => {
  expectErrors(/ERR_INTERNET_DISCONNECTED|Failed to load resource/);
  const page = await signedInPage('designer');
  const context = page.context();
  const scene = await ownScene(page);

  await compose(page, scene);
  await typeDepth(page, 'Sky', 870);
  await page.close();
  const second = await context.newPage();
  await second.goto(`/compose/${scene.id}`);
  await expect(depthField(second, 'Sky')).toHaveValue('+870');
  await expect(saveState(second)).toContainText(/Saved .*, revision 2/);

  await context.setOffline(true);
  await typeDepth(second, 'Sky', 860);
  await second.close();
  await context.setOffline(false);
  const third = await context.newPage();
  await third.goto(`/compose/${scene.id}`);
  await expect(depthField(third, 'Sky')).toHaveValue('+860');
  await expect(saveState(third)).toContainText(/Saved .*, revision 3/);
  expect(depthOf(await read(third, scene.id), 'Sky')).toBe(860);
});

test('the title block names what is not clear, shows it, and the layers grow until it is', async ({ signedInPage }) => {
  const page = await signedInPage('designer');
  const scene = await ownScene(page);
  await compose(page, scene);
  const block = page.getByRole('region', { name: 'Title block' });
  await expect(block).toContainText('Clear from the whole viewing zone');
  await typeDepth(page, 'Sky', 1400);
  await expect(block).toContainText('Not clear');
  await block.getByRole('button', { name: /^Sky, .* edge: [\d.]+ mm short/ }).first().click();
  await expect(page.getByRole('button', { name: /^Sky/, expanded: true })).toBeVisible();
  await expect(page.getByRole('button', { name: 'Back to the home eye' })).toBeVisible();
  await page.getByRole('button', { name: 'Grow to cover the zone' }).click();
  await expect(block).toContainText('Clear from the whole viewing zone');
});

test('a viewer looks and walks past, and can change nothing', async ({ signedInPage }) => {
  const designer = await signedInPage('designer');
  const scene = await ownScene(designer);
  const page = await signedInPage('viewer');
  await compose(page, scene);
  await expect(page.getByRole('button', { name: 'Add layers' })).toHaveCount(0);
  await expect(depthField(page, 'Ridge')).not.toBeEditable();
  await drag(page, await centreOf(depthSlider(page, 'Ridge')), { x: 0, y: -24 });
  await expect(depthSlider(page, 'Ridge')).toHaveAttribute('aria-valuenow', String(depthOf(scene, 'Ridge')));
  await page.getByRole('button', { name: 'Walk past' }).click();
  await expect(page.getByRole('slider', { name: 'Place on the walk past' })).toBeVisible();
});

for (const [name, size, scheme] of [
  ['a desk by day', { width: 1440, height: 900 }, 'light'],
  ['a desk by evening', { width: 1440, height: 900 }, 'dark'],
  ['a tablet', { width: 1024, height: 768 }, 'light'],
  ['a phone', { width: 390, height: 844 }, 'dark'],
] as const) {
  test(`the composer reads well on ${name}, and nothing runs off the page`, async ({ signedInPage, expectAccessible }) => {
    const page = await signedInPage('designer');
    await page.setViewportSize(size);
    await page.emulateMedia({ colorScheme: scheme });
    const scene = await ownScene(page);
    await page.goto(`/compose/${scene.id}`);
    await expect(page.getByTestId('plan').getByRole('slider')).toHaveCount(scene.document.layers.length);
    if (size.width < 700) await page.getByRole('button', { name: /in the ledger/ }).click();
    await page.getByRole('button', { name: /^Larches/ }).click();
    await expect(page.getByText(/mm on the glass from one end/)).toBeVisible();
    await expectAccessible(page);
    const beyond = await page.evaluate(() => [document.documentElement.scrollWidth - innerWidth, document.documentElement.scrollHeight - innerHeight]);
    expect(Math.max(...beyond)).toBeLessThanOrEqual(0);
  });
}
