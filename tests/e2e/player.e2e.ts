import { chromium, type Page } from '@playwright/test';
import { demoScene } from './asking';
import { atRest, framesPass } from './at-rest';
import { keepScreen } from './player/this-screen';
import { expect, test } from './fixtures';
import { chromiumPath, ignoredDefaults } from './set-up/chromium';
import { sessionFile } from './set-up/sessions';

const line = (page: Page) => page.getByTestId('player-line');
const layers = (page: Page) => page.locator('oriel-player .picture img');
const control = (page: Page, name: RegExp | string) => page.getByRole('toolbar').getByRole('button', { name });
const following = (page: Page) => page.getByRole('switch', { name: /Following/ });

/** Opens the player on the demo's ridge and waits for its layers. */
async function play(page: Page, query = ''): Promise<string> {
  await page.goto('/scenes');
  const scene = await demoScene(page);
  await page.goto(`/play/${scene.id}${query}`);
  await expect(layers(page)).toHaveCount(scene.document.layers.length);
  // Sharp pictures take the place of the first ones: no element found before that may be used after it.
  await page.waitForLoadState('networkidle');
  // The controls rest while the pointer does.
  await page.mouse.move(700, 440);
  return scene.id;
}

/** How far aside the farthest layer is drawn, px. */
const shiftOf = (page: Page) => layers(page).first().evaluate((element) => new DOMMatrix(getComputedStyle(element).transform).e);

/** The same once `act` has moved it and it has come to rest. */
async function shiftAfter(page: Page, act: () => Promise<unknown>): Promise<number> {
  const begun = await shiftOf(page);
  await act();
  await expect.poll(async () => Math.abs((await shiftOf(page)) - begun)).toBeGreaterThan(1);
  return atRest(page, () => shiftOf(page), 0.3);
}

test('before the first play the set-up is offered; played as it is, the camera is asked for and nobody is seen', async ({ signedInPage, expectAccessible }) => {
  const page = await signedInPage('viewer');
  await play(page);
  await expect(line(page)).toContainText('This screen has not been measured');
  await page.getByRole('button', { name: 'Play as it is' }).click();
  await expect(line(page)).toContainText('Nobody is in view', { timeout: 30_000 });
  await expect(line(page)).toContainText('The camera’s pictures stay in this page and are not kept.');
  await expectAccessible(page);
  await expect(line(page)).toBeHidden({ timeout: 15_000 });
  await page.reload();
  await expect(layers(page).first()).toBeVisible();
  await expect(page.getByText('This screen has not been measured')).toHaveCount(0);
});

test('following is switched off by an ordinary control, which is remembered; pointer and keys stand in', async ({ signedInPage }) => {
  const page = await signedInPage('viewer');
  await keepScreen(page);
  await play(page);
  await following(page).click();
  await expect(following(page)).toHaveAttribute('aria-checked', 'false');
  await expect(line(page)).toContainText('Look around with the pointer');
  await page.reload();
  await expect(following(page)).toHaveAttribute('aria-checked', 'false');
  await expect(layers(page).first()).toBeVisible();

  const fromRight = await shiftAfter(page, () => page.mouse.move(1300, 450));
  const fromLeft = await shiftAfter(page, () => page.mouse.move(140, 450));
  // Behind the glass a layer goes with the eye.
  expect(fromRight - fromLeft).toBeGreaterThan(50);
  const steppedRight = await shiftAfter(page, async () => {
    await page.keyboard.press('ArrowRight');
    await page.keyboard.press('ArrowRight');
  });
  expect(steppedRight).toBeGreaterThan(fromLeft + 5);
  expect(await shiftAfter(page, () => page.keyboard.press('Home'))).toBeGreaterThan(fromLeft + 50);
});

test('dragging stands in for the face while following is on', async ({ signedInPage }) => {
  const page = await signedInPage('viewer');
  await keepScreen(page);
  await play(page);
  await page.mouse.move(720, 450);
  await page.mouse.down();
  const begun = await shiftOf(page);
  let tremble = 0;
  // A hand that rests gives way to the face after four seconds, which a laden machine may need to draw where it is.
  const draggedTo = (x: number) => async () => {
    await page.mouse.move(x, 450 + (tremble = 1 - tremble));
    return (await shiftOf(page)) - begun;
  };
  await expect.poll(draggedTo(1350)).toBeGreaterThan(15);
  await expect.poll(draggedTo(90)).toBeLessThan(-15);
  await page.mouse.up();
});

