import { boardPoses } from '../video/board-film';
import { expect, test } from './fixtures';
import { expectFieldMeasured, hang, step } from './walls/set-up';

const fieldDegrees = 60;
const fps = 30;
test.use({
  filmedThings: {
    name: 'board',
    hfovRad: (fieldDegrees * Math.PI) / 180,
    things: boardPoses.map((pose) => ({ ...pose, kind: 'board' as const, frames: 2 * fps })),
  },
});

const sureTo = (words: string) => Number(/± ?([\d.]+)°/.exec(words)?.[1]);

test('the field of view is measured with a printed board moved before the camera', async ({ signedInPage }) => {
  test.setTimeout(150_000);
  const page = await signedInPage('tuner');
  await hang(page);
  await step(page, 'Camera').click();
  await page.getByRole('button', { name: 'With a printed board' }).click();
  await page.getByRole('button', { name: 'Start the camera' }).click();
  await expect(page.getByText(/[1-9] of 14 views, .* corners seen/)).toBeVisible({ timeout: 45_000 });
  const result = page.getByText(/° across, corners met to/);
  await expect(result).toBeVisible({ timeout: 60_000 });
  expect(sureTo((await result.textContent()) ?? '')).toBeLessThan(1);
  await page.getByRole('button', { name: 'Take it' }).click();
  expect(await expectFieldMeasured(page, fieldDegrees)).toBeLessThan(1);
});
