import AxeBuilder from '@axe-core/playwright';
import { test as base, expect, type BrowserContext, type Page } from '@playwright/test';
import type { Role } from '@oriel/shared/contracts/role';
import { demoAccount } from './demo-accounts';
import { chromiumArguments, chromiumPath, ignoredDefaults, type Graphics } from './set-up/chromium';
import { filmFace, type FilmedFace, type FilmedTruth } from './set-up/filmed-face';
import { filmThings, type FilmedThings } from './set-up/filmed-things';

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
  /** Errors on any page fail a test at its end; those that match are what this test means to provoke. */
  readonly expectErrors: (...patterns: readonly RegExp[]) => void;
  readonly watchErrors: ErrorWatch;
}

interface ErrorWatch {
  readonly watch: (context: BrowserContext) => void;
  readonly expected: RegExp[];
}

type SignedIn = Awaited<ReturnType<BrowserContext['storageState']>>;

interface WorkerFixtures extends BrowserChoice {
  readonly signedIn: Map<Role, SignedIn>;
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

  // Signing in costs a second: once a role and worker is enough.
  signedIn: [async ({}, use) => use(new Map()), { scope: 'worker' }],

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

  signedInPage: async ({ browser, baseURL, signedIn, watchErrors, viewport }, use) => {
    const opened: BrowserContext[] = [];
    await use(async (role) => {
      const context = await browser.newContext({
        baseURL,
        viewport,
        locale: 'en-GB',
        storageState: signedIn.get(role),
      });
      opened.push(context);
      watchErrors.watch(context);
      const page = await context.newPage();
      if (!signedIn.has(role)) {
        const { email, password } = demoAccount(role);
        await signIn(page, email, password);
        signedIn.set(role, await context.storageState());
      }
      return page;
    });
    for (const context of opened) await context.close();
  },

  expectAccessible: async ({}, use) => {
    await use(async (page) => {
      const { violations } = await new AxeBuilder({ page }).analyze();
      const serious = violations.filter(({ impact }) => impact === 'serious' || impact === 'critical');
      const told = serious.map(
        ({ id, help, nodes }) => `${id}: ${help}\n  ${nodes.map(({ target }) => target.join(' ')).join('\n  ')}`,
      );
      expect(told, 'what axe calls serious').toEqual([]);
    });
  },
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
