import { chromium, type Page } from '@playwright/test';
import { mkdir, rm } from 'node:fs/promises';
import { cpus } from 'node:os';
import { parseArgs } from 'node:util';
import { demoAccount } from '../../e2e/demo-accounts';
import { signIn } from '../../e2e/fixtures';
import { chromiumArguments, chromiumPath, ignoredDefaults } from '../../e2e/set-up/chromium';
import { startProduct } from '../../e2e/set-up/product';
import { fillHousehold } from './fill';
import { makePictures } from './pictures';
import { framesSeen, held, rest, watchFrames } from './probe';
import { byScrollBar, byWheel, toTop } from './scroll';

/*
 * The gallery with many photos: npm run bench:gallery -- [--photos 10000] [--pictures 36] [--shots FOLDER]. A few dozen distinct pictures
 * are uploaded as a person does; the rest are rows of their own over the same files. The sheet is then scrolled from top to bottom by the
 * wheel, and by dragging the scroll bar. The last line is one JSON object.
 */
const { values } = parseArgs({ options: { photos: { type: 'string', default: '10000' }, pictures: { type: 'string', default: '36' }, shots: { type: 'string' } } });
const wanted = { photos: Number(values.photos), pictures: Number(values.pictures) };
const say = (words: string): void => console.log(words);

async function shoot(page: Page, name: string): Promise<void> {
  if (values.shots) await page.screenshot({ path: `${values.shots}/${name}.png` });
}

/** Uploads the pictures and waits until every one of them is to be seen. */
async function upload(page: Page, files: string[]): Promise<void> {
  await page.goto('/photos');
  await page.locator('input[type=file][multiple]').setInputFiles(files);
  await page.getByText(`${files.length} kept`).waitFor({ timeout: 300_000 });
  await page.getByText('Being prepared…').first().waitFor({ state: 'detached', timeout: 300_000 });
}

async function measured(page: Page, how: typeof byWheel, name: string): Promise<object> {
  await watchFrames(page);
  const { px } = await how(page, () => shoot(page, `${name}-midway`));
  const atRest = await rest(page);
  await shoot(page, `${name}-at-rest`);
  const result = { px, ...(await framesSeen(page)), rest: atRest };
  say(`${name}: ${JSON.stringify(result)}`);
  return result;
}

if (values.shots) await mkdir(values.shots, { recursive: true });
const { folder, files } = await makePictures(wanted.pictures);
const product = await startProduct();
const browser = await chromium.launch({ executablePath: chromiumPath, args: chromiumArguments('software', null), ignoreDefaultArgs: ignoredDefaults });
try {
  const context = await browser.newContext({ baseURL: product.url, viewport: { width: 1440, height: 900 }, locale: 'en-GB' });
  // The compiler that runs this names functions by a helper of its own, which a page does not have.
  await context.addInitScript({ content: 'globalThis.__name = (named) => named;' });
  const page = await context.newPage();
  const { email, password } = demoAccount('designer');
  await signIn(page, email, password);
  await upload(page, files);
  await fillHousehold(product, 'picture-%', wanted.photos - files.length - 3);
  say(`${wanted.photos} photos, ${wanted.pictures} distinct pictures among them.`);

  await page.goto('about:blank');
  const asked = Date.now();
  await page.goto('/photos');
  await page.locator('oriel-contact-sheet img.here').first().waitFor();
  const opened = { firstPictureMs: Date.now() - asked, ...(await rest(page)), ...(await held(page)) };
  await shoot(page, 'opened');
  say(`opened: ${JSON.stringify(opened)}`);

  const wheel = await measured(page, byWheel, 'wheel');
  const afterWheel = await held(page);
  await toTop(page);
  await page.waitForTimeout(1000);
  const scrollBar = await measured(page, byScrollBar, 'scroll-bar');
  const afterScrollBar = await held(page);
  const machine = { processor: cpus()[0].model, cores: cpus().length };
  say(JSON.stringify({ ...wanted, machine, opened, wheel: { ...wheel, ...afterWheel }, scrollBar: { ...scrollBar, ...afterScrollBar } }));
} finally {
  await browser.close();
  await product.stop();
  await rm(folder, { recursive: true, force: true });
}
