import type { Readable } from 'node:stream';

export interface Stored {
  readonly stream: Readable;
  readonly bytes: number;
}

/**
 * Where the bytes of pictures are kept, by key: lower-case names joined by slashes, such as `originals/<sha256>`.
 * An object appears whole or not at all, and is never changed afterwards. @throws StorageKeyError for any other key.
 */
export interface Storage {
  /** A folder on the same disk, for files on their way in: from there `putFile` costs nothing. */
  readonly incomingDir: string;
  put(key: string, bytes: Uint8Array | Readable): Promise<void>;
  /** Takes the file at `path` over: it is moved, not copied. */
  putFile(key: string, path: string): Promise<void>;
  /** The object's bytes, or null when there is none. Whoever opens a stream reads or destroys it. */
  open(key: string): Promise<Stored | null>;
  /** Lends the object as a file that may be read but not changed, for as long as `use` runs. @throws when there is none. */
  withFile<T>(key: string, use: (path: string) => Promise<T>): Promise<T>;
  exists(key: string): Promise<boolean>;
  /** Whether or not there is one. */
  remove(key: string): Promise<void>;
}

const wellFormed = /^[a-z0-9][a-z0-9-]*(\/[a-z0-9][a-z0-9-]*)*(\.[a-z0-9]+)?$/;

export class StorageKeyError extends Error {
  constructor(key: string) {
    super(`Not a storage key: ${JSON.stringify(key)}`);
    this.name = 'StorageKeyError';
  }
}

export function checkKey(key: string): string {
  if (!wellFormed.test(key)) throw new StorageKeyError(key);
  return key;
}
