import type { CDPSession, Page } from '@playwright/test';
import { FIRST_STEP } from '@oriel/shared/ladder/steps';
import { rounded } from '../tracking/statistics';
import { figuresOf, secondsOf, type Figures } from './figures';
import type { Condition } from './options';
import type { Probe, Seen } from './probe';
import { keepBenchScreen, type Stand } from './stand';

type Probed = Window & { readonly orielProbe: Probe };

/** What one condition came to. */
export interface Measured extends Figures {
  /** Of the whole browser, all its processes and its camera: ms of processor time for each frame drawn, and seconds a second. */
  readonly processorMsPerFrame: number;
  readonly processorShare: number;
  /** The same share by kind of process. */
  readonly processorBy: Readonly<Record<string, number>>;
  /** As the product computes and shows it. */
  readonly graphicsMB: number;
  /** From asking for the page until its pictures were there and, with tracking, a face was followed. */
  readonly readyS: number;
  readonly ladderStep: number;
  readonly ladder: readonly { readonly atS: number; readonly from: number; readonly to: number; readonly reason: string }[];
  readonly drawingRates: readonly { readonly atS: number; readonly toPerS: number | null; readonly reason: string }[];
  readonly seconds: ReturnType<typeof secondsOf>;
}

const readyWithinMs = 120_000;
const quietMs = 2500;

/** Measures one condition on a browser of its own. @throws Error where the page does not come to show and follow. */
export async function measure(stand: Stand, condition: Condition, settleSeconds: number, seconds: number): Promise<Measured> {
  const { page: kind, layers, size, renderer, tracking, computer } = condition;
  const scene = await stand.scenes.scene(layers, size);
  if (kind === 'wall') await stand.hang(scene);
  const graphics = renderer === 'three' ? 'swiftshader' : 'software';
  return stand.onScreen({ size, graphics, camera: tracking === 'on', computer }, async (browser, context) => {
    const page = await context.newPage();
    await keepBenchScreen(page);
    let lastPictureMs = Date.now();
    page.on('requestfinished', (request) => {
      if (/\/images?\//.test(request.url())) lastPictureMs = Date.now();
    });
    const askedMs = Date.now();
    const address = kind === 'wall' ? '/wall' : `/play/${scene.id}`;
    await page.goto(`${address}?draw=${renderer}`, { timeout: readyWithinMs });
    await shown(page, kind, renderer, layers);
    if (tracking === 'on') await page.waitForFunction(() => (window as unknown as Probed).orielProbe.seen.looks.some(([, , found]) => found), null, { timeout: readyWithinMs, polling: 250 });
    while (Date.now() - lastPictureMs < quietMs) await page.waitForTimeout(100);
    const readyS = (Date.now() - askedMs) / 1000;
    await page.waitForTimeout(settleSeconds * 1000);

    const processes = await browser.newBrowserCDPSession();
    const begun = await processorSeconds(processes);
    const fromMs = await page.evaluate(() => performance.now());
    await page.waitForTimeout(seconds * 1000);
    const ended = await processorSeconds(processes);
    const [untilMs, seen] = await page.evaluate((): [number, Seen] => [performance.now(), (window as unknown as Probed).orielProbe.seen]);

    const figures = figuresOf(seen, fromMs, untilMs);
    const spanS = (untilMs - fromMs) / 1000;
    const by = Object.fromEntries(Object.entries(ended).map(([type, used]) => [type, rounded((used - (begun[type] ?? 0)) / spanS)]));
    const used = sum(ended) - sum(begun);
    return {
      ...figures,
      processorMsPerFrame: rounded((1000 * used) / Math.max(1, figures.framesPerS * spanS)),
      processorShare: rounded(used / spanS),
      processorBy: by,
      graphicsMB: await shownGraphicsMB(page),
      readyS: rounded(readyS),
      ladderStep: seen.changes.at(-1)?.to ?? FIRST_STEP,
      ladder: seen.changes.map(({ tMs, from, to, reason }) => ({ atS: rounded(tMs / 1000), from, to, reason })),
      drawingRates: seen.rateChanges.map(({ tMs, toPerS, reason }) => ({ atS: rounded(tMs / 1000), toPerS, reason })),
      seconds: secondsOf(seen, 0, untilMs, FIRST_STEP),
    };
  });
}

const sum = (used: Readonly<Record<string, number>>): number => Object.values(used).reduce((total, one) => total + one, 0);

async function shown(page: Page, kind: Condition['page'], renderer: Condition['renderer'], layers: number): Promise<void> {
  const picture = kind === 'wall' ? 'oriel-wall-picture .picture' : 'oriel-player .picture';
  if (renderer === 'css') {
    await page.waitForFunction(([root, count]) => document.querySelectorAll(`${root} img`).length === count, [picture, layers] as const, { timeout: readyWithinMs, polling: 250 });
    return;
  }
  await page.locator(`${picture} canvas`).waitFor({ timeout: readyWithinMs });
  await page.waitForFunction((count) => (window as unknown as Probed).orielProbe.held().textures >= count, layers, { timeout: readyWithinMs, polling: 250 });
}

/** Processor time used so far, s, by kind of process: browser, GPU, renderer, utility. */
async function processorSeconds(session: CDPSession): Promise<Record<string, number>> {
  const { processInfo } = await session.send('SystemInfo.getProcessInfo');
  const used: Record<string, number> = {};
  for (const { type, cpuTime } of processInfo) used[type] = (used[type] ?? 0) + cpuTime;
  return used;
}

async function shownGraphicsMB(page: Page): Promise<number> {
  await page.keyboard.press('i');
  const figure = page.locator('oriel-read-out dt', { hasText: 'Graphics memory' }).locator('xpath=following-sibling::dd[1]');
  return Number(await figure.innerText({ timeout: 20_000 }));
}
