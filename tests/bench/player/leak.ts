import type { CDPSession, Page } from '@playwright/test';
import { setTimeout as pause } from 'node:timers/promises';
import type { Condition } from './options';
import type { Held, Probe } from './probe';
import type { Stand } from './stand';

type Probed = Window & { readonly orielProbe: Probe };

/** What the wall's page holds after so many changes of its scene; heap and nodes after a collection of garbage. */
export interface Holding extends Held {
  readonly changes: number;
  readonly heapMB: number;
  readonly nodes: number;
  readonly listeners: number;
}

export interface LeakResult {
  readonly renderer: Condition['renderer'];
  readonly changes: number;
  readonly held: readonly Holding[];
  /** Change of the heap from the first tenth to the end, kB a scene change. */
  readonly heapKBPerChange: number;
}

const layers = [3, 5];
const shownWithinMs = 20_000;

/** Changes the wall's scene over and over, to and fro, and looks at what its page holds after each tenth. */
export async function changeScenes(stand: Stand, renderer: Condition['renderer'], changes: number, say: (words: string) => void): Promise<LeakResult> {
  const scenes = [await stand.scenes.scene(layers[0], '720p'), await stand.scenes.scene(layers[1], '720p')];
  await stand.hang(scenes[0]);
  const graphics = renderer === 'three' ? 'swiftshader' : 'software';
  return stand.onScreen({ size: '720p', graphics, camera: false, computer: 'unthrottled' }, async (_browser, context) => {
    const page = await context.newPage();
    await page.goto(`/wall?draw=${renderer}`);
    await shows(page, renderer, layers[0]);
    const session = await context.newCDPSession(page);
    const held: Holding[] = [];
    const tenth = Math.max(1, Math.floor(changes / 10));
    for (let change = 1; change <= changes; change++) {
      await stand.hang(scenes[change % 2]);
      await shows(page, renderer, layers[change % 2]);
      if (change % tenth > 0 && change < changes) continue;
      held.push(await holding(page, session, change));
      say(`${renderer}, after ${String(change)} scenes: ${JSON.stringify(held.at(-1))}`);
    }
    const [first, last] = [held[0], held.at(-1)!];
    const heapKBPerChange = last.changes > first.changes ? Math.round((1e5 * (last.heapMB - first.heapMB)) / (last.changes - first.changes)) / 100 : 0;
    return { renderer, changes, held, heapKBPerChange };
  });
}

async function shows(page: Page, renderer: Condition['renderer'], count: number): Promise<void> {
  const wait = { timeout: shownWithinMs, polling: 20 };
  if (renderer === 'css') await page.waitForFunction((wanted) => document.querySelectorAll('oriel-wall-picture .picture img').length === wanted, count, wait);
  else
    await page.waitForFunction(
      (wanted) => document.querySelectorAll('oriel-wall-picture .picture canvas').length === 1 && (window as unknown as Probed).orielProbe.held().textures === wanted,
      count,
      wait,
    );
}

async function holding(page: Page, session: CDPSession, changes: number): Promise<Holding> {
  await pause(500);
  await page.evaluate(() => (window as unknown as Probed).orielProbe.forget());
  // What finalizers let go is collected the second time.
  for (let time = 0; time < 2; time++) await session.send('HeapProfiler.collectGarbage');
  const { usedSize } = await session.send('Runtime.getHeapUsage');
  const { nodes, jsEventListeners } = await session.send('Memory.getDOMCounters');
  const held = await page.evaluate(() => (window as unknown as Probed).orielProbe.held());
  return { changes, heapMB: Math.round(usedSize / 1e4) / 100, nodes, listeners: jsEventListeners, ...held };
}
