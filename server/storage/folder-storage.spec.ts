import { mkdtemp, readdir, readFile, rm, utimes, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { buffer } from 'node:stream/consumers';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { folderStorage } from './folder-storage';
import { edgeKept, edgesFor } from './keys';
import type { Storage } from './storage';

let root: string;
let storage: Storage;
beforeEach(async () => {
  root = await mkdtemp(join(tmpdir(), 'oriel-storage-'));
  storage = await folderStorage(root);
});
afterEach(() => rm(root, { recursive: true }));

const read = async (key: string) => {
  const stored = await storage.open(key);
  return stored && { bytes: stored.bytes, text: (await buffer(stored.stream)).toString() };
};

describe('folderStorage', () => {
  it('gives back what was put, from bytes, a stream or a file', async () => {
    await storage.put('a/bytes.webp', Buffer.from('bytes'));
    await storage.put('a/stream', Readable.from(['str', 'eam']));
    const path = join(storage.incomingDir, 'file');
    await writeFile(path, 'file');
    await storage.putFile('b/file', path);
    expect(await read('a/bytes.webp')).toEqual({ bytes: 5, text: 'bytes' });
    expect(await read('a/stream')).toEqual({ bytes: 6, text: 'stream' });
    expect(await read('b/file')).toEqual({ bytes: 4, text: 'file' });
    expect(await storage.withFile('b/file', (at) => readFile(at, 'utf8'))).toBe('file');
    expect(await readdir(storage.incomingDir)).toEqual([]);
  });

  it('knows what there is not', async () => {
    expect(await storage.exists('a/none')).toBe(false);
    expect(await storage.open('a/none')).toBeNull();
    await storage.remove('a/none');
    await storage.put('a/one', Buffer.from('1'));
    expect(await storage.exists('a/one')).toBe(true);
    await storage.remove('a/one');
    expect(await storage.exists('a/one')).toBe(false);
  });

  it('leaves nothing of a stream that breaks', async () => {
    const breaking = Readable.from(
      (function* () {
        yield 'half';
        throw new Error('cut');
      })(),
    );
    await expect(storage.put('a/half', breaking)).rejects.toThrow('cut');
    expect(await storage.exists('a/half')).toBe(false);
    expect(await readdir(storage.incomingDir)).toEqual([]);
  });

  it('sweeps what a killed server left on its way in, and spares what is arriving', async () => {
    const old = join(storage.incomingDir, 'old');
    await writeFile(old, 'left behind');
    await writeFile(join(storage.incomingDir, 'fresh'), 'arriving');
    const yesterday = new Date(Date.now() - 24 * 3600 * 1000);
    await utimes(old, yesterday, yesterday);
    await folderStorage(root);
    expect(await readdir(storage.incomingDir)).toEqual(['fresh']);
  });

  it.each([
    '../secret',
    'a/../../secret',
    '/etc/passwd',
    'a//b',
    'a\\b',
    'a/b\0',
    '',
    'a/..',
    'A/b',
    '.hidden',
    'a/b.c.d',
  ])('security: takes %j for no key', async (key) => {
    await expect(storage.put(key, Buffer.from('x'))).rejects.toThrow('Not a storage key');
    await expect(storage.open(key)).rejects.toThrow('Not a storage key');
    expect(() => storage.withFile(key, () => Promise.resolve())).toThrow('Not a storage key');
    expect(() => storage.remove(key)).toThrow('Not a storage key');
  });
});

describe('edges', () => {
  it('never enlarges: the first edge that holds the picture is the last made, and stands for the larger ones', () => {
    expect(edgesFor(4000, 3000)).toEqual([320, 800, 1600, 3200]);
    expect(edgesFor(1000, 1600)).toEqual([320, 800, 1600]);
    expect(edgesFor(500, 400)).toEqual([320, 800]);
    expect(edgesFor(10, 10)).toEqual([320]);
    expect(edgeKept(500, 400, 3200)).toBe(800);
    expect(edgeKept(500, 400, 320)).toBe(320);
    expect(edgeKept(6000, 400, 3200)).toBe(3200);
  });
});