test('the figures come and go with the letter i', async ({ signedInPage, expectAccessible }) => {
  const page = await signedInPage('viewer');
  await keepScreen(page);
  await play(page);
  const readOut = page.locator('oriel-read-out');
  await expect(readOut).toHaveCount(0);
  await page.keyboard.press('i');
  for (const words of ['Frames drawn a second', 'Faces tracked a second', 'Capture to drawing, ms', 'Eye, mm', 'Drawn by', 'the processor']) await expect(readOut).toContainText(words);
  await expect.poll(async () => Number(await readOut.locator('dd').first().textContent())).toBeGreaterThan(10);
  await expectAccessible(page);
  await page.keyboard.press('i');
  await expect(readOut).toHaveCount(0);
});

test('less motion is honoured: nothing follows or drifts until it is asked for', async ({ signedInPage }) => {
  const page = await signedInPage('viewer');
  await page.emulateMedia({ reducedMotion: 'reduce' });
  await keepScreen(page);
  await play(page);
  await expect(line(page)).toContainText('less motion');
  await expect(following(page)).toHaveAttribute('aria-checked', 'false');
  const before = await shiftOf(page);
  await page.mouse.move(1300, 300);
  await framesPass(page, 90);
  expect(await shiftOf(page)).toBe(before);
  await page.getByRole('button', { name: 'Follow my face' }).click();
  await expect(line(page)).toContainText(/camera|follow|Nobody/);
});

test('a camera refused is said, with how to allow it, and the picture plays on without', async ({ baseURL, expectToReadWell }) => {
  await inBrowserWith(baseURL!, ['--use-fake-device-for-media-stream'], async (page) => {
    await expect(line(page)).toContainText('The camera was refused. To allow it, click the sign left of the address', { timeout: 20_000 });
    await expectToReadWell(page);
    await page.getByRole('button', { name: 'Go on without' }).click();
    await expect(line(page)).toContainText('Look around with the pointer');
  });
});

test('a screen without a camera is told so', async ({ baseURL, expectToReadWell }) => {
  await inBrowserWith(baseURL!, ['--use-fake-ui-for-media-stream'], async (page) => {
    await expect(line(page)).toContainText('No camera was found', { timeout: 20_000 });
    await expectToReadWell(page);
    const right = await shiftAfter(page, () => page.mouse.move(1300, 450));
    const left = await shiftAfter(page, () => page.mouse.move(140, 450));
    expect(right - left).toBeGreaterThan(50);
  });
});

test('a camera in use elsewhere is told so, and taken up when it is free', async ({ signedInPage }) => {
  const page = await signedInPage('viewer');
  await keepScreen(page);
  // No second program can hold Chromium's fake camera: the browser's own answer is put in its place, once.
  await page.addInitScript(() => {
    const { mediaDevices } = navigator;
    const real = mediaDevices.getUserMedia.bind(mediaDevices);
    let busy = true;
    mediaDevices.getUserMedia = (wanted) => {
      if (!busy) return real(wanted);
      busy = false;
      return Promise.reject(new DOMException('Could not start video source', 'NotReadableError'));
    };
  });
  await play(page);
  await expect(line(page)).toContainText('in use elsewhere');
  await expect(line(page)).toContainText('Nobody is in view', { timeout: 30_000 });
});

test('a scene that is not there, and a server that is not, are told with a way on', async ({ signedInPage, expectAccessible, expectErrors }) => {
  expectErrors(/404/, /ERR_FAILED|Failed to load/);
  const page = await signedInPage('viewer');
  await page.goto('/play/00000000-0000-4000-8000-000000000000');
  await expect(page.getByRole('heading', { name: 'This scene is not here' })).toBeVisible();
  await expectAccessible(page);
  await page.getByRole('link', { name: 'Back' }).click();
  await expect(page).toHaveURL(/\/scenes/);

  const scene = await demoScene(page);
  await page.route('**/api/scenes/*', (route) => route.abort());
  await page.goto(`/play/${scene.id}`);
  await expect(page.getByText('The server cannot be reached.')).toBeVisible();
  await page.unroute('**/api/scenes/*');
  await page.getByRole('button', { name: 'Try again' }).click();
  await expect(layers(page).first()).toBeVisible();
});

test('layers that do not come are named, and loaded on another try', async ({ signedInPage, expectErrors }) => {
  expectErrors(/ERR_FAILED|Failed to load/);
  const page = await signedInPage('viewer');
  await keepScreen(page);
  await page.goto('/scenes');
  const scene = await demoScene(page);
  const sky = scene.document.layers.find(({ name }) => name === 'Sky')!;
  await page.route(`**/api/images/${sky.image.id}/*`, (route) => route.abort());
  await page.goto(`/play/${scene.id}`);
  await expect(line(page)).toContainText('The picture of the layer Sky could not be loaded.');
  await page.unroute(`**/api/images/${sky.image.id}/*`);
  await line(page).getByRole('button', { name: 'Try again' }).click();
  await expect(layers(page)).toHaveCount(scene.document.layers.length);
  await expect(page.getByText('could not be loaded')).toHaveCount(0);
});

