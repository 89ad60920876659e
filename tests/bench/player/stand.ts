import { chromium, type Browser, type BrowserContext, type BrowserContextOptions } from '@playwright/test';
import { build } from 'esbuild';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { Scene } from '@oriel/shared/contracts/scenes';
import { demoAccount } from '../../e2e/demo-accounts';
import { signIn } from '../../e2e/fixtures';
import { keepScreen } from '../../e2e/player/this-screen';
import { chromiumArguments, chromiumPath, ignoredDefaults, type Graphics } from '../../e2e/set-up/chromium';
import { filmFace } from '../../e2e/set-up/filmed-face';
import { startProduct } from '../../e2e/set-up/product';
import { Desk } from '../../e2e/walls/desk';
import { codeOn } from '../../e2e/walls/screen';
import type { FacePose } from '../../video/face-path';
import { COMPUTERS, type ComputerName } from './computers';
import { SIZES, type SizeName } from './options';
import { quotaFor } from './quota';
import { BenchScenes, glass } from './scenes';

type SignedIn = Awaited<ReturnType<BrowserContext['storageState']>>;

/** Someone 1.2 m away who sways 260 mm to either side, from one to the other in 1.5 s. */
const cameraSize = { width: 1280, height: 720, fps: 30 };
const swayFrames = 90;
const poses: FacePose[] = Array.from({ length: swayFrames }, (_, i) => ({ segment: 'sway', on: true, x: 640 + 240 * Math.sin((2 * Math.PI * i) / swayFrames), y: 340, ipd: 58, rollDeg: 0 }));
const fieldDegrees = 60;

/** Playwright's own answer to a signal is to leave at once, and everything else behind. */
const launched = { executablePath: chromiumPath, ignoreDefaultArgs: ignoredDefaults, handleSIGINT: false, handleSIGTERM: false, handleSIGHUP: false };

/** What a screen's browser is to have. */
export interface Screen {
  readonly size: SizeName;
  readonly graphics: Graphics;
  readonly camera: boolean;
  readonly computer: ComputerName;
}

/** The built product with a wall that is paired, scenes for it, and browsers to be its screen. Everything it starts it ends. */
export class Stand {
  private screen: Browser | null = null;

  private constructor(
    private readonly product: Awaited<ReturnType<typeof startProduct>>,
    private readonly folder: string,
    private readonly deskBrowser: Browser,
    private readonly video: string,
    private readonly probe: string,
    private readonly signedIn: SignedIn,
    private readonly desk: Desk,
    private readonly wallId: string,
    readonly scenes: BenchScenes,
  ) {}

  static async build(say: (words: string) => void): Promise<Stand> {
    say('filming the face');
    const { video } = await filmFace({ name: 'sways-720p', poses, size: cameraSize });
    say('starting the product');
    const product = await startProduct();
    const folder = await mkdtemp(join(tmpdir(), 'oriel-bench-player-'));
    const browser = await chromium.launch({ ...launched, args: chromiumArguments('software', null) });
    try {
      const context = await browser.newContext({ baseURL: product.url, locale: 'en-GB' });
      const page = await context.newPage();
      const { email, password } = demoAccount('owner');
      await signIn(page, email, password);
      const desk = new Desk(page);
      const scenes = new BenchScenes(page);
      const wall = await desk.newWall('Bench', (await scenes.scene(1, '720p')).id);
      await desk.change(wall.id, { glass: { ...wall.setUp.glass, ...glass } });
      const screen = await context.newPage();
      await screen.goto('/wall');
      await desk.pair(wall.id, await codeOn(screen));
      await screen.locator('oriel-wall-picture').waitFor();
      await screen.close();
      return new Stand(product, folder, browser, video, await bundleProbe(), await context.storageState(), desk, wall.id, scenes);
    } catch (error) {
      await browser.close();
      await product.stop();
      await rm(folder, { recursive: true, force: true });
      throw error;
    }
  }

  /** Hangs a scene on the wall. */
  async hang(scene: Scene): Promise<void> {
    await this.desk.change(this.wallId, { sceneId: scene.id });
  }

  /** Uses a browser of its own on the computer asked for, its context with the probe in every page, and closes it whatever happens. */
  async onScreen<T>({ size, graphics, camera, computer }: Screen, use: (browser: Browser, context: BrowserContext) => Promise<T>): Promise<T> {
    const quota = quotaFor(COMPUTERS[computer]);
    const args = chromiumArguments(graphics, camera ? this.video : null).filter((argument) => camera || !argument.startsWith('--use-fake-device'));
    const [width, height] = SIZES[size];
    try {
      const browser = await chromium.launch({
        ...launched,
        executablePath: quota?.starter(chromiumPath, this.folder) ?? chromiumPath,
        args: [...args, `--window-size=${String(width)},${String(height)}`],
        timeout: 60_000,
      });
      this.screen = browser;
      try {
        const options: BrowserContextOptions = {
          baseURL: this.product.url,
          viewport: { width, height },
          screen: { width, height },
          locale: 'en-GB',
          storageState: this.signedIn,
          serviceWorkers: 'block',
        };
        const context = await browser.newContext(options);
        await context.addInitScript({ content: this.probe });
        return await use(browser, context);
      } finally {
        this.screen = null;
        await browser.close();
      }
    } finally {
      await quota?.end();
    }
  }

  /** Breaks off what is being measured: whatever waits for its page fails. */
  async breakOff(): Promise<void> {
    await this.screen?.close();
  }

  async end(): Promise<void> {
    await this.deskBrowser.close();
    await this.product.stop();
    await rm(this.folder, { recursive: true, force: true });
  }
}

export const keepBenchScreen = (page: Parameters<typeof keepScreen>[0]): Promise<void> => keepScreen(page, { widthMm: glass.widthMm, fieldDegrees });

async function bundleProbe(): Promise<string> {
  const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));
  const { outputFiles } = await build({ entryPoints: [here('./probe.ts')], bundle: true, format: 'iife', write: false, target: 'es2022', logLevel: 'error', tsconfig: here('../../../tsconfig.json') });
  return outputFiles[0].text;
}
