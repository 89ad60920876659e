import type { Page } from '@playwright/test';
import type { RendererName } from '../../src/app/player/renderer';
import { framesPass } from './at-rest';
import { openBench, type PictureSource } from './player/bench-page';
import { centroid, pixelsOf } from './player/centroid';
import { ground, markerScene, pictureOf } from './player/marker-scene';
import { viewport } from './player/renderer-checks';
import { expect, test } from './fixtures';

test.use({ graphics: 'swiftshader', viewport });

const renderers: RendererName[] = ['css', 'three'];
const { document: scene } = markerScene();
const load = (page: Page, name: RendererName) => page.evaluate(([name, scene]) => window.bench.load(name, scene), [name, scene] as const);
const sharp = (page: Page) => page.waitForFunction(() => window.bench.facts()?.sharp);

/** Keeps account of what is asked for; fails the first `failures` requests for each picture in `failing`. */
function watched(failing: (imageId: string, edge: number) => number = () => 0) {
  const asked: string[] = [];
  const source: PictureSource = async (imageId, edge) => {
    const picture = `${Number(imageId.slice(-12))}/${edge}`;
    asked.push(picture);
    return asked.filter((one) => one === picture).length <= failing(imageId, edge) ? null : pictureOf(imageId, edge);
  };
  return { asked, source };
}

for (const name of renderers) {
  test(`${name} asks for small pictures first, then for no more than the screen can show`, async ({ page }) => {
    const { asked, source } = watched();
    await openBench(page, source);
    expect((await load(page, name)).missing).toEqual([]);
    await sharp(page);
    expect(asked.slice(0, 6).sort()).toEqual(['0/320', '1/320', '2/320', '3/320', '4/320', '5/320']);
    // Images of 640 px: the ground is magnified beyond that; of the markers only the one 1500 mm behind is ever seen wider than 320 px.
    expect(asked.slice(6).sort()).toEqual(['0/800', '1/800']);
  });

  test(`${name} tries a lost picture again, and names what does not come`, async ({ page, expectErrors }) => {
    expectErrors(/404/);
    const { source } = watched((imageId, edge) => (imageId.endsWith('2') && edge === 320 ? 2 : imageId.endsWith('3') ? 99 : 0));
    await openBench(page, source);
    expect((await load(page, name)).missing).toEqual(['Marker 2']);
    const pixels = await pixelsOf(await page.screenshot());
    expect(centroid(pixels, ground, { x: 640, y: 400 }, 2000).weight).toBeGreaterThan(0);
  });

  test(`${name} frees everything, on leaving and between scenes`, async ({ page }) => {
    await openBench(page, watched().source);
    await load(page, name);
    await sharp(page);
    const first = await page.evaluate(() => window.bench.facts());
    for (let again = 0; again < 10; again++) await load(page, name);
    await sharp(page);
    expect(await page.evaluate(() => window.bench.facts())).toEqual(first);
    expect(await page.evaluate(() => window.bench.dispose())).toEqual({ name, layers: 0, pictureBytes: 0, graphicsBytes: 0, held: 0, sharp: false });
    expect(await page.evaluate(() => document.querySelectorAll('#host *').length)).toBe(0);
  });

  test(`${name} left while pictures are on their way shows none of them`, async ({ page }) => {
    const underWay = { asked: 0, answered: 0 };
    await openBench(page, async (imageId, edge) => {
      underWay.asked++;
      await new Promise((resolve) => setTimeout(resolve, 500));
      const picture = await pictureOf(imageId, edge);
      underWay.answered++;
      return picture;
    });
    const facts = await page.evaluate(
      ([name, scene]) => {
        const loading = window.bench.load(name, scene);
        return new Promise<unknown>((resolve) => setTimeout(() => {
          const gone = window.bench.dispose();
          void loading.then(() => resolve(gone));
        }, 200));
      },
      [name, scene] as const,
    );
    expect(facts).toMatchObject({ layers: 0, held: 0, pictureBytes: 0 });
    expect(underWay.asked).toBeGreaterThan(0);
    await expect.poll(() => underWay.answered).toBe(underWay.asked);
    await framesPass(page, 12);
    expect(await page.evaluate(() => document.querySelectorAll('#host *').length)).toBe(0);
  });
}

test('three says when the graphics processor takes its context away', async ({ page }) => {
  await openBench(page, watched().source);
  await load(page, 'three');
  await page.evaluate(() => window.bench.loseContext());
  await page.waitForFunction(() => window.bench.lost);
});
