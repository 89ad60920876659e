import type { Page } from '@playwright/test';
import { expect } from '../fixtures';

/** The set-up of a wall as a tuner works it. */
export const step = (page: Page, name: string) => page.getByRole('list', { name: 'Steps' }).getByRole('button', { name });
export const field = (page: Page, name: string) => page.getByRole('spinbutton', { name, exact: true });

export async function type(page: Page, name: string, text: string): Promise<void> {
  await field(page, name).fill(text);
  await field(page, name).press('Enter');
}

/** The figure a field holds, in full. */
export const figureOf = async (page: Page, name: string) => Number(await field(page, name).getAttribute('aria-valuenow'));

/** Hangs a wall of this test's own, opens its set-up, and gives its id. */
export async function hang(page: Page, name = `Landing ${Date.now()}`): Promise<string> {
  await page.goto('/walls');
  await page.getByRole('button', { name: 'New wall' }).click();
  await page.getByLabel('Name of the wall').fill(name);
  await page.getByRole('button', { name: 'Set it up' }).click();
  await expect(page).toHaveURL(/\/walls\/[0-9a-f-]{36}/);
  await expect(page.getByLabel('Name of the wall')).toHaveValue(name);
  return new URL(page.url()).pathname.split('/')[2];
}
