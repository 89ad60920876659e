import sharp from 'sharp';
import { isClearFrom } from '../../shared/projection/eye-room';
import { retarget } from '../../shared/projection/retarget';
import type { FacePose } from '../video/face-path';
import { expect, test } from './fixtures';
import { demoScene } from './asking';
import { atRest } from './at-rest';
import { keepScreen } from './player/this-screen';

/** A face high up and far aside: 63 mm between the eyes, seen 90 degrees across (f = 320 px), stand 350 mm away. */
const pose: FacePose = { segment: 'aside', on: true, x: 110, y: 70, ipd: 58, rollDeg: 0 };
const fieldDegrees = 90;
const focalPx = 320 / Math.tan((fieldDegrees * Math.PI) / 360);
const widthMm = 240;
const viewport = { width: 1280, height: 720 };
test.use({ filmedFace: { name: 'aside', poses: Array.from({ length: 30 }, () => pose) }, viewport });

/** A colour that no photograph holds, put behind the layers. */
const isVoid = (red: number, green: number, blue: number) => red > 235 && green < 25 && blue > 235;

test('on a small glass a clear scene never tears, however far outside its zone the viewer stands', async ({ signedInPage, expectAccessible }) => {
  test.setTimeout(120_000);
  const page = await signedInPage('viewer');
  await keepScreen(page, { widthMm, fieldDegrees });
  await page.goto('/scenes');
  const scene = await demoScene(page);
  const glass = { widthMm, heightMm: (widthMm * 9) / 16 };
  const awayMm = (63 / pose.ipd) * focalPx;
  const eye = { x: ((320 - pose.x) / focalPx) * awayMm, y: glass.heightMm / 2 + ((240 - pose.y) / focalPx) * awayMm, z: awayMm };
  const there = { leftMm: eye.x, rightMm: eye.x, lowestMm: eye.y, highestMm: eye.y, nearestMm: eye.z, farthestMm: eye.z };
  const small = retarget(scene.document, glass);
  // Drawn for that eye itself, an edge would show.
  expect([isClearFrom(small, small.zone), isClearFrom(small, there)]).toEqual([true, false]);

  await page.goto(`/play/${scene.id}?draw=css`);
  await expect(page.locator('oriel-player .picture img')).toHaveCount(scene.document.layers.length);
  await page.addStyleTag({ content: 'oriel-player .picture > div { background: #f0f }' });
  await page.keyboard.press('f');
  await page.waitForFunction(() => document.fullscreenElement);
  await page.keyboard.press('i');
  const readOut = page.locator('oriel-read-out dd');
  await expect.poll(async () => Number(await readOut.nth(1).textContent()), { timeout: 40_000 }).toBeGreaterThan(5);
  // The picture is that of a viewer who stands aside: the nearest layer has moved from where it rests.
  const eyeRead = async () => (await readOut.nth(3).textContent())!.split(',').map(Number);
  await expect.poll(async () => Math.abs((await eyeRead())[0])).toBeGreaterThan(40);
  // The figures are told anew twice a second.
  await atRest(page, async () => (await eyeRead())[0], 2, 45);
  expect((await eyeRead())[1]).toBeGreaterThan(20);

  const onlyPicture = 'oriel-player > :not(.picture) { visibility: hidden !important; }';
  const { data, info } = await sharp(await page.screenshot({ style: onlyPicture })).removeAlpha().raw().toBuffer({ resolveWithObject: true });
  expect([info.width, info.height]).toEqual([viewport.width, viewport.height]);
  let torn = 0;
  for (let at = 0; at < data.length; at += 3) if (isVoid(data[at], data[at + 1], data[at + 2])) torn++;
  expect(torn).toBe(0);
  await expectAccessible(page);
});
