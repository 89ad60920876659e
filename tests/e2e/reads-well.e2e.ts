import type { Page } from '@playwright/test';
import type { Role } from '@oriel/shared/contracts/role';
import type { Scene } from '@oriel/shared/contracts/scenes';
import type { Wall } from '@oriel/shared/contracts/walls';
import { ask, demoScene, householdId } from './asking';
import { keepMadeUpRun } from './bench/household';
import { expect, test } from './fixtures';
import { keepScreen } from './player/this-screen';
import { appRoutes } from './set-up/app-routes';
import { codeOn } from './walls/screen';

/*
 * Every page of the app, in the states that look different, read by axe on a desk, by day and by evening, and on a phone. States that only come about
 * while something is done are read where it is done: the composer with a layer open, the viewer of photos, a paired wall, a face followed.
 */
interface Place {
  readonly as: Role | 'stranger';
  /** Goes there and calls `reads` in each state. */
  readonly visit: (page: Page, reads: () => Promise<void>) => Promise<void>;
  /** What the browser may report as errors on the way. */
  readonly errors?: RegExp;
}

const heading = (page: Page, name: RegExp | string) => expect(page.getByRole('heading', { name, exact: typeof name === 'string' }).first()).toBeVisible();

const plain = (as: Place['as'], path: string, name: RegExp | string): Place => ({
  as,
  visit: async (page, reads) => {
    await page.goto(path);
    await heading(page, name);
    await reads();
  },
});

const mailed = (path: string): Place => ({
  as: 'stranger',
  visit: async (page, reads) => {
    await page.goto(path);
    await page.getByRole('button', { name: 'Send the link' }).click();
    await expect(page.locator('mat-error').first()).toBeVisible();
    await reads();
    await page.getByLabel('E-mail').fill(`reader-${Date.now()}@lockhouse.example`);
    await page.getByRole('button', { name: 'Send the link' }).click();
    await heading(page, 'We have written to you');
    await reads();
  },
});

/** A form with its mistakes shown. */
const mistaken = (path: string, button: string): Place => ({
  as: 'stranger',
  visit: async (page, reads) => {
    await page.goto(path);
    await page.getByRole('button', { name: button }).click();
    await expect(page.locator('mat-error').first()).toBeVisible();
    await reads();
  },
});

async function withWall(page: Page, read: (id: string) => Promise<void>): Promise<void> {
  await page.goto('/scenes');
  const { wall } = await ask<{ wall: Wall }>(page, 'POST', `/api/households/${await householdId(page)}/walls`, { name: `Read ${Date.now()}` });
  await read(wall.id);
  await ask(page, 'DELETE', `/api/walls/${wall.id}`);
}

async function withRuns(page: Page, read: (a: string, b: string) => Promise<void>): Promise<void> {
  await page.goto('/scenes');
  await read(await keepMadeUpRun(page, 'One', null), await keepMadeUpRun(page, 'Other', null));
}

const bench = (path: (a: string, b: string) => string, shown: RegExp | string): Place => ({
  as: 'tuner',
  visit: (page, reads) =>
    withRuns(page, async (a, b) => {
      await page.goto(path(a, b));
      await expect(page.getByRole('heading', { name: shown }).or(page.getByText(shown)).first()).toBeVisible({ timeout: 30_000 });
      await reads();
    }),
});