test('Escape leads back to where the viewer came from', async ({ signedInPage }) => {
  const page = await signedInPage('viewer');
  await keepScreen(page);
  await play(page);
  await page.keyboard.press('Escape');
  await expect(page).toHaveURL(/\/scenes$/);
});

test('full screen on demand', async ({ signedInPage }) => {
  const page = await signedInPage('viewer');
  await keepScreen(page);
  await play(page);
  await control(page, 'Full screen').click();
  await expect.poll(() => page.evaluate(() => document.fullscreenElement?.tagName)).toBe('ORIEL-PLAYER');
  await page.keyboard.press('f');
  await expect.poll(() => page.evaluate(() => document.fullscreenElement)).toBeNull();
});

interface Counting {
  readonly counts: { readonly tracks: readonly MediaStreamTrack[]; readonly frames: number };
}

test('18 times opened and left, nothing stays behind', async ({ signedInPage }) => {
  test.setTimeout(240_000);
  const page = await signedInPage('viewer');
  await keepScreen(page);
  await page.addInitScript(() => {
    const counts = { tracks: [] as MediaStreamTrack[], frames: 0 };
    const { mediaDevices } = navigator;
    const real = mediaDevices.getUserMedia.bind(mediaDevices);
    mediaDevices.getUserMedia = async (wanted) => {
      const stream = await real(wanted);
      counts.tracks.push(...stream.getTracks());
      return stream;
    };
    const frame = window.requestAnimationFrame.bind(window);
    window.requestAnimationFrame = (callback) => {
      counts.frames++;
      return frame(callback);
    };
    Object.assign(window, { counts });
  });
  await page.goto('/scenes');
  const scene = await demoScene(page);
  const session = await page.context().newCDPSession(page);
  await session.send('Performance.enable');
  const measured = async () => {
    await session.send('HeapProfiler.collectGarbage');
    const { metrics } = await session.send('Performance.getMetrics');
    const of = (name: string) => metrics.find((metric) => metric.name === name)!.value;
    return { nodes: of('Nodes'), listeners: of('JSEventListeners'), heap: of('JSHeapUsedSize') };
  };
  let asked = 0;
  const visit = async () => {
    await page.evaluate((path) => {
      history.pushState(null, '', path);
      dispatchEvent(new PopStateEvent('popstate'));
    }, `/play/${scene.id}`);
    await expect(layers(page)).toHaveCount(scene.document.layers.length);
    await page.waitForFunction((before) => (window as unknown as Counting).counts.tracks.length > before, asked++);
    await page.evaluate(() => {
      history.pushState(null, '', '/account');
      dispatchEvent(new PopStateEvent('popstate'));
    });
    await expect(page.locator('oriel-player')).toHaveCount(0);
  };
  const settled = async () => {
    await expect.poll(() => page.workers()).toEqual([]);
    await atRest(page, async () => (await measured()).nodes, 5);
    return measured();
  };
  for (let i = 0; i < 6; i++) await visit();
  const early = await settled();
  for (let i = 6; i < 18; i++) await visit();
  const late = await settled();
  expect(late.nodes).toBeLessThan(early.nodes + 100);
  expect(late.listeners).toBeLessThan(early.listeners + 20);
  expect(late.heap).toBeLessThan(early.heap + 4e6);
  const left = await page.evaluate(async () => {
    const { counts } = window as unknown as Counting;
    const before = counts.frames;
    await new Promise((resolve) => setTimeout(resolve, 500));
    return { tracks: counts.tracks.length, live: counts.tracks.filter(({ readyState }) => readyState === 'live').length, frames: counts.frames - before };
  });
  expect(left.tracks).toBeGreaterThanOrEqual(18);
  expect(left.live).toBe(0);
  expect(left.frames).toBe(0);
});

/** Plays the demo in a browser of its own with other answers about cameras. */
async function inBrowserWith(baseURL: string, args: string[], check: (page: Page) => Promise<void>): Promise<void> {
  const browser = await chromium.launch({
    executablePath: chromiumPath,
    args: ['--headless=new', '--no-sandbox', '--disable-gpu', '--disable-background-networking', ...args],
    ignoreDefaultArgs: ignoredDefaults,
  });
  try {
    const page = await (await browser.newContext({ baseURL, viewport: { width: 1440, height: 900 }, storageState: sessionFile('viewer') })).newPage();
    await keepScreen(page);
    await play(page);
    await check(page);
  } finally {
    await browser.close();
  }
}
