import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { brotliCompressSync, gzipSync } from 'node:zlib';
import express from 'express';
import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, type TestApp } from '../testing/test-app';
import { servePage } from './serve-page';

describe('the page and its headers', () => {
  let app: TestApp;
  beforeAll(async () => {
    app = await createTestApp();
    const { webDir } = app.parts.config;
    await writeFile(join(webDir, 'main-ABCD1234.js'), 'export {};');
    await writeFile(join(webDir, 'model.json'), '{}');
    await mkdir(join(webDir, 'calibration'));
    await writeFile(join(webDir, 'calibration', 'board-worker.js'), '');
  });
  afterAll(() => app.close());
  const get = (path: string, accept = 'text/html') => app.browser().agent.get(path).set('Accept', accept);

  it('is served at every address of its own, asked for anew each time', async () => {
    for (const path of ['/', '/scenes', '/play/00000000-0000-4000-8000-000000000000', '/confirm']) {
      const answer = await get(path);
      expect(answer.text).toContain('<title>Oriel</title>');
      expect(answer.get('Cache-Control')).toBe('no-cache');
    }
  });

  it('is served from a hidden folder too', async () => {
    const hidden = await mkdtemp(join(tmpdir(), '.oriel-web-'));
    await writeFile(join(hidden, 'index.html'), '<title>Oriel</title>');
    const answer = await supertest(express().use(servePage(hidden))).get('/scenes').set('Accept', 'text/html');
    expect(answer.text).toContain('<title>Oriel</title>');
    await rm(hidden, { recursive: true });
  });

  it('keeps hashed files for good and others for no longer than they last', async () => {
    expect((await get('/main-ABCD1234.js')).get('Cache-Control')).toMatch(/immutable/);
    expect((await get('/model.json')).get('Cache-Control')).toBe('no-cache');
  });

  it('sends what the build compressed to whoever takes it, under the headers of the file itself', async () => {
    const script = 'export const words = 1;';
    await writeFile(join(app.parts.config.webDir, 'chunk-EFGH5678.js'), script);
    await writeFile(join(app.parts.config.webDir, 'chunk-EFGH5678.js.gz'), gzipSync(script));
    const ask = (encodings: string) => get('/chunk-EFGH5678.js', '*/*').set('Accept-Encoding', encodings);
    for (const [encodings, sent] of [['gzip', 'gzip'], ['identity', undefined], ['br', undefined]] as const) {
      const answer = await ask(encodings);
      expect(answer.get('Content-Encoding'), encodings).toBe(sent);
      expect(answer.get('Content-Type')).toMatch(/^(text|application)\/javascript/);
      expect(answer.get('Cache-Control')).toMatch(/immutable/);
      expect(answer.get('Vary')).toContain('Accept-Encoding');
      expect(answer.text).toBe(script);
    }
  });

  it('sends a browser, which names gzip first, the smaller brotli', async () => {
    const script = 'export const words = 2;';
    const { webDir } = app.parts.config;
    await writeFile(join(webDir, 'chunk-IJKL9012.js'), script);
    await writeFile(join(webDir, 'chunk-IJKL9012.js.gz'), gzipSync(script));
    await writeFile(join(webDir, 'chunk-IJKL9012.js.br'), brotliCompressSync(script));
    const sent = async (encodings: string) =>
      (await get('/chunk-IJKL9012.js', '*/*').set('Accept-Encoding', encodings).buffer(false)).get('Content-Encoding');
    expect(await sent('gzip, deflate, br, zstd')).toBe('br');
    expect(await sent('gzip, br;q=0')).toBe('gzip');
  });

  it('lets the one worker that runs OpenCV.js make functions from text, fetch nothing, and nobody else do so', async () => {
    const policy = (await get('/calibration/board-worker.js', '*/*')).get('Content-Security-Policy');
    expect(policy).toBe("default-src 'none'; script-src 'self' 'unsafe-eval'");
    for (const path of ['/', '/main-ABCD1234.js', '/model.json']) expect((await get(path, '*/*')).get('Content-Security-Policy')).not.toContain("'unsafe-eval'");
  });

  it('says that a file of an earlier build is missing, instead of answering with the page', async () => {
    const answer = await get('/main-WXYZ9876.js', '*/*');
    expect(answer.status).toBe(404);
    expect(answer.body.code).toBe('not-found');
  });

  it('answers an unknown or broken address in the one failure shape', async () => {
    for (const [path, status] of [['/api/nothing', 404], ['/%', 400], ['/..%2f..%2fetc%2fpasswd', 404]] as const) {
      const answer = await get(path, '*/*');
      expect(answer.status, path).toBe(status);
      expect(Object.keys(answer.body)).toEqual(expect.arrayContaining(['code', 'message', 'remedy', 'reference']));
    }
  });

  it('security: every answer carries the policy, and none says what serves it', async () => {
    for (const path of ['/', '/api/me', '/api/nothing', '/main-ABCD1234.js', '/health']) {
      const answer = await get(path);
      const policy = answer.get('Content-Security-Policy')!;
      expect(policy).toContain("default-src 'self'");
      expect(policy).toContain("script-src 'self' 'wasm-unsafe-eval'");
      expect(policy).toContain("frame-ancestors 'none'");
      expect(policy).not.toContain("'unsafe-eval'");
      expect(policy).not.toMatch(/script-src[^;]*unsafe-inline/);
      expect(answer.get('X-Content-Type-Options')).toBe('nosniff');
      expect(answer.get('Referrer-Policy')).toBe('no-referrer');
      expect(answer.get('Permissions-Policy')).toBe('camera=(self), microphone=(), geolocation=()');
      expect(answer.get('X-Powered-By')).toBeUndefined();
      expect(answer.get('Strict-Transport-Security')).toBeUndefined();
    }
  });

  it('security: answers about people are kept in no cache', async () => {
    expect((await get('/api/me')).get('Cache-Control')).toBe('no-store');
  });

  it('security: a home-made certificate makes no lasting promise of https for this host', async () => {
    const self = await createTestApp({ environment: { HTTPS: 'self' } });
    const answer = await self.browser().agent.get('/');
    expect(answer.get('Content-Security-Policy')).toContain('upgrade-insecure-requests');
    expect(answer.get('Strict-Transport-Security')).toBeUndefined();
    await self.close();
  });
});
