import { pipeline } from 'node:stream/promises';
import type { Request, Response } from 'express';
import { DomainFailure } from '../http/failure';
import type { Storage } from './storage';

interface Sending {
  readonly key: string;
  readonly mime: string;
  /** Names the content: the same tag always means the same bytes. */
  readonly tag: string;
  /** Offers the file under this name instead of showing it. */
  readonly saveAs?: string;
}

/**
 * Answers with an object's bytes. Objects never change, so the asker's own browser may keep them for good.
 * @throws not-yet (404) while the object has not been made.
 */
export async function sendStored(
  storage: Storage,
  request: Request,
  response: Response,
  sending: Sending,
): Promise<void> {
  const stored = await storage.open(sending.key);
  if (!stored)
    throw new DomainFailure(
      404,
      'not-yet',
      'This picture is still being made.',
      'Wait a moment; it appears by itself.',
    );

  if (sending.saveAs !== undefined) response.attachment(sending.saveAs);
  response.set({
    'Cache-Control': 'private, max-age=31536000, immutable',
    'Content-Type': sending.mime,
    'X-Content-Type-Options': 'nosniff',
    ETag: `"${sending.tag}"`,
  });
  if (request.fresh) {
    stored.stream.destroy();
    response.status(304).end();
    return;
  }
  response.set('Content-Length', String(stored.bytes));
  await pipeline(stored.stream, response).catch((error: unknown) => {
    // Whoever asked went away, and nothing failed. A file that could not be read has ended the answer too, and is to be heard of.
    if (!isPremature(error)) request.log.error({ err: error }, 'a stored picture could not be read to its end');
  });
}

const isPremature = (error: unknown) =>
  error instanceof Error && 'code' in error && error.code === 'ERR_STREAM_PREMATURE_CLOSE';
