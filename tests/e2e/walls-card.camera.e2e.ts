import type { Locator, Page } from '@playwright/test';
import { expect, test } from './fixtures';
import { expectFieldMeasured, hang, step, type } from './walls/set-up';

const fieldDegrees = 60;
/** How far behind the front of the camera its lens lies, mm. */
const behindFrontMm = 6;
const cards = { near: 200, far: 480 } as const;
test.use({
  filmedThings: {
    name: 'card',
    hfovRad: (fieldDegrees * Math.PI) / 180,
    things: [cards.near, cards.far].map((away) => ({ turn: [0, 0, 0] as const, place: [4, -3, away] as const, kind: 'card' as const, frames: 8 * 30 })),
  },
});

test('the field of view is measured with a card held at two distances', async ({ signedInPage }) => {
  test.setTimeout(150_000);
  const page = await signedInPage('tuner');
  await hang(page);
  await step(page, 'Camera').click();
  await page.getByRole('button', { name: 'Measure it with a card' }).click();
  const heading = page.getByRole('heading', { name: 'The field of view, with a card' });
  await expect(heading).toBeFocused();
  await expect(heading).toBeInViewport();
  await page.getByRole('button', { name: 'Start the camera' }).click();
  for (const shot of ['Near', 'Far'] as const) {
    const part = page.getByRole('region', { name: shot, exact: true });
    const away = cards[shot === 'Near' ? 'near' : 'far'];
    await type(page, `${shot}: camera to card`, String(away - behindFrontMm));
    const hold = part.getByRole('button', { name: /Hold/ });
    // Held five seconds later, whatever the film shows then: until it is the card at this distance.
    for (;;) {
      await hold.click();
      await expect(hold).toBeDisabled();
      await expect(hold).toBeEnabled({ timeout: 20_000 });
      for (const picture of await part.getByRole('img').all()) expect(await isDrawn(picture), 'the held picture is seen before a line is moved').toBe(true);
      const edges = await edgesIn(page, shot);
      if (!edges || !isAt(edges, away)) continue;
      await mark(page, shot, 'Left', edges.left);
      await mark(page, shot, 'Right', edges.right);
      break;
    }
  }
  await expect(page.getByText(/° across\. The lens lies \d+ ± \d+ mm behind the front/)).toBeVisible();
  await page.getByRole('button', { name: 'Take it' }).click();
  await expectFieldMeasured(page, fieldDegrees);
});

/** Whether every px of a canvas is painted. */
const isDrawn = (canvas: Locator): Promise<boolean> =>
  canvas.evaluate((element: HTMLCanvasElement) => {
    const { data } = element.getContext('2d')!.getImageData(0, 0, element.width, element.height);
    return data.every((value, i) => i % 4 !== 3 || value === 255);
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
