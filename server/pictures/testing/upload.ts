import type { Response } from 'supertest';
import type { Browser } from '../../testing/browser';

/** Sends a file as the page does: its date first, then the file. */
export async function upload(
  browser: Browser,
  path: string,
  file: Buffer,
  name: string,
  lastModified?: string,
): Promise<Response> {
  if (!browser.cookie('XSRF-TOKEN')) await browser.ask('get', '/api/me');
  const request = browser.prepare('post', path);
  if (lastModified) request.field('lastModified', lastModified);
  return request.attach('file', file, name);
}
