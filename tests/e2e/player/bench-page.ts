import type { Page } from '@playwright/test';
import { build } from 'esbuild';
import { inProject } from '../../../scripts/project.mjs';
import type { RendererBench } from './renderer-bench';

declare global {
  interface Window {
    bench: RendererBench;
  }
}

const origin = 'http://bench.localhost';
const html = '<!doctype html><style>html,body{margin:0;background:#000}#host{position:fixed;inset:0}</style><div id="host"></div><script type="module" src="/bench.js"></script>';

/** Finds the bytes of a picture; null makes the request fail. */
export type PictureSource = (imageId: string, edge: number) => Promise<Buffer | null>;

let bundled: Promise<string> | null = null;

function bundle(): Promise<string> {
  bundled ??= build({
    entryPoints: [inProject('tests', 'e2e', 'player', 'renderer-bench.ts')],
    bundle: true,
    format: 'esm',
    write: false,
    tsconfig: inProject('tsconfig.json'),
  }).then(({ outputFiles }) => outputFiles[0].text);
  return bundled;
}

/** Opens a page that holds nothing but the product's own renderers, with pictures from the test. */
export async function openBench(page: Page, pictures: PictureSource): Promise<void> {
  const script = await bundle();
  await page.route(`${origin}/**`, async (route) => {
    const { pathname } = new URL(route.request().url());
    const [, , imageId, edge] = pathname.split('/');
    if (pathname === '/') return route.fulfill({ contentType: 'text/html', body: html });
    if (pathname === '/bench.js') return route.fulfill({ contentType: 'text/javascript', body: script });
    const body = pathname.startsWith('/pictures/') ? await pictures(imageId, Number(edge)) : null;
    return body ? route.fulfill({ contentType: 'image/png', body }) : route.fulfill({ status: 404, body: '' });
  });
  await page.goto(`${origin}/`);
  await page.waitForFunction(() => 'bench' in window);
}
