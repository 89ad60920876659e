import type { Browser, Page } from '@playwright/test';
import type { RendererName } from '../../../src/app/player/renderer';
import { expect } from '../fixtures';
import { openBench } from './bench-page';
import { centroid, pixelAt, pixelsOf } from './centroid';
import { type Marker, ground, markerScene, pictureOf } from './marker-scene';

/** CSS px a millimetre on the bench page, whose window shows the whole glass. */
const pxPerMm = 4;
export const viewport = { width: 1280, height: 800 };
const eyes = [
  { x: 10, y: -20, z: 600 },
  { x: 0, y: 0, z: 600 },
  { x: 100.3, y: 0, z: 600 },
  { x: -87.7, y: 41.9, z: 700 },
  { x: 60.5, y: -40.25, z: 450 },
];

/** A page of its own, with the bench and the markers' pictures. */
export async function benchOf(browser: Browser, deviceScaleFactor: number): Promise<Page> {
  const page = await (await browser.newContext({ viewport, deviceScaleFactor })).newPage();
  await openBench(page, pictureOf);
  return page;
}

/**
 * Where the pinhole model puts a marker's centroid, CSS px from the upper left corner of the window: placed on the glass from the home eye
 * H as G, so at P = G (hz+d)/hz - H d/hz in its own plane, seen at S = P ez/(ez+d) + E d/(ez+d).
 */
function predicted({ layer, across, down }: Marker, home: { x: number; y: number; z: number }, eye: { x: number; y: number; z: number }) {
  const { placed, depthMm: d } = layer;
  const onGlass = { x: placed.xMm + (across - 0.5) * placed.widthMm, y: placed.yMm + (0.5 - down) * placed.heightMm };
  const point = (['x', 'y'] as const).map((axis) => (onGlass[axis] * (home.z + d) - home[axis] * d) / home.z);
  const [sx, sy] = [(point[0] * eye.z + eye.x * d) / (eye.z + d), (point[1] * eye.z + eye.y * d) / (eye.z + d)];
  return { x: viewport.width / 2 + sx * pxPerMm, y: viewport.height / 2 - sy * pxPerMm };
}

/** Measures every marker from every eye in rendered pixels; gives the largest distance from the formula, device px. */
export async function worstPlace(page: Page, name: RendererName, deviceScaleFactor: number): Promise<number> {
  const { document, markers } = markerScene();
  const outcome = await page.evaluate(([name, document]) => window.bench.load(name, document), [name, document] as const);
  expect(outcome.missing).toEqual([]);
  await page.waitForFunction(() => window.bench.facts()?.sharp);
  let worst = 0;
  for (const eye of eyes) {
    await page.evaluate((eye) => window.bench.draw(eye), eye);
    const pixels = await pixelsOf(await page.screenshot());
    for (const marker of markers) {
      const { x, y } = predicted(marker, document.homeEye, eye);
      const d = marker.layer.depthMm;
      const growth = ((document.homeEye.z + d) / document.homeEye.z) * (eye.z / (eye.z + d));
      const radius = marker.radiusShare * marker.layer.placed.widthMm * growth * pxPerMm;
      const at = { x: x * deviceScaleFactor, y: y * deviceScaleFactor };
      const seen = centroid(pixels, ground, at, (radius + 6) * deviceScaleFactor);
      worst = Math.max(worst, Math.hypot(seen.x - at.x, seen.y - at.y));
    }
  }
  return worst;
}

/** The colour in the middle of each marker, and what it should be: over the ground with the layer's opacity, in sRGB as encoded. */
export async function middleColours(page: Page, deviceScaleFactor: number): Promise<{ seen: number[]; wanted: number[] }[]> {
  const { document, markers } = markerScene();
  await page.evaluate((eye) => window.bench.draw(eye), document.homeEye);
  const pixels = await pixelsOf(await page.screenshot());
  return markers.map((marker) => {
    const { x, y } = predicted(marker, document.homeEye, document.homeEye);
    const { opacity } = marker.layer;
    return {
      seen: pixelAt(pixels, x * deviceScaleFactor, y * deviceScaleFactor),
      wanted: marker.colour.map((value, channel) => value * opacity + ground[channel] * (1 - opacity)),
    };
  });
}
