import { randomUUID } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { access, mkdir, open, readdir, rename, rm, stat, writeFile } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import { checkKey, type Storage } from './storage';

/** Files on their way in that are older than this were left by a server that was killed. */
const abandonedAfterMs = 6 * 3600 * 1000;

const isMissing = (error: unknown) => error instanceof Error && 'code' in error && error.code === 'ENOENT';

/** Keeps objects as files of one folder. An object is written beside its place and renamed into it, so nobody ever sees half of one. */
export async function folderStorage(root: string): Promise<Storage> {
  const incomingDir = join(root, 'incoming');
  await mkdir(incomingDir, { recursive: true });
  await sweep(incomingDir);
  const pathOf = (key: string) => join(root, ...checkKey(key).split('/'));

  async function moveInto(key: string, from: string): Promise<void> {
    const path = pathOf(key);
    await mkdir(dirname(path), { recursive: true });
    await rename(from, path);
  }

  return {
    incomingDir,
    putFile: moveInto,

    async put(key, bytes) {
      checkKey(key);
      const draft = join(incomingDir, randomUUID());
      try {
        if (bytes instanceof Uint8Array) await writeFile(draft, bytes);
        else await pipeline(bytes, createWriteStream(draft));
        await moveInto(key, draft);
      } catch (error) {
        await rm(draft, { force: true });
        throw error;
      }
    },

    async open(key) {
      try {
        const file = await open(pathOf(key), 'r');
        const { size } = await file.stat();
        return { stream: file.createReadStream(), bytes: size };
      } catch (error) {
        if (isMissing(error)) return null;
        throw error;
      }
    },

    withFile: (key, use) => use(pathOf(key)),

    exists: (key) =>
      access(pathOf(key)).then(
        () => true,
        (error: unknown) => {
          if (isMissing(error)) return false;
          throw error;
        },
      ),

    remove: (key) => rm(pathOf(key), { force: true }),
  };
}

async function sweep(folder: string): Promise<void> {
  const before = Date.now() - abandonedAfterMs;
  for (const name of await readdir(folder)) {
    const path = join(folder, name);
    const modified = await stat(path).then(
      (found) => found.mtimeMs,
      () => Infinity,
    );
    if (modified < before) await rm(path, { force: true, recursive: true });
  }
}
