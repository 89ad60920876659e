import type { ServerResponse } from 'node:http';
import { extname, join } from 'node:path';
import express, { Router, type RequestHandler } from 'express';
import { notFound } from './failure';

const immutable = /-[A-Z0-9]{8}\.(js|css)$/;

/** A worker has the policy of its own script's reply. This one runs OpenCV.js, which makes functions from text; it may do that and nothing else. */
const boardWorker = join('calibration', 'board-worker.js');
const boardWorkerPolicy = "default-src 'none'; script-src 'self' 'unsafe-eval'";

/**
 * The built page: hashed files for good, everything else asked for anew; every other address is the page itself, which routes it. An
 * address that ends like a file is not: a chunk of an earlier build must fail as missing, and not arrive as HTML.
 */
export function servePage(webDir: string): Router {
  const router = Router();
  const files = express.static(webDir, { index: false, setHeaders });
  router.use(compressed(files), files);
  router.get('/{*path}', (request, response, next) => {
    if (extname(request.path) || !request.accepts('html')) return next(notFound());
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile('index.html', { root: webDir }, (error) => error && next(error));
  });
  return router;
}

/** What the build compressed (scripts/build/compress-files.mjs) is sent so to whoever takes it; what it did not, as it is. */
function compressed(files: RequestHandler): RequestHandler {
  return (request, response, next) => {
    const ending = extname(request.path);
    if (!ending) return next();
    response.vary('Accept-Encoding');
    // Asked one by one: browsers name gzip first, and asked for the best of two would be sent what is larger.
    const encoding = request.acceptsEncodings('br') || request.acceptsEncodings('gzip');
    if (!encoding) return next();
    const asked = request.url;
    request.url = asked.replace(request.path, () => `${request.path}.${encoding === 'br' ? 'br' : 'gz'}`);
    response.type(ending).setHeader('Content-Encoding', encoding);
    files(request, response, (error?: unknown) => {
      request.url = asked;
      response.removeHeader('Content-Encoding');
      response.removeHeader('Content-Type');
      next(error);
    });
  };
}

function setHeaders(response: ServerResponse, sent: string): void {
  const path = sent.replace(/\.(br|gz)$/, '');
  response.setHeader('Cache-Control', immutable.test(path) ? 'public, max-age=31536000, immutable' : 'no-cache');
  if (path.endsWith(boardWorker)) response.setHeader('Content-Security-Policy', boardWorkerPolicy);
}
