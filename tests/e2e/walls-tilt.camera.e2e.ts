import { rayOfPixel } from '../../shared/viewer/camera';
import type { FacePose } from '../video/face-path';
import { expect, test } from './fixtures';
import { figureOf, hang, step, type, unfold } from './walls/set-up';

/** Someone who stands still, a little left of the middle of the picture and above it. */
const pose: FacePose = { segment: 'stands', on: true, x: 290, y: 215, ipd: 50, rollDeg: 0 };
test.use({ filmedFace: { name: 'stands', poses: Array.from({ length: 30 }, () => pose) } });

const truth = { pitchDegrees: -8, yawDegrees: 3 } as const;
const radians = (degrees: number) => (degrees * Math.PI) / 180;

test('the camera’s tilt is measured by standing at a marked spot', async ({ signedInPage }) => {
  test.setTimeout(120_000);
  const page = await signedInPage('tuner');
  await hang(page);
  await step(page, 'Camera').click();
  const lens = { x: 0, y: 279.5, z: 0 };
  await unfold(page, 'To the millimetre');
  expect(await figureOf(page, 'Above the centre')).toBe(lens.y);
  const camera = { position: lens, pitchRad: radians(truth.pitchDegrees), yawRad: radians(truth.yawDegrees), rollRad: 0, hfovRad: Math.PI / 3, mirrored: false, widthPx: 640, heightPx: 480 };
  const ray = rayOfPixel(camera, pose.x, pose.y);
  // The spot over which that camera sees the eye there, 700 mm before the glass.
  await page.getByRole('button', { name: 'Measure it by standing at a spot' }).click();
  await type(page, 'From the glass', '700');
  await type(page, 'Right of its centre', String((lens.x + (700 * ray.x) / ray.z).toFixed(1)));
  await type(page, 'Eyes above its centre', String((lens.y + (700 * ray.y) / ray.z).toFixed(1)));
  await page.getByRole('button', { name: 'Start, and walk to the spot' }).click();
  await expect(page.getByText('You are seen. Stand still and look at the glass.')).toBeVisible({ timeout: 60_000 });
  await expect(page.getByText(/^\d+ readings$/)).toBeVisible();
  await expect(page.getByText(/^Done, \d+ readings. You may move.$/)).toBeVisible({ timeout: 20_000 });
  await expect(page.getByText(/^Turned [\d.]+° down \(±[\d.]+°\) and [\d.]+° to the right \(±[\d.]+°\)\. That is ±[\d.]+ mm on the glass/)).toBeVisible({ timeout: 60_000 });
  await page.getByRole('button', { name: 'Take it' }).click();
  await unfold(page, 'Turned sideways, rolled, how sure');
  const sure = await figureOf(page, 'The turn is sure to within ±');
  expect(sure).toBeLessThan(3);
  expect(Math.abs((await figureOf(page, 'Up (down is negative)')) - truth.pitchDegrees)).toBeLessThan(sure);
  expect(Math.abs((await figureOf(page, 'To the viewer’s right')) - truth.yawDegrees)).toBeLessThan(sure);
  await expect(page.getByText(/^±[\d.]+° of turn: ±[\d.]+ mm on the glass/)).toBeVisible();
});
