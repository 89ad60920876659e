import type { IncomingMessage } from 'node:http';
import type { RequestHandler } from 'express';
import type { Logger, SerializedError } from 'pino';
import { pino } from 'pino';
import { pinoHttp } from 'pino-http';
import { randomUUID } from 'node:crypto';

const quiet = new Set(['/health', '/ready']);
const pathOf = (url = '') => url.split('?', 1)[0];

/**
 * What of an error goes into the log: not the properties that a driver hangs on it, for PostgreSQL quotes whole rows there
 * (`detail`), password hashes among them.
 */
export const plainError = (error: Error) => {
  const { type, message, stack }: SerializedError = pino.stdSerializers.err(error);
  return { type, message, stack, code: (error as { code?: unknown }).code };
};

/** One line a request: method, path without its query, status, time and a reference. No headers and no bodies, so no cookie, token or password. */
export const logRequests = (log: Logger): RequestHandler =>
  pinoHttp({
    logger: log,
    genReqId: () => randomUUID(),
    autoLogging: { ignore: (request: IncomingMessage) => quiet.has(pathOf(request.url)) },
    wrapSerializers: false,
    serializers: {
      req: (request: { id: unknown; method: string; originalUrl?: string; url: string }) => ({
        id: request.id,
        method: request.method,
        path: pathOf(request.originalUrl ?? request.url),
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
      err: plainError,
    },
  });
