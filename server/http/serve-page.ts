import { extname } from 'node:path';
import express, { Router } from 'express';
import { notFound } from './failure';

const immutable = /-[A-Z0-9]{8}\.(js|css)$/;

/**
 * The built page: hashed files for good, everything else asked for anew; every other address is the page itself, which routes it. An
 * address that ends like a file is not: a chunk of an earlier build must fail as missing, and not arrive as HTML.
 */
export function servePage(webDir: string): Router {
  const router = Router();
  router.use(
    express.static(webDir, {
      index: false,
      setHeaders: (response, path) =>
        response.setHeader('Cache-Control', immutable.test(path) ? 'public, max-age=31536000, immutable' : 'no-cache'),
    }),
  );
  router.get('/{*path}', (request, response, next) => {
    if (extname(request.path) || !request.accepts('html')) return next(notFound());
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile('index.html', { root: webDir }, (error) => error && next(error));
  });
  return router;
}
