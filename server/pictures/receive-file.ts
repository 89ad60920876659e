import { createHash, randomUUID } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { rm } from 'node:fs/promises';
import { join } from 'node:path';
import { Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Request, RequestHandler } from 'express';
import multer, { type StorageEngine } from 'multer';
import { photoMaxBytes } from '@oriel/shared/contracts/photos';
import { photoName } from './file-name';
import { noFile } from './refusals';
import { plausibleMoment } from './taken-date';

/** A file as it arrived, in the folder for files on their way in. */
export interface ReceivedFile {
  readonly path: string;
  readonly sha256: string;
  readonly bytes: number;
  readonly name: string;
  /** When the file was last changed by the sender's clock, if the page said so. */
  readonly modifiedAt: Date | null;
}

type Arrived = Omit<ReceivedFile, 'modifiedAt'>;

const arrivals = new WeakMap<Request, Arrived>();

/** Writes the file into the folder and takes its SHA-256 on the way; a file that does not arrive whole is removed. */
function hashingEngine(incomingDir: string): StorageEngine {
  return {
    _handleFile(request, file, done) {
      const path = join(incomingDir, randomUUID());
      const hash = createHash('sha256');
      let bytes = 0;
      const measure = new Transform({
        transform(chunk: Buffer, _encoding, next) {
          hash.update(chunk);
          bytes += chunk.length;
          next(null, chunk);
        },
      });
      pipeline(file.stream, measure, createWriteStream(path)).then(
        () => {
          arrivals.set(request, { path, sha256: hash.digest('hex'), bytes, name: photoName(file.originalname) });
          done(null, { path, size: bytes });
        },
        (error: unknown) => void rm(path, { force: true }).finally(() => done(error)),
      );
    },
    _removeFile(_request, file, done) {
      rm(file.path, { force: true }).then(() => done(null), done);
    },
  };
}

/**
 * Receives the one file of a multipart request. The page sends the file's own date in the field `lastModified`, before the file: what its clock
 * showed then, as if it were UTC.
 */
export function receiveFile(incomingDir: string): RequestHandler {
  return multer({
    storage: hashingEngine(incomingDir),
    limits: { fileSize: photoMaxBytes, files: 1, fields: 4, fieldSize: 1000, parts: 5 },
    defParamCharset: 'utf8',
  }).single('file');
}

/** Milliseconds since 1970 or ISO 8601. */
function readModified(body: unknown): Date | null {
  const text: unknown = typeof body === 'object' && body !== null && 'lastModified' in body ? body.lastModified : null;
  if (typeof text !== 'string') return null;
  return plausibleMoment(new Date(/^\d+$/.test(text) ? Number(text) : text));
}

/** Lends the file that arrived with a request; whatever `use` leaves of it is removed. @throws no-file (400). */
export async function withReceivedFile<T>(request: Request, use: (file: ReceivedFile) => Promise<T>): Promise<T> {
  const arrived = arrivals.get(request);
  if (!arrived) throw noFile();
  try {
    return await use({ ...arrived, modifiedAt: readModified(request.body) });
  } finally {
    await rm(arrived.path, { force: true });
  }
}
