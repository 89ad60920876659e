import { chromium } from '@playwright/test';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { parseArgs } from 'node:util';
import { bundleBench } from './bundle';
import { matchTruth } from './match-truth';
import { asMjpeg } from './mjpeg-file';
import type { replay } from './bench-page';
import { scoreLooks, scoreSegments } from './score';
import { serveBench } from './serve';
import { truthSchema } from './truth';

const USAGE = 'npm run bench:tracking -- --video FILE.mjpeg --truth FILE.json';
const CHROMIUM_FLAGS = [
  '--headless=new',
  '--no-sandbox',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--disable-gpu',
];
/** Taken where the truth knows no distances: no figure of such a truth depends on it. */
const USUAL_HFOV_RAD = Math.PI / 3;
/** npm runs scripts in the project's folder; files are meant as seen from where it was called. */
const CALLED_FROM = process.env['INIT_CWD'] ?? '.';
const trackerFiles = fileURLToPath(new URL('../../../assets/tracker', import.meta.url));

async function main(): Promise<void> {
  const { values } = parseArgs({
    options: { video: { type: 'string' }, truth: { type: 'string' } },
  });
  if (!values.video || !values.truth) throw new Error(`Say which video and which truth: ${USAGE}`);
  const truth = truthSchema.parse(JSON.parse(await readFile(resolve(CALLED_FROM, values.truth), 'utf8')));
  const folder = await mkdtemp(join(tmpdir(), 'oriel-bench-'));
  try {
    const [video] = await Promise.all([asMjpeg(resolve(CALLED_FROM, values.video), folder), bundleBench(folder)]);
    const server = await serveBench(folder, trackerFiles, video);
    const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: CHROMIUM_FLAGS });
    try {
      const page = await browser.newPage();
      await page.goto(server.url);
      await page.waitForFunction(() => 'replay' in globalThis);
      console.log(`replaying ${values.video} through both engines…`);
      const results = await page.evaluate(
        ([fps, hfovRad, ipdMm]) => (globalThis as unknown as { replay: typeof replay }).replay(fps, hfovRad, ipdMm),
        [truth.fps, truth.hfovRad ?? USUAL_HFOV_RAD, truth.ipdMm] as const,
      );
      const { truths, matched } = matchTruth(truth, results);
      console.log(`${String(results.length)} frames, ${String(matched.length)} matched to their truth`);
      const orielLooks = matched.map((frame) => frame.oriel);
      const referenceLooks = matched.map((frame) => frame.reference);
      const of = (score: typeof scoreLooks | typeof scoreSegments): string =>
        JSON.stringify({
          oriel: score(truths, orielLooks, truth.fps),
          reference: score(truths, referenceLooks, truth.fps),
        });
      if (new Set(truths.map(({ segment }) => segment)).size > 1) console.log(of(scoreSegments));
      console.log(of(scoreLooks));
    } finally {
      await browser.close();
      await server.close();
    }
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}

main().catch((cause: unknown) => {
  console.error(cause instanceof Error ? cause.message : cause);
  process.exitCode = 1;
});
