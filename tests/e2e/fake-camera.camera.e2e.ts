import { BLOCK_PX, readFrameNumber } from '../bench/tracking/frame-number';
import type { FacePose } from '../video/face-path';
import { expect, test } from './fixtures';

const poses: FacePose[] = Array.from({ length: 30 }, (_, i) => ({
  segment: 'still',
  on: true,
  x: 200 + 8 * i,
  y: 220,
  ipd: 58,
  rollDeg: 0,
}));
test.use({ filmedFace: { name: 'steps-aside', poses } });

test('the fake camera shows the filmed face, frame after numbered frame', async ({ page, filmed }) => {
  await page.goto('/sign-in');
  const looks = await page.evaluate(async (rows) => {
    const video = document.createElement('video');
    video.srcObject = await navigator.mediaDevices.getUserMedia({ video: { width: 640, height: 480 } });
    await video.play();
    const context = new OffscreenCanvas(640, 480).getContext('2d', { willReadFrequently: true })!;
    const green: number[][] = [];
    for (let look = 0; look < 6; look++) {
      await new Promise((resolve) => video.requestVideoFrameCallback(resolve));
      context.drawImage(video, 0, 0);
      const { data } = context.getImageData(0, 480 - rows, 640, rows);
      green.push(Array.from({ length: 640 * rows }, (_, pixel) => data[4 * pixel + 1]));
    }
    return green;
  }, BLOCK_PX);
  const numbers = looks.map((green) => readFrameNumber(Uint8Array.from(green), 640, BLOCK_PX));
  const known = filmed!.truth.frames.map(({ i }) => i);
  for (const number of numbers) expect(known).toContain(number);
  expect(new Set(numbers).size).toBeGreaterThan(1);
});
