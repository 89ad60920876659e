import { createRequire } from 'node:module';
import { readFile } from 'node:fs/promises';
import { Worker } from 'node:worker_threads';

export interface DecodedPixels {
  readonly width: number;
  readonly height: number;
  /** RGBA, 8 bits each, row by row, not premultiplied. */
  readonly data: Uint8Array;
}

const patienceMs = 90_000;

/**
 * The worker, as text: the server is one bundle, beside which there is no second file to start. It is handed the place of the decoder,
 * for such a worker resolves packages from nowhere.
 */
const worker = `
  const { parentPort, workerData } = require('node:worker_threads');
  require(workerData.decoder)({ buffer: workerData.file }).then(({ width, height, data }) => {
    const pixels = new Uint8Array(data.buffer, data.byteOffset, data.byteLength);
    parentPort.postMessage({ width, height, data: pixels }, [pixels.buffer]);
  });
`;
const decoder = createRequire(import.meta.url).resolve('heic-decode');

/**
 * Decodes a HEIC file apart from the server's own thread, about 0.1 s a megapixel. The pixels are upright: the decoder obeys the file's
 * rotation and mirror boxes, and by ISO/IEC 23008-12 these alone count, not an EXIF orientation beside them.
 */
export async function decodeHeic(path: string): Promise<DecodedPixels> {
  const thread = new Worker(worker, {
    eval: true,
    workerData: { decoder, file: await readFile(path) },
    // The decoder prints what it meets; the error it throws is enough.
    stdout: true,
    stderr: true,
  });
  const patience = setTimeout(() => void thread.terminate(), patienceMs);
  try {
    return await new Promise<DecodedPixels>((resolve, reject) => {
      thread.once('message', resolve);
      thread.once('error', reject);
      thread.once('exit', () => reject(new Error('The HEIC decoder ended without an answer')));
    });
  } finally {
    clearTimeout(patience);
    await thread.terminate();
  }
}
