import { createReadStream } from 'node:fs';
import { stat } from 'node:fs/promises';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { extname } from 'node:path';

const TYPES: Record<string, string> = {
  '.js': 'text/javascript',
  '.json': 'application/json',
  '.wasm': 'application/wasm',
};

const PAGE =
  '<!doctype html><meta charset="utf-8"><title>Tracking bench</title><script type="module" src="/bench-page.js"></script>';

/** The policy the product's own pages have: the worker must live with it. */
const POLICY =
  "default-src 'none'; script-src 'self' 'wasm-unsafe-eval'; worker-src 'self'; connect-src 'self'; img-src 'self' blob:";

/** Serves the bench on loopback: the bundles, the tracker's files and the video; nothing else. */
export async function serveBench(
  bundles: string,
  trackerFiles: string,
  video: string,
): Promise<{ url: string; close: () => Promise<void> }> {
  const fileFor = (path: string): string => {
    if (path === '/video') return video;
    const name = path.slice(path.lastIndexOf('/') + 1);
    return path.startsWith('/tracker/') ? `${trackerFiles}/${name}` : `${bundles}/${name}`;
  };
  const server = createServer((request, response) => {
    const path = request.url ?? '/';
    response.setHeader('content-security-policy', POLICY);
    if (path === '/') {
      response.setHeader('content-type', 'text/html');
      response.end(PAGE);
      return;
    }
    const file = fileFor(path);
    stat(file).then(
      () => {
        response.setHeader('content-type', TYPES[extname(file)] ?? 'application/octet-stream');
        createReadStream(file).pipe(response);
      },
      () => response.writeHead(404).end(),
    );
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.address() as AddressInfo;
  const close = (): Promise<void> =>
    new Promise((resolve) => {
      server.close(() => resolve());
      server.closeAllConnections();
    });
  return { url: `http://localhost:${String(port)}/`, close };
}
