import { expect, test } from './fixtures';

test('a stranger is led to the sign-in, in the fonts and under the policy of Oriel', async ({ page, expectToReadWell }) => {
  const elsewhere: string[] = [];
  page.on('request', (request) => {
    if (new URL(request.url()).origin !== new URL(page.url()).origin && page.url() !== 'about:blank')
      elsewhere.push(request.url());
  });
  const reply = await page.goto('/');
  // OWASP ASVS 5.0.0, 3.4.3: at least these two.
  const policy = reply?.headers()['content-security-policy'];
  expect(policy).toContain("object-src 'none'");
  expect(policy).toContain("base-uri 'none'");
  await expect(page).toHaveURL(/\/sign-in\?next=/);
  await expect(page).toHaveTitle(/Oriel/);
  await expect(page.getByRole('heading', { name: 'Sign in' })).toBeVisible();
  await page.evaluate(() => document.fonts.ready);
  expect(await page.evaluate(() => [...document.fonts].filter(({ status }) => status === 'error').length)).toBe(0);
  expect(elsewhere).toEqual([]);
  await expectToReadWell(page);
});

test('an address that leads nowhere says so', async ({ page }) => {
  await page.goto('/no-such-room');
  await expect(page.getByRole('heading')).toBeVisible();
  await expect(page.getByRole('link').first()).toBeVisible();
});

test('the server answers for its health and readiness', async ({ request }) => {
  expect(await (await request.get('/health')).json()).toEqual({ state: 'running' });
  expect(await (await request.get('/ready')).json()).toEqual({ state: 'ready' });
});
