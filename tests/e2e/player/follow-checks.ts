import type { Page } from '@playwright/test';
import type { RendererName } from '../../../src/app/player/renderer';
import { BLOCK_PX, readFrameNumber } from '../../bench/tracking/frame-number';
import { expect } from '../fixtures';
import type { FilmedTruth } from '../set-up/filmed-face';
import { type Pixels, centroid, pixelsOf } from './centroid';
import { discs, glass, ground, homeEye, makeFollowScene } from './follow-scene';
import { type Rest, restNames, restOf, settledMs } from './rest-poses';
import { keepScreen } from './this-screen';

interface Point {
  readonly x: number;
  readonly y: number;
}
interface Eye extends Point {
  readonly z: number;
}

/** As the screen is set up for the test: 60 degrees across, in the middle of the upper edge, looking straight ahead. */
const fieldDegrees = 60;
const usualEyeDistanceMm = 63;
/** The tracker's eye is the middle of the corners of both, 1.6 to 2.7 mm from that of the pupils, which moves a layer 300 mm behind by 1 to 1.6 px. */
const placeTolerancePx = 1.6;

/** Of so many pictures at a place the middle one counts. */
const looks = 3;

export interface Watched {
  /** What the window showed, several times, when the face rested at each place. */
  readonly pictures: Readonly<Record<Rest, readonly Buffer[]>>;
  /** The distance the player read out at the first rest, mm. */
  readonly centreZMm: number;
  /** How finely the player looked meanwhile, in its own words. */
  readonly looking: string;
}

/** Plays a scene of discs to a filmed face and keeps what is drawn when the face rests at each place. */
export async function watchRests(page: Page, renderer: RendererName): Promise<Watched> {
  await keepScreen(page, { widthMm: glass.widthMm, fieldDegrees });
  await page.goto('/scenes');
  const scene = await makeFollowScene(page);
  await page.goto(`/play/${scene.id}?draw=${renderer}`);
  await watchFrames(page);
  await page.keyboard.press('f');
  await page.waitForFunction(() => document.fullscreenElement);
  await page.keyboard.press('i');
  const readOut = page.locator('oriel-read-out');
  const figure = (name: string) => readOut.locator('dt', { hasText: name }).locator('xpath=following-sibling::dd[1]');
  await expect(figure('Drawn by')).toHaveText(renderer === 'css' ? 'the processor' : 'the graphics processor');
  // Figures, controls and words are there to be read, and out of the pictures.
  await page.addStyleTag({ content: 'oriel-player > :not(.picture) { visibility: hidden !important; }' });
  await expect.poll(async () => Number(await figure('Faces tracked').textContent()), { timeout: 60_000 }).toBeGreaterThan(0);
  const following = Date.now();

  const pictures: Partial<Record<Rest, Buffer[]>> = {};
  let eyeText = '';
  while (Object.keys(pictures).length < restNames.length) {
    const rest = restOf(await frameNow(page));
    if (!rest || pictures[rest] || Date.now() - following < settledMs) {
      await page.waitForTimeout(100);
      continue;
    }
    // A machine too busy to track proves nothing about where layers are put.
    await expect(readOut, 'this machine is too busy to follow a face').not.toContainText('no tracking', { timeout: 1 });
    const taken: Buffer[] = [];
    for (let look = 0; look < looks; look++) {
      const picture = await page.screenshot();
      if (restOf(await frameNow(page)) !== rest) break;
      taken.push(picture);
      // The figures are half a second old at most, and the eye has been at rest for longer.
      if (rest === 'centre') eyeText = (await figure('Eye').textContent())!;
    }
    if (taken.length > 0) pictures[rest] = taken;
  }
  return { pictures: pictures as Record<Rest, Buffer[]>, centreZMm: Number(eyeText.split(',')[2]), looking: (await figure('Looking by').textContent())! };
}

/** Opens the fake camera a second time in the page, to know which frame it shows. */
async function watchFrames(page: Page): Promise<void> {
  await page.evaluate(async () => {
    const video = document.createElement('video');
    video.srcObject = await navigator.mediaDevices.getUserMedia({ video: { width: 640, height: 480 } });
    await video.play();
    Object.assign(window, { frames: video });
  });
}

async function frameNow(page: Page): Promise<number> {
  const green = await page.evaluate(async (rows) => {
    const { frames } = window as unknown as { frames: HTMLVideoElement };
    await new Promise((resolve) => frames.requestVideoFrameCallback(resolve));
    const context = new OffscreenCanvas(640, rows).getContext('2d', { willReadFrequently: true })!;
    context.drawImage(frames, 0, rows - 480);
    const { data } = context.getImageData(0, 0, 640, rows);
    return Array.from({ length: 640 * rows }, (_, pixel) => data[4 * pixel + 1]);
  }, BLOCK_PX);
  return readFrameNumber(Uint8Array.from(green), 640, BLOCK_PX) ?? -1;
}

