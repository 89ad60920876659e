import { Readable } from 'node:stream';
import express from 'express';
import supertest from 'supertest';
import { describe, expect, it } from 'vitest';
import { sendStored } from './send-stored';
import type { Storage } from './storage';

/** Asks for an object whose bytes are those of `stream`; what was logged as an error on the way. */
async function askFor(stream: Readable, bytes: number): Promise<{ whole: boolean; logged: unknown[] }> {
  const logged: unknown[] = [];
  const storage = { open: () => Promise.resolve({ stream, bytes }) } as unknown as Storage;
  const app = express();
  app.get('/', async (request, response) => {
    Object.assign(request, { log: { error: (what: { err: unknown }) => logged.push(what.err) } });
    await sendStored(storage, request, response, { key: 'originals/a', mime: 'image/webp', tag: 'a' });
  });
  const whole = await supertest(app)
    .get('/')
    .then(
      ({ status }) => status === 200,
      () => false,
    );
  return { whole, logged };
}

describe('sending a stored object', () => {
  it('sends it whole, and says nothing', async () => {
    expect(await askFor(Readable.from([Buffer.from('abc')]), 3)).toEqual({ whole: true, logged: [] });
  });

  it('breaks off where the disk fails, and says so in the log', async () => {
    const failure = new Error('EIO');
    async function* half() {
      yield Buffer.from('ab');
      await new Promise((resolve) => setTimeout(resolve, 50));
      throw failure;
    }
    expect(await askFor(Readable.from(half()), 4)).toEqual({ whole: false, logged: [failure] });
  });
});
