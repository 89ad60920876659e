import { join } from 'node:path';
import express, { Router } from 'express';

const immutable = /-[A-Z0-9]{8}\.(js|css)$/;

/** The built page: hashed files for good, everything else asked for anew; every other address is the page itself, which routes it. */
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
    if (!request.accepts('html')) return next();
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile(join(webDir, 'index.html'), (error) => error && next(error));
  });
  return router;
}
