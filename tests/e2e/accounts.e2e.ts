import type { Page } from '@playwright/test';
import { demoAccount } from './demo-accounts';
import { expect, signIn, test } from './fixtures';
import { mailedLink } from './mail';

const password = 'brass and plaster';
const unique = () => `someone-${Date.now()}-${Math.floor(Math.random() * 1e6)}@lockhouse.example`;

async function signUp(page: Page, email: string): Promise<void> {
  await page.goto('/sign-up');
  await page.getByLabel('E-mail').fill(email);
  await page.getByRole('button', { name: 'Send the link' }).click();
  await expect(page.getByRole('heading', { name: 'We have written to you' })).toBeVisible();
  await page.goto(await mailedLink(page, email, 'confirm'));
  await page.getByLabel('Your name').fill('Ilse Marten');
  await page.getByLabel('Name of the household').fill('The lock house');
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Open the household' }).click();
  await expect(page).toHaveURL(/\/photos$/);
}

test('someone signs up by mail, signs out, and signs in again to where they were going', async ({ page, expectToReadWell }) => {
  const email = unique();
  await signUp(page, email);
  await expect(page.getByRole('heading', { name: 'Your photographs go here' })).toBeVisible();
  await expectToReadWell(page);
  await page.getByRole('button', { name: /Your account/ }).click();
  await page.getByRole('menuitem', { name: 'Sign out' }).click();
  await expect(page).toHaveURL(/\/sign-in/);
  await page.goto('/household');
  await expect(page).toHaveURL(/\/sign-in\?next=%2Fhousehold/);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page.getByRole('heading', { name: 'The lock house' })).toBeVisible();
});

test('a wrong password says what to do and keeps the address that was typed', async ({ page, expectErrors }) => {
  expectErrors(/422/);
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill('nobody@lockhouse.example');
  await page.getByLabel('Password').fill('not this one');
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page.getByRole('alert')).toBeVisible();
  await expect(page.getByLabel('E-mail')).toHaveValue('nobody@lockhouse.example');
});

test('security: a sign-in never leads to another site', async ({ page }) => {
  const { email, password } = demoAccount('viewer');
  await page.goto('/sign-in?next=//elsewhere.example/');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page).toHaveURL(/\/scenes$/);
});

test('a password over 72 bytes is refused where it is typed', async ({ page }) => {
  await page.goto('/confirm#a-link-that-is-never-sent');
  await page.getByLabel('Password').fill('é'.repeat(40));
  await page.getByRole('button', { name: 'Open the household' }).click();
  await expect(page.getByText(/at most 72 bytes/)).toBeVisible();
});

test('a forgotten password is set anew by mail, once', async ({ page, expectErrors }) => {
  const email = unique();
  await signUp(page, email);
  await page.context().clearCookies();
  await page.goto('/forgotten');
  await page.getByLabel('E-mail').fill(email);
  await page.getByRole('button', { name: 'Send the link' }).click();
  await expect(page.getByRole('heading', { name: 'We have written to you' })).toBeVisible();
  const link = await mailedLink(page, email, 'reset');
  await page.goto(link);
  await page.getByLabel('New password').fill('another brass and plaster');
  await page.getByRole('button', { name: 'Set the password' }).click();
  await expect(page.getByText('Your password is changed')).toBeVisible();
  await signIn(page, email, 'another brass and plaster');

  expectErrors(/40\d|410|422/);
  const again = await page.context().newPage();
  await again.goto(link);
  await again.getByLabel('New password').fill('a third brass and plaster');
  await again.getByRole('button', { name: 'Set the password' }).click();
  await expect(again.getByRole('alert')).toBeVisible();
});

test('an owner invites a viewer, who joins and sees but may not upload', async ({ page, browser, baseURL, watchErrors, expectToReadWell }) => {
  await signUp(page, unique());
  const guest = unique();
  await page.goto('/household');
  await page.getByLabel('E-mail').fill(guest);
  await page.getByRole('button', { name: 'Invite' }).click();
  await expect(page.getByText(`Invitation sent to ${guest}`)).toBeVisible();
  await expectToReadWell(page);

  const context = await browser.newContext({ baseURL });
  watchErrors.watch(context);
  const theirs = await context.newPage();
  await theirs.goto(await mailedLink(page, guest, 'invitation'));
  await expect(theirs.getByText('invites')).toBeVisible();
  await expectToReadWell(theirs);
  await theirs.getByLabel('Your name').fill('Anselm Marten');
  await theirs.getByLabel('Choose a password').fill(password);
  await theirs.getByRole('button', { name: 'Join The lock house' }).click();
  await expect(theirs).toHaveURL(/\/scenes$/);
  await theirs.goto('/photos');
  await expect(theirs.getByRole('heading', { name: 'No photographs yet' })).toBeVisible();
  await expect(theirs.getByRole('button', { name: 'Upload photos' })).toHaveCount(0);
  await context.close();
});

test('a server that cannot be reached keeps what was typed and can be tried again', async ({ page, expectErrors }) => {
  expectErrors(/Failed to load resource/, /ERR_/);
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill('someone@lockhouse.example');
  await page.getByLabel('Password').fill(password);
  await page.route('**/api/session', (route) => route.abort());
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page.getByText('The server cannot be reached.')).toBeVisible();
  await expect(page.getByLabel('Password')).toHaveValue(password);
  await page.unroute('**/api/session');
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page.getByRole('alert')).not.toContainText('cannot be reached');
});
