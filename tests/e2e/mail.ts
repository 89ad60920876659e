import type { Page } from '@playwright/test';

/** The newest link of this kind in the mail this server keeps for `address`, e.g. `/confirm#…`. */
export async function mailedLink(page: Page, address: string, kind: 'confirm' | 'reset' | 'invitation'): Promise<string> {
  const mail = await page.context().newPage();
  await mail.goto('/mail');
  await mail.locator('li, article, tr', { hasText: address }).first().getByRole('link').first().click();
  const text = await mail.content();
  await mail.close();
  const link = new RegExp(`/${kind}#[\\w-]+`).exec(text)?.[0];
  if (!link) throw new Error(`No ${kind} link in the mail to ${address}.`);
  return link;
}
