import type { Page } from '@playwright/test';
import { boardPoses } from '../video/board-film';
import { expect, test } from './fixtures';
import { figureOf, hang, step, type } from './walls/set-up';

const fieldDegrees = 60;
const fps = 30;
/** How far behind the front of the camera its lens lies, mm. */
const behindFrontMm = 6;
const cards = { near: 200, far: 480 } as const;
const square = [0, 0, 0] as const;
test.use({
  filmedThings: {
    name: 'board-and-card',
    hfovRad: (fieldDegrees * Math.PI) / 180,
    things: [
      ...boardPoses.map((pose) => ({ ...pose, kind: 'board' as const, frames: 2 * fps })),
      ...[cards.near, cards.far].map((away) => ({ turn: square, place: [4, -3, away] as const, kind: 'card' as const, frames: 4 * fps })),
    ],
  },
});

const sureTo = (words: string) => Number(/± ?([\d.]+)°/.exec(words)?.[1]);

/** The measured field of view lies within twice its stated standard uncertainty of the truth, and what that means is said in mm on the glass. */
async function expectMeasured(page: Page): Promise<number> {
  const found = await figureOf(page, 'Field of view across');
  const sure = await figureOf(page, 'The field is sure to within ±');
  expect(Math.abs(found - fieldDegrees), `${found}° ± ${sure}°`).toBeLessThan(2 * sure);
  await expect(page.getByText(/^±[\d.]+° of view: ±[\d.]+ mm on the glass for a layer 100 mm behind/)).toBeVisible();
  return sure;
}

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
  expect(await expectMeasured(page)).toBeLessThan(1);
});

test('the field of view is measured with a card held at two distances', async ({ signedInPage }) => {
  test.setTimeout(150_000);
  const page = await signedInPage('tuner');
  await hang(page);
  await step(page, 'Camera').click();
  await page.getByRole('button', { name: 'Measure it with a card' }).click();
  await page.getByRole('button', { name: 'Start the camera' }).click();
  for (const shot of ['Near', 'Far'] as const) {
    const part = page.getByRole('region', { name: shot, exact: true });
    const away = cards[shot === 'Near' ? 'near' : 'far'];
    await type(page, `${shot}: camera to card`, String(away - behindFrontMm));
    const hold = part.getByRole('button', { name: /Hold/ });
    // Held five seconds later, whatever the film shows then: until it is the card at this distance.
    for (let edges: Edges | null = null; ; ) {
      await hold.click();
      await expect(hold).toBeDisabled();
      await expect(hold).toBeEnabled({ timeout: 20_000 });
      edges = await edgesIn(page, shot);
      if (!edges || !isAt(edges, away)) continue;
      await mark(page, shot, 'Left', edges.left);
      await mark(page, shot, 'Right', edges.right);
      break;
    }
  }
  await expect(page.getByText(/° across\. The lens lies \d+ ± \d+ mm behind the front/)).toBeVisible();
  await page.getByRole('button', { name: 'Take it' }).click();
  await expectMeasured(page);
});

interface Edges {
  readonly left: number;
  readonly right: number;
}

/** Where a person sees the edges of the light card in the held picture, on the row through its middle; null where no card is there. */
const edgesIn = (page: Page, shot: string): Promise<Edges | null> =>
  page.getByRole('region', { name: shot, exact: true }).getByRole('img', { name: 'The held picture' }).evaluate((canvas: HTMLCanvasElement) => {
    const { data } = canvas.getContext('2d')!.getImageData(0, Math.round(canvas.height / 2), canvas.width, 1);
    const light = Array.from({ length: canvas.width }, (_, x) => data[4 * x] > 155);
    const [left, right] = [light.indexOf(true), light.lastIndexOf(true) + 1];
    return left >= 0 && light.slice(left, right).every(Boolean) ? { left, right } : null;
  });

/** Seen at this distance, and not at the other: 85.60 mm through f = 320 / tan 30. */
const isAt = ({ left, right }: Edges, away: number) => Math.abs(right - left - (554.26 * 85.6) / away) < 8;

/** Moves a line by keys, as one does who wants it exact. */
async function mark(page: Page, shot: string, edge: 'Left' | 'Right', px: number): Promise<void> {
  const line = page.getByRole('region', { name: shot, exact: true }).getByRole('slider', { name: `${edge} edge of the card` });
  for (;;) {
    const way = px - Number(await line.getAttribute('aria-valuenow'));
    if (Math.abs(way) < 0.5) return;
    await line.press(`${Math.abs(way) >= 5 ? 'Shift+' : ''}${way > 0 ? 'ArrowRight' : 'ArrowLeft'}`);
  }
}
