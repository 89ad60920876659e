import type { RequestHandler } from 'express';
import { DomainFailure } from './failure';

/**
 * A server whose address is https keeps its cookies to https: over plain http nobody could stay signed in. So it says so, instead of
 * losing the session in silence; behind a reverse proxy the cause is mostly a missing TRUST_PROXY or X-Forwarded-Proto.
 */
export const requireHttps =
  (publicUrl: string): RequestHandler =>
  (request, _response, next) =>
    request.secure ? next() : next(new DomainFailure(400, 'not-https', 'This request did not arrive over https.', `Open ${publicUrl}.`));
