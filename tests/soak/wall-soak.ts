import { chromium, type BrowserContext, type Page } from '@playwright/test';
import { parseArgs } from 'node:util';
import type { Scene } from '@oriel/shared/contracts/scenes';
import type { FacePose } from '../video/face-path';
import { demoAccount } from '../e2e/demo-accounts';
import { signIn } from '../e2e/fixtures';
import { chromiumArguments, chromiumPath, ignoredDefaults } from '../e2e/set-up/chromium';
import { filmFace } from '../e2e/set-up/filmed-face';
import { startProduct } from '../e2e/set-up/product';
import { Desk } from '../e2e/walls/desk';
import { codeOn, readyForOffline, shownLayers } from '../e2e/walls/screen';
import { plugged, unplug } from '../e2e/walls/unplugging';

/*
 * A wall left alone: npm run soak:wall -- --minutes 60. The product, and a wall in Chromium before which a filmed face sways; in turn its
 * network is cut, its camera unplugged, its server killed and started again, its page loaded anew without a network. After each the wall
 * must show its picture and follow again; while the server comes back another scene is chosen at the desk, and the wall must hear of it. Ends by itself; exits with 1 where the wall did not come back.
 */
const { values } = parseArgs({ options: { minutes: { type: 'string', default: '60' } } });
const untilMs = Date.now() + Number(values.minutes) * 60_000;
const backWithinMs = 60_000;
const calmMs = 20_000;

const poses: FacePose[] = Array.from({ length: 90 }, (_, i) => ({ segment: 'sway', on: true, x: 320 + 120 * Math.sin((2 * Math.PI * i) / 90), y: 230, ipd: 58, rollDeg: 0 }));
const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));
const say = (words: string) => console.log(`${new Date().toISOString().slice(11, 19)}  ${words}`);

/** Faces followed a second, from the wall's own read-out; NaN while it is not shown. */
async function facesPerSecond(page: Page): Promise<number> {
  const figure = page.locator('oriel-read-out dd').nth(1);
  if ((await figure.count()) === 0) await page.keyboard.press('i');
  return Number(await figure.innerText({ timeout: 5000 }).catch(() => 'NaN'));
}

/** Seconds until the wall shows all its layers and follows. @throws Error when it does not come back in time. */
async function back(page: Page, { document }: Scene): Promise<number> {
  const from = Date.now();
  const layers = document.layers.filter(({ shown }) => shown).length;
  const picture = page.getByRole('img', { name: `${document.name}, seen through the glass` });
  for (;;) {
    if ((await picture.count()) === 1 && (await shownLayers(page).count()) === layers && (await facesPerSecond(page)) > 2) return (Date.now() - from) / 1000;
    if (Date.now() - from > backWithinMs) throw new Error(`the wall did not come back within ${backWithinMs / 1000} s`);
    await pause(500);
  }
}

async function heapMB(page: Page): Promise<number> {
  const session = await page.context().newCDPSession(page);
  await session.send('HeapProfiler.collectGarbage');
  const { usedSize } = await session.send('Runtime.getHeapUsage');
  await session.detach();
  return usedSize / 1e6;
}

const product = await startProduct();
const { video } = await filmFace({ name: 'sways', poses });
const browser = await chromium.launch({ executablePath: chromiumPath, args: chromiumArguments('software', video), ignoreDefaultArgs: ignoredDefaults });
const results: { what: string; backS: number; heapMB: number }[] = [];
let failure: string | null = null;
try {
  const open = (): Promise<BrowserContext> => browser.newContext({ baseURL: product.url, viewport: { width: 1280, height: 720 }, locale: 'en-GB' });
  const desk = await (await open()).newPage();
  const { email, password } = demoAccount('tuner');
  await signIn(desk, email, password);
  const tuner = new Desk(desk);
  const scenes = await tuner.scenes();
  let scene = scenes[0];
  const wall = await tuner.newWall('Soak', scene.id);
  await desk.goto('about:blank');

  const context = await open();
  await context.addInitScript(plugged);
  const screen = await context.newPage();
  await screen.goto('/wall');
  const code = await codeOn(screen);
  await desk.goto(`${product.url}/scenes`);
  await tuner.pair(wall.id, code);
  say(`paired; follows after ${(await back(screen, scene)).toFixed(1)} s`);
  await readyForOffline(screen);

  const troubles: [string, () => Promise<void>][] = [
    ['network cut for 20 s', async () => {
      await context.setOffline(true);
      await pause(calmMs);
      await context.setOffline(false);
    }],
    ['camera unplugged', async () => {
      await unplug(screen);
      // The figure is a second old: it must have been seen to stop.
      for (let look = 0; (await facesPerSecond(screen)) !== 0; look++) {
        if (look > 40) throw new Error('the wall did not notice that its camera was gone');
        await pause(250);
      }
    }],
    ['server killed and started again', async () => {
      await product.kill();
      await pause(5000);
      await product.restart();
      scene = scenes[(scenes.indexOf(scene) + 1) % scenes.length];
      await tuner.change(wall.id, { sceneId: scene.id });
    }],
    ['page loaded anew without a network', async () => {
      await context.setOffline(true);
      await screen.reload();
      await back(screen, scene);
      await context.setOffline(false);
    }],
  ];
  for (let turn = 0; Date.now() < untilMs; turn++) {
    const [what, make] = troubles[turn % troubles.length];
    say(what);
    await make();
    const backS = await back(screen, scene);
    results.push({ what, backS, heapMB: await heapMB(screen) });
    say(`  shows and follows after ${backS.toFixed(1)} s; heap ${results.at(-1)!.heapMB.toFixed(1)} MB`);
    await pause(calmMs);
  }
  const reports = await tuner.reports(wall.id);
  say(`${reports.length} reports reached the desk; last error: ${reports.at(-1)?.lastError ?? 'none'}`);
} catch (error) {
  failure = String(error);
  say(failure);
} finally {
  await browser.close();
  await product.stop();
}
console.log(JSON.stringify({ minutes: Number(values.minutes), troubles: results.length, longestBackS: Math.max(0, ...results.map(({ backS }) => backS)), heapMB: results.map((one) => Number(one.heapMB.toFixed(1))), failure }));
process.exitCode = failure ? 1 : 0;