/**
 * The eye of each rest by the pinhole camera, mm from the middle of the screen, which the window fills: Z = f * 63 mm / eye distance in px, X and Y by the ray.
 * Pictures cannot tell a viewer's size from their distance, so one factor, found at the first rest, scales what the camera sees.
 */
export function trueEyes(truth: FilmedTruth, centreZMm: number): Record<Rest, Eye> {
  const focalPx = truth.W / 2 / Math.tan((fieldDegrees * Math.PI) / 360);
  const depth = (ipdPx: number) => (focalPx * usualEyeDistanceMm) / ipdPx;
  const frameOf = (rest: Rest) => truth.frames.find(({ i }) => restOf(i) === rest)!;
  const factor = centreZMm / depth(frameOf('centre').ipd);
  return Object.fromEntries(
    restNames.map((rest) => {
      const { ipd, re, le } = frameOf(rest);
      const z = depth(ipd) * factor;
      const x = (-((re[0] + le[0]) / 2 - truth.W / 2) * z) / focalPx;
      const y = glass.heightMm / 2 - (((re[1] + le[1]) / 2 - truth.H / 2) * z) / focalPx;
      return [rest, { x, y, z }];
    }),
  ) as Record<Rest, Eye>;
}

/** Where the pinhole model puts a disc: P = G (hz+d)/hz - H d/hz, S = P ez/(ez+d) + E d/(ez+d); mm from the middle of the glass. */
function predicted({ xMm, yMm, depthMm: d }: (typeof discs)[number], eye: Eye): Point {
  const place = (onGlass: number, home: number, at: number) => {
    const inPlane = (onGlass * (homeEye.z + d) - home * d) / homeEye.z;
    return (inPlane * eye.z + at * d) / (eye.z + d);
  };
  return { x: place(xMm, homeEye.x, eye.x), y: place(yMm, homeEye.y, eye.y) };
}

/** Where a disc is drawn, px from the middle of the window, y upward: the median of several pictures; looked for about where it should be. */
function drawn(pictures: readonly Pixels[], disc: (typeof discs)[number], about: Point): Point {
  const places = pictures.map((pixels) => {
    const { width, height } = pixels;
    const { x, y } = centroid(pixels, ground, { x: width / 2 + about.x, y: height / 2 - about.y }, (disc.widthMm * width) / glass.widthMm, 40);
    return { x: x - width / 2, y: height / 2 - y };
  });
  return { x: median(places.map(({ x }) => x)), y: median(places.map(({ y }) => y)) };
}

const median = (values: readonly number[]) => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)];

/** Holds what was drawn against the pinhole model: from rest to rest, every disc has moved as it must, and the right way. */
export async function expectFollowed({ pictures, centreZMm, looking }: Watched, truth: FilmedTruth): Promise<void> {
  const eyes = trueEyes(truth, centreZMm);
  const faults: string[] = [];
  for (const disc of discs) {
    const places = await Promise.all(
      restNames.map(async (rest) => {
        const pixels = await Promise.all(pictures[rest].map(pixelsOf));
        const perMm = pixels[0].width / glass.widthMm;
        const onGlass = predicted(disc, eyes[rest]);
        const place = { x: onGlass.x * perMm, y: onGlass.y * perMm };
        return { rest, place, seen: drawn(pixels, disc, place) };
      }),
    );
    const [start] = places;
    const astray = Math.hypot(start.seen.x - start.place.x, start.seen.y - start.place.y);
    if (astray > placeTolerancePx) faults.push(`${disc.name} stands ${astray.toFixed(2)} px from its place at the first rest`);
    for (const { rest, place, seen } of places) {
      const shift = { x: place.x - start.place.x, y: place.y - start.place.y };
      const moved = { x: seen.x - start.seen.x, y: seen.y - start.seen.y };
      const error = Math.hypot(moved.x - shift.x, moved.y - shift.y);
      const report = `${disc.name}, ${rest}: moved ${moved.x.toFixed(2)}, ${moved.y.toFixed(2)} px of ${shift.x.toFixed(2)}, ${shift.y.toFixed(2)}`;
      if (error > Math.max(1, 0.015 * Math.hypot(shift.x, shift.y))) faults.push(report);
      for (const axis of ['x', 'y'] as const)
        if (Math.abs(shift[axis]) > 3 && Math.sign(shift[axis]) !== Math.sign(moved[axis])) faults.push(`${report}: the wrong way`);
    }
  }
  expect(faults, `looking by ${looking}`).toEqual([]);
}
