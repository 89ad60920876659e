import AxeBuilder from '@axe-core/playwright';
import { test as base, expect, type BrowserContext, type Page } from '@playwright/test';
import type { Role } from '@oriel/shared/contracts/role';
import { chromiumArguments, chromiumPath, ignoredDefaults, type Graphics } from './set-up/chromium';
import { filmFace, type FilmedFace, type FilmedTruth } from './set-up/filmed-face';
import { filmThings, type FilmedThings } from './set-up/filmed-things';
import { sessionFile } from './set-up/sessions';

/** What a file may choose with `test.use`; each choice is a browser of its own. */
export interface BrowserChoice {
  readonly graphics: Graphics;
  /** The face the fake camera shows; null for Chromium's own test pattern. */
  readonly filmedFace: FilmedFace | null;
  /** Boards and cards held before the fake camera, in place of a face. */
  readonly filmedThings: FilmedThings | null;
}

interface Fixtures {
  /** A page of a context of its own, signed in as the demo's member with this role. */
  readonly signedInPage: (role: Role) => Promise<Page>;
  /** Fails the test unless axe finds nothing serious or critical on the page as it is now. */
  readonly expectAccessible: (page: Page) => Promise<void>;
  /** The same on a desk and on a phone, by day and by evening; and that the page is never wider than its screen, nor a tablet's. */
  readonly expectToReadWell: (page: Page) => Promise<void>;
  /** Errors on any page fail a test at its end; those that match are what this test means to provoke. */
  readonly expectErrors: (...patterns: readonly RegExp[]) => void;
  readonly watchErrors: ErrorWatch;
}

interface ErrorWatch {
  readonly watch: (context: BrowserContext) => void;
  readonly expected: RegExp[];
}

interface WorkerFixtures extends BrowserChoice {
  /** The video of `filmedFace` and the truth of its frames. */
  readonly filmed: { readonly video: string; readonly truth: FilmedTruth } | null;
}

export const test = base.extend<Fixtures, WorkerFixtures>({
  graphics: ['software', { option: true, scope: 'worker' }],
  filmedFace: [null, { option: true, scope: 'worker' }],
  filmedThings: [null, { option: true, scope: 'worker' }],
  filmed: [
    async ({ filmedFace }, use) => use(filmedFace && (await filmFace(filmedFace))),
    { scope: 'worker', timeout: 120_000 },
  ],
  launchOptions: [
    async ({ graphics, filmed, filmedThings }, use) => {
      await use({
        executablePath: chromiumPath,
        args: chromiumArguments(graphics, filmedThings ? await filmThings(filmedThings) : (filmed?.video ?? null)),
        ignoreDefaultArgs: ignoredDefaults,
      });
    },
    { scope: 'worker' },
  ],

  watchErrors: [
    async ({}, use) => {
      const seen: string[] = [];
      const expected: RegExp[] = [];
      await use({
        expected,
        watch: (context) => {
          context.on('weberror', (error) => seen.push(`${error.error().stack ?? error.error().message}`));
          // A breach of the content security policy is reported here too.
          context.on('console', (message) => {
            if (message.type() === 'error') seen.push(`${message.text()} (${message.location().url})`);
          });
        },
      });
      const unexpected = seen.filter((text) => !expected.some((pattern) => pattern.test(text)));
      expect(unexpected, 'errors on the page').toEqual([]);
    },
    { auto: true },
  ],

  context: async ({ context, watchErrors }, use) => {
    watchErrors.watch(context);
    await use(context);
  },

  expectErrors: async ({ watchErrors }, use) => use((...patterns) => void watchErrors.expected.push(...patterns)),

  signedInPage: async ({ browser, baseURL, watchErrors, viewport }, use) => {
    const opened: BrowserContext[] = [];
    await use(async (role) => {
      const context = await browser.newContext({
        baseURL,
        viewport,
        locale: 'en-GB',
        storageState: sessionFile(role),
      });
      opened.push(context);
      watchErrors.watch(context);
      return context.newPage();
    });
    for (const context of opened) await context.close();
  },

  expectAccessible: async ({}, use) => {
    await use(async (page) => {
      await stillness(page);
      // Legacy means: looked at as one document. There are no frames here, and a second page for each look costs more than the look.
      const { violations } = await new AxeBuilder({ page }).setLegacyMode().options({ resultTypes: ['violations'] }).analyze();
      const serious = violations.filter(({ impact }) => impact === 'serious' || impact === 'critical');
      const told = serious.map(
        ({ id, help, nodes }) => `${id}: ${help}\n  ${nodes.map(({ target }) => target.join(' ')).join('\n  ')}`,
      );
      expect.soft(told, `what axe calls serious on ${whereabouts(page, await lightOf(page))}`).toEqual([]);
    });
  },

  expectToReadWell: async ({ expectAccessible }, use) => {
    await use(async (page) => {
      const before = page.viewportSize()!;
      for (const { read, ...size } of sizes) {
        await page.setViewportSize(size);
        for (const colorScheme of read) {
          await page.emulateMedia({ colorScheme });
          await expectAccessible(page);
        }
        // Charts take a frame to follow the window.
        const beyond = () => page.evaluate(() => document.documentElement.scrollWidth - innerWidth);
        await expect.poll(beyond, `px by which ${whereabouts(page)} runs off sideways`).toBeLessThanOrEqual(0);
      }
      await page.setViewportSize(before);
      await page.emulateMedia({ colorScheme: null });
    });
  },
});

const sizes = [
  { width: 1440, height: 900, read: ['light', 'dark'] },
  { width: 1024, height: 768, read: [] },
  { width: 390, height: 844, read: ['light'] },
] as const;

const lightOf = (page: Page) => page.evaluate(() => (matchMedia('(prefers-color-scheme: dark)').matches ? 'dark' : 'light'));

function whereabouts(page: Page, light = ''): string {
  const { width, height } = page.viewportSize()!;
  return `${new URL(page.url()).pathname} at ${width} x ${height} ${light}`;
}

/** Waits until what was just asked for is drawn and whatever moves for a while has come to rest: words halfway between two lights read badly. */
const stillness = (page: Page) =>
  page.evaluate(async () => {
    const drawn = () => new Promise((resolve) => requestAnimationFrame(() => setTimeout(resolve)));
    await drawn();
    await drawn();
    const ending = document.getAnimations().filter(({ effect, playState }) => playState === 'running' && effect?.getComputedTiming().endTime !== Infinity);
    await Promise.all(ending.map(({ finished }) => finished.catch(() => undefined)));
  });

export { expect };

/** Signs in as a person does, and waits until the page has left the sign-in. */
export async function signIn(page: Page, email: string, password: string): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page).not.toHaveURL(/\/sign-in/);
}
