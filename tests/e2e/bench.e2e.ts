import { readFile } from 'node:fs/promises';
import type { Page } from '@playwright/test';
import { keepMadeUpRun, makeWall, wallNow } from './bench/household';
import { expect, test } from './fixtures';

const put = (page: Page, wish: string) => page.getByRole('button', { name: `Put ${wish} on` });
const unique = () => Math.random().toString(36).slice(2, 8);

test('only owners and tuners find the bench', async ({ signedInPage }) => {
  const page = await signedInPage('viewer');
  for (const place of ['/bench', '/bench/runs']) {
    await page.goto(place);
    await expect(page.getByRole('heading', { name: 'The bench is for owners and tuners' })).toBeVisible();
  }
  await expect(page.getByRole('link', { name: 'Bench' })).toHaveCount(0);
});

test('a run is replayed through other settings, and the wished one put on the wall; another’s save is not written over', async ({
  signedInPage,
  expectErrors,
}) => {
  test.setTimeout(120_000);
  const page = await signedInPage('tuner');
  await page.goto('/scenes');
  const wall = await makeWall(page, `Landing ${unique()}`);
  const runId = await keepMadeUpRun(page, `Made up ${unique()}`, wall.id);
  await page.goto(`/bench/runs/${runId}`);
  await expect(page.getByRole('heading', { name: 'From side to side' })).toBeVisible({ timeout: 60_000 });
  await page.getByRole('radio', { name: 'Calmer' }).click();
  await put(page, 'calmer').click();
  await expect(page.getByText(`${wall.setUp.name} follows with this from now on.`)).toBeVisible();
  await expect(page.getByText(/^Cutoff at rest, side to side: [\d.]+ Hz → [\d.]+ Hz$/)).toBeVisible();
  const after = await wallNow(page, wall.id);
  expect(after.revision).toBe(wall.revision + 1);
  expect(after.setUp.tuning.filter).not.toEqual(wall.setUp.tuning.filter);
  expect({ ...after.setUp, tuning: null, followingBefore: null }).toEqual({ ...wall.setUp, tuning: null });
  // Today's figures follow at once, and a later visit still offers the way back and the wish.
  const cutoffs = page.getByRole('row', { name: /^Cutoff at rest/ }).first();
  const figures = async () => (await cutoffs.getByRole('cell').allTextContents()).map((text) => text.trim());
  await expect.poll(async () => (await figures())[0]).toBe((await figures())[1]);
  await page.reload();
  await expect(page.getByRole('radio', { name: 'Calmer' })).toBeChecked({ timeout: 60_000 });
  await expect(page.getByText('Before the bench last changed it')).toBeVisible();
  await page.getByRole('button', { name: 'Go back to what it was' }).click();
  await expect(page.getByText('follows as it did before')).toBeVisible();
  expect((await wallNow(page, wall.id)).setUp).toEqual(wall.setUp);
  await put(page, 'calmer').click();
  await expect(page.getByText('from now on')).toBeVisible();

  expectErrors(/409 \(Conflict\)/);
  // Somebody else tunes the same wall from another page.
  const other = await signedInPage('owner');
  await other.goto(`/bench/runs/${runId}`);
  await expect(put(other, 'balanced')).toBeVisible({ timeout: 60_000 });
  await put(other, 'balanced').click();
  await expect(other.getByText('from now on')).toBeVisible();

  await page.getByRole('radio', { name: 'Quicker' }).click();
  await put(page, 'quicker').click();
  await expect(page.getByText('Their changes stay')).toBeVisible();
  expect((await wallNow(page, wall.id)).revision).toBe(wall.revision + 4);
  await put(page, 'quicker').click();
  await expect(page.getByText('from now on')).toBeVisible();
  expect((await wallNow(page, wall.id)).revision).toBe(wall.revision + 5);
});

