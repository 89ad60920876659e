import { expect, type Page } from '@playwright/test';

const subjects = { confirm: /Confirm/, reset: /password/i, invitation: /invit/i };

/** The newest link of this kind in the mail this server keeps for `address`, e.g. `/confirm#…`. */
export async function mailedLink(page: Page, address: string, kind: 'confirm' | 'reset' | 'invitation'): Promise<string> {
  const mail = await page.context().newPage();
  const letter = mail.locator('li, article, tr', { hasText: address }).filter({ hasText: subjects[kind] }).first();
  await expect(async () => {
    await mail.goto('/mail');
    await letter.getByRole('link').first().click({ timeout: 1000 });
  }).toPass({ timeout: 10_000 });
  const text = await mail.content();
  await mail.close();
  const link = new RegExp(`/${kind}#[\\w-]+`).exec(text)?.[0];
  if (!link) throw new Error(`No ${kind} link in the mail to ${address}.`);
  return link;
}
