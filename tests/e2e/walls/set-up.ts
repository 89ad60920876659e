import type { Page } from '@playwright/test';
import { expect } from '../fixtures';

/** The set-up of a wall as a tuner works it. */
export const step = (page: Page, name: string) => page.getByRole('list', { name: 'Steps' }).getByRole('button', { name });
export const field = (page: Page, name: string) => page.getByRole('spinbutton', { name, exact: true });

export async function type(page: Page, name: string, text: string): Promise<void> {
  await field(page, name).fill(text);
  await field(page, name).press('Enter');
}

/** Opens what few need: the figures taken apart under these words. */
export const unfold = (page: Page, words: string) => page.getByText(words, { exact: true }).click();

/** The figure a field holds, in full. */
export const figureOf = async (page: Page, name: string) => Number(await field(page, name).getAttribute('aria-valuenow'));

/** Hangs a wall of this test's own, opens its set-up, and gives its id. */
export async function hang(page: Page, name = `Landing ${Date.now()}`): Promise<string> {
  await page.goto('/walls');
  await page.getByRole('button', { name: 'New wall' }).click();
  await expect(page.getByLabel('Name of the wall')).toBeFocused();
  await page.getByLabel('Name of the wall').fill(name);
  await page.getByRole('button', { name: 'Set it up' }).click();
  await expect(page).toHaveURL(/\/walls\/[0-9a-f-]{36}/);
  await expect(page.getByLabel('Name of the wall')).toHaveValue(name);
  return new URL(page.url()).pathname.split('/')[2];
}

/** The measured field of view lies within twice its stated standard uncertainty of the truth, and what that means is said in mm on the glass. */
export async function expectFieldMeasured(page: Page, fieldDegrees: number): Promise<number> {
  const found = await figureOf(page, 'Field of view across');
  await unfold(page, 'How sure that is, a mirrored picture');
  const sure = await figureOf(page, 'The field is sure to within ±');
  expect(Math.abs(found - fieldDegrees), `${found}° ± ${sure}°`).toBeLessThan(2 * sure);
  await expect(page.getByText(/^±[\d.]+° of view: ±[\d.]+ mm on the glass for a layer 100 mm behind/)).toBeVisible();
  return sure;
}
