import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import { createServer, request } from 'node:http';
import type { AddressInfo } from 'node:net';
import { inProject } from '../../../scripts/project.mjs';

/** The product at an address of its own, of which a new version can be published while it runs. */
export interface Updatable {
  readonly url: string;
  /** Publishes a version whose page has this language of its own, by which it is told apart. */
  publish(lang: string): void;
  close(): Promise<void>;
}

/** Passes everything on to the product but the page and the list of its service worker, which a new version changes. */
export async function updatable(productUrl: string): Promise<Updatable> {
  const index = await readFile(inProject('dist', 'web', 'index.html'), 'utf8');
  const list = JSON.parse(await readFile(inProject('dist', 'web', 'ngsw.json'), 'utf8')) as { timestamp: number; hashTable: Record<string, string> };
  let changed: { page: string; list: string } | null = null;
  const server = createServer((asked, answer) => {
    const path = asked.url?.split('?')[0] ?? '';
    const passed = request(new URL(asked.url ?? '', productUrl), { method: asked.method, headers: asked.headers }, (reply) => {
      const own = changed && (path === '/wall' || path === '/index.html' ? changed.page : path === '/ngsw.json' ? changed.list : null);
      if (own === null) {
        answer.writeHead(reply.statusCode ?? 502, reply.headers);
        reply.pipe(answer);
        return;
      }
      reply.resume();
      for (const name of ['content-type', 'content-security-policy']) answer.setHeader(name, reply.headers[name] ?? '');
      answer.setHeader('cache-control', 'no-store');
      answer.end(own);
    });
    passed.on('error', () => answer.destroy());
    asked.pipe(passed);
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return {
    url: `http://localhost:${(server.address() as AddressInfo).port}`,
    publish(lang) {
      const page = index.replace(/<html lang="[^"]*"/, `<html lang="${lang}"`);
      const hash = createHash('sha1').update(page).digest('hex');
      changed = { page, list: JSON.stringify({ ...list, timestamp: list.timestamp + 1, hashTable: { ...list.hashTable, '/index.html': hash } }) };
    },
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}
