import { expect, type Page } from '@playwright/test';

/** The pictures of the scene a wall shows, in the order in which they came. */
export const shownLayers = (page: Page) => page.locator('oriel-wall-picture .picture img');

/** Their addresses, as far as they are drawn, the farthest first. */
export const picturesOn = (page: Page) =>
  shownLayers(page).evaluateAll((images) =>
    (images as HTMLImageElement[])
      .filter(({ naturalWidth }) => naturalWidth > 0)
      .sort((a, b) => Number(a.style.zIndex) - Number(b.style.zIndex))
      .map((image) => image.getAttribute('src') ?? ''),
  );

/** The code on a screen that is not paired. */
export async function codeOn(page: Page): Promise<string> {
  const sign = page.locator('oriel-pairing-screen .sign');
  await expect(sign).toBeVisible({ timeout: 20_000 });
  return (await sign.innerText()).replace(/\s/g, '');
}

/** Waits until the screen's service worker holds the page and the tracker. */
export async function keepsItsPage(page: Page): Promise<void> {
  const lacking = () =>
    page.evaluate(async () => {
      const { assetGroups } = (await (await fetch('/ngsw.json?ngsw-cache-bust=0')).json()) as { assetGroups: { urls: string[] }[] };
      // Under /latest Angular's worker writes down which version it holds: without it, started anew, it holds none.
      const needed = [...assetGroups.flatMap(({ urls }) => urls), '/latest'];
      const kept = await Promise.all(needed.map((address) => caches.match(address, { ignoreVary: true })));
      return navigator.serviceWorker.controller === null ? needed : needed.filter((_address, index) => !kept[index]);
    });
  await expect.poll(lacking, { timeout: 60_000 }).toEqual([]);
}

/** Waits until the screen holds all it needs to start without a network: the page, the tracker, and the pictures it shows. */
export async function readyForOffline(page: Page): Promise<void> {
  await keepsItsPage(page);
  const lacking = () =>
    page.evaluate(async () => {
      const shown = [...document.querySelectorAll<HTMLImageElement>('oriel-wall-picture .picture img')].map(({ src }) => src);
      const kept = await Promise.all(shown.map((address) => caches.match(address, { ignoreVary: true })));
      return shown.length === 0 ? ['a picture'] : shown.filter((_address, index) => !kept[index]);
    });
  await expect.poll(lacking, { timeout: 60_000 }).toEqual([]);
}

/** How far right the nearest layer is drawn, px. */
export const placeOf = (page: Page) =>
  shownLayers(page).evaluateAll((images) => {
    const nearest = (images as HTMLImageElement[]).reduce((a, b) => (Number(b.style.zIndex) > Number(a.style.zIndex) ? b : a));
    return new DOMMatrix(getComputedStyle(nearest).transform).e;
  });