test('runs are renamed, exported, compared and deleted', async ({ signedInPage, expectErrors }) => {
  const page = await signedInPage('tuner');
  await page.goto('/scenes');
  const [first, second] = [`=1+1 ${unique()}`, `Slow ${unique()}`];
  await keepMadeUpRun(page, first, null);
  await keepMadeUpRun(page, second, null, 120);
  await page.goto('/bench/runs');

  const [csv] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: `CSV of ${first}` }).click(),
  ]);
  const lines = (await readFile(await csv.path(), 'utf8')).split('\r\n');
  expect(lines.length).toBe(1 + 420 + 1);
  expect(lines[1].startsWith(`'=1+1`)).toBe(true);
  const [json] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: `JSON of ${first}` }).click(),
  ]);
  expect((JSON.parse(await readFile(await json.path(), 'utf8')) as { samples: unknown[] }).samples.length).toBe(420);

  await page.getByRole('checkbox', { name: `Compare ${first}` }).check();
  await page.getByRole('checkbox', { name: `Compare ${second}` }).check();
  await page.getByRole('link', { name: 'Compare these two' }).click();
  await expect(page.getByRole('row', { name: /Capture to the page/ })).toContainText('40.0 / 40.0');
  await expect(page.getByRole('row', { name: /Capture to the page/ })).toContainText('120.0 / 120.0');
  await expect(page.getByText('Both were recorded with the same settings.')).toBeVisible();
  await page.getByRole('link', { name: 'All runs' }).click();

  // Somebody else names it meanwhile: that is said, and only a second press goes over it.
  expectErrors(/409 \(Conflict\)/);
  const other = await signedInPage('owner');
  await other.goto('/bench/runs');
  await other.getByRole('button', { name: `Rename ${second}` }).click();
  await page.getByRole('button', { name: `Rename ${second}` }).click();
  const hers = `Hers ${unique()}`;
  await other.getByLabel('Name of the run').fill(hers);
  await other.getByRole('button', { name: 'Save the name' }).click();
  await expect(other.getByRole('link', { name: hers, exact: true })).toBeVisible();
  const third = `Slower ${unique()}`;
  await page.getByLabel('Name of the run').fill(third);
  await page.getByRole('button', { name: 'Save the name' }).click();
  await expect(page.getByText(`Somebody else named this run “${hers}” meanwhile.`)).toBeVisible();
  await expect(page.getByLabel('Name of the run')).toHaveValue(third);
  await page.getByRole('button', { name: 'Save the name' }).click();
  await expect(page.getByRole('link', { name: third, exact: true })).toBeVisible();

  await page.getByRole('button', { name: `Delete ${third}` }).click();
  await page.getByRole('button', { name: 'Keep' }).click();
  await expect(page.getByRole('link', { name: third, exact: true })).toBeVisible();
  await page.getByRole('button', { name: `Delete ${third}` }).click();
  await page.getByRole('button', { name: 'Delete now' }).click();
  await expect(page.getByRole('link', { name: third, exact: true })).toHaveCount(0);
  await page.reload();
  await expect(page.getByRole('link', { name: first, exact: true })).toBeVisible();
  await expect(page.getByRole('link', { name: third, exact: true })).toHaveCount(0);
});

const withoutCamera = {
  refused: () => {
    navigator.mediaDevices.getUserMedia = () => Promise.reject(new DOMException('', 'NotAllowedError'));
  },
  missing: () => {
    navigator.mediaDevices.getUserMedia = () => Promise.reject(new DOMException('', 'NotFoundError'));
  },
  insecure: () => Object.defineProperty(window, 'isSecureContext', { value: false }),
};
const said = {
  refused: 'The camera was refused.',
  missing: 'No camera was found.',
  insecure: 'This page cannot have a camera',
};

for (const why of ['refused', 'missing', 'insecure'] as const)
  test(`a browser whose camera is ${why} is told so, and the runs are there all the same`, async ({ signedInPage }) => {
    const page = await signedInPage('tuner');
    await page.goto('/scenes');
    const name = `Before ${unique()}`;
    const runId = await keepMadeUpRun(page, name, null);
    await page.addInitScript(withoutCamera[why]);
    await page.goto('/bench/mirror');
    await page.getByRole('button', { name: 'I hold the mirror: start' }).click();
    await expect(page.getByText(said[why])).toBeVisible();
    await expect(page.locator('.blinking')).toHaveCount(0);

    await page.goto('/bench');
    await page.getByRole('button', { name: 'Start the camera' }).click();
    await expect(page.getByText(said[why])).toBeVisible();
    await expect(page.getByRole('button', { name: 'Start recording' })).toBeDisabled();
    await page.getByRole('link', { name: 'replay or compare them' }).click();
    await page.getByRole('link', { name, exact: true }).click();
    await expect(page).toHaveURL(new RegExp(runId));
    await expect(page.getByRole('heading', { name: 'From side to side' })).toBeVisible({ timeout: 60_000 });
  });

test('a run too short to judge says so at replay too; a deletion that fails says so beside its run', async ({ signedInPage, expectErrors }) => {
  const page = await signedInPage('tuner');
  await page.goto('/scenes');
  const name = `Short ${unique()}`;
  const runId = await keepMadeUpRun(page, name, null, 40, 900);
  await page.goto(`/bench/runs/${runId}`);
  await expect(page.getByText('Nobody stands still in this run for long enough.').first()).toBeVisible();
  await expect(page.getByRole('link', { name: 'Record another' }).first()).toBeVisible();

  await page.goto('/bench/runs');
  await page.getByRole('button', { name: `Delete ${name}` }).click();
  expectErrors(/ERR_INTERNET_DISCONNECTED|Failed to load resource/);
  await page.context().setOffline(true);
  await page.getByRole('button', { name: 'Delete now' }).click();
  await expect(page.getByRole('listitem').filter({ hasText: name }).getByRole('alert')).toContainText('cannot be reached');
  await page.context().setOffline(false);
  // Two presses in one breath are one deletion.
  await page.getByRole('button', { name: 'Delete now' }).dblclick();
  await expect(page.getByRole('link', { name, exact: true })).toHaveCount(0);
  await expect(page.getByRole('alert')).toHaveCount(0);
});