const places: Readonly<Record<string, Place>> = {
  'sign-in': mistaken('/sign-in', 'Sign in'),
  'sign-up': mailed('/sign-up'),
  forgotten: mailed('/forgotten'),
  confirm: mistaken('/confirm#a-link-that-is-never-sent', 'Open the household'),
  reset: mistaken('/reset#a-link-that-is-never-sent', 'Set the password'),
  invitation: { ...plain('stranger', `/invitation#${'a'.repeat(43)}`, 'This invitation did not open'), errors: /410/ },
  wall: {
    as: 'stranger',
    visit: async (page, reads) => {
      await page.goto('/wall');
      await codeOn(page);
      await reads();
    },
  },
  '**': plain('stranger', '/no-such-room', 'There is nothing at this address'),

  scenes: plain('owner', '/scenes', 'October on the ridge'),
  'scenes/bin': {
    as: 'owner',
    visit: async (page, reads) => {
      await page.goto('/scenes');
      const ridge = await demoScene(page);
      const { scene } = await ask<{ scene: Scene }>(page, 'POST', `/api/scenes/${ridge.id}/duplicates`, {});
      await ask(page, 'DELETE', `/api/scenes/${scene.id}`);
      await page.goto('/scenes/bin');
      await expect(page.getByRole('button', { name: 'Put back' }).first()).toBeVisible();
      await reads();
    },
  },
  photos: plain('owner', '/photos', 'Photos'),
  'photos/bin': plain('owner', '/photos/bin', 'Bin'),
  household: plain('owner', '/household', 'Members'),
  account: plain('owner', '/account', /.+/),
  'compose/:sceneId': {
    as: 'viewer',
    visit: async (page, reads) => {
      await page.goto('/scenes');
      await page.goto(`/compose/${(await demoScene(page)).id}`);
      await expect(page.getByTestId('plan').getByRole('slider').first()).toBeVisible();
      await reads();
    },
  },

  walls: {
    as: 'tuner',
    visit: (page, reads) =>
      withWall(page, async () => {
        await page.goto('/walls');
        await expect(page.getByRole('listitem').first()).toBeVisible();
        await reads();
      }),
  },
  'walls/:wallId': {
    as: 'tuner',
    visit: (page, reads) =>
      withWall(page, async (id) => {
        await page.goto(`/walls/${id}`);
        const steps = page.getByRole('list', { name: 'Steps' }).getByRole('button');
        await expect(steps.first()).toBeVisible();
        for (const step of await steps.all()) {
          await step.click();
          await expect(step).toHaveAttribute('aria-current', 'step');
          await reads();
        }
      }),
  },
  'walls/:wallId/kiosk': {
    as: 'tuner',
    visit: (page, reads) =>
      withWall(page, async (id) => {
        await page.goto(`/walls/${id}/kiosk`);
        await expect(page.getByText('"VideoCaptureAllowedUrls"')).toBeVisible();
        await reads();
      }),
  },
  'walls/board': {
    as: 'tuner',
    visit: async (page, reads) => {
      await page.goto('/walls/board');
      await expect(page.getByRole('img', { name: /^The board/ })).toBeVisible();
      await reads();
    },
  },

  bench: bench(() => '/bench', 'Bench'),
  'bench/runs': bench(() => '/bench/runs', 'Runs'),
  'bench/runs/:runId': bench((a) => `/bench/runs/${a}`, 'Nearer'),
  'bench/runs/compare': bench((a, b) => `/bench/runs/compare?a=${a}&b=${b}`, 'Capture to the page'),
  'bench/**': plain('viewer', '/bench/runs', 'The bench is for owners and tuners'),
  'bench/mirror': bench(() => '/bench/mirror', 'The screen will blink.'),

  screen: {
    as: 'viewer',
    visit: async (page, reads) => {
      await page.goto('/screen');
      for (const step of ['The glass', 'The camera', 'A look']) {
        await page.getByRole('list', { name: 'Steps' }).getByRole('button', { name: step }).click();
        await expect(page.getByRole('region', { name: step })).toBeVisible();
        await reads();
      }
      await page.getByRole('button', { name: 'Start the camera' }).click();
      await expect(page.getByRole('button', { name: 'Stop the camera' })).toBeVisible();
      await reads();
    },
  },
  'play/:sceneId': {
    as: 'viewer',
    visit: async (page, reads) => {
      await page.goto('/scenes');
      const scene = await demoScene(page);
      await page.goto(`/play/${scene.id}`);
      const line = page.getByTestId('player-line');
      await expect(line).toContainText('This screen has not been measured');
      // What is focused does not rest.
      await page.getByRole('button', { name: /Figures/ }).focus();
      await reads();
      await keepScreen(page);
      await page.emulateMedia({ reducedMotion: 'reduce' });
      await page.reload();
      await expect(line).toContainText('less motion');
      await page.keyboard.press('i');
      await expect(page.locator('oriel-read-out')).toBeVisible();
      await page.getByRole('button', { name: /Figures/ }).focus();
      await reads();
    },
  },
};

test.describe.configure({ mode: 'parallel' });

test('every address of the app is read', () => {
  expect(Object.keys(places).sort()).toEqual(appRoutes().filter((route) => route !== ''));
});

for (const [route, { as, visit, errors }] of Object.entries(places))
  test(`/${route} reads well`, async ({ page, signedInPage, expectErrors, expectToReadWell }) => {
    if (errors) expectErrors(errors);
    const theirs = as === 'stranger' ? page : await signedInPage(as);
    await visit(theirs, () => expectToReadWell(theirs));
  });
