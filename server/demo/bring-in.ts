import { createHash, randomUUID } from 'node:crypto';
import { readFile, rm, writeFile } from 'node:fs/promises';
import { basename, join } from 'node:path';
import type { ReceivedFile } from '../pictures/receive-file';
import type { Storage } from '../storage/storage';

/** Lends a file of ours as if it had been uploaded; whatever `use` leaves of the copy is removed. */
export async function bringIn<T>(storage: Storage, path: string, use: (file: ReceivedFile) => Promise<T>): Promise<T> {
  const bytes = await readFile(path);
  const copy = join(storage.incomingDir, randomUUID());
  try {
    await writeFile(copy, bytes);
    const sha256 = createHash('sha256').update(bytes).digest('hex');
    return await use({ path: copy, sha256, bytes: bytes.length, name: basename(path), modifiedAt: null });
  } finally {
    await rm(copy, { force: true });
  }
}
