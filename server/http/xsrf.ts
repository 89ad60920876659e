import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto';
import type { RequestHandler, Response } from 'express';
import { DomainFailure } from './failure';
import { readCookie } from './read-cookie';
import type { WallCookie } from './wall-cookie';

/** Angular's own names, so that its client sends the header back unasked. */
const cookieName = 'XSRF-TOKEN';
const headerName = 'x-xsrf-token';
const safe = new Set(['GET', 'HEAD', 'OPTIONS']);

export interface Xsrf {
  /** Refuses what changes something without proof that our own page asks; hands out the proof. */
  readonly guard: RequestHandler;
  /** Hands out a proof for another holder: a session's id after signing in, a wall's credential after pairing, null for a stranger. */
  renew(response: Response, holder: string | null): void;
}

const stalePage = () =>
  new DomainFailure(
    403,
    'stale-page',
    'This page has been open since before you signed in or out.',
    'Try again; if it keeps failing, reload the page.',
  );
const otherSite = () =>
  new DomainFailure(
    403,
    'other-site',
    'This request came from another site.',
    'Open Oriel at its own address and do it there.',
  );

/**
 * Signed double-submit cookie (OWASP, *Cross-Site Request Forgery Prevention*): token = nonce.HMAC(secret, holder ! nonce), where the
 * holder is the session, or else the wall's credential, that the browser is known by. A request that changes something must carry the
 * cookie's value in a header too, which another site cannot read. Browsers that say where a request comes from (W3C Fetch Metadata) are
 * held to it as well.
 */
export function createXsrf(secret: string, secure: boolean, wallCookie: WallCookie): Xsrf {
  const key = createHmac('sha256', secret).update('xsrf').digest();
  const sign = (nonce: string, holder: string) =>
    createHmac('sha256', key).update(`${holder}!${nonce}`).digest('base64url');
  const valid = (token: string, holder: string) => {
    const [nonce = '', signature = ''] = token.split('.');
    const expected = Buffer.from(sign(nonce, holder));
    const given = Buffer.from(signature);
    return expected.length === given.length && timingSafeEqual(expected, given);
  };
  const renew: Xsrf['renew'] = (response, holder) => {
    const nonce = randomBytes(18).toString('base64url');
    response.cookie(cookieName, `${nonce}.${sign(nonce, holder ?? '')}`, { sameSite: 'lax', secure, path: '/' });
  };

  return {
    renew,
    guard: (request, response, next) => {
      const holder = request.session.accountId ? request.sessionID : wallCookie.read(request);
      const cookie = readCookie(request.headers.cookie, cookieName) ?? '';
      const cookieIsValid = valid(cookie, holder ?? '');
      if (!cookieIsValid) renew(response, holder);
      if (safe.has(request.method)) return next();

      const site = request.get('sec-fetch-site') ?? 'none';
      if (site !== 'same-origin' && site !== 'none') return next(otherSite());
      if (!cookieIsValid || request.get(headerName) !== cookie) return next(stalePage());
      next();
    },
  };
}
