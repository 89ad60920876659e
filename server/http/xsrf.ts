import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto';
import type { RequestHandler, Response } from 'express';
import { DomainFailure } from './failure';

/** Angular's own names, so that its client sends the header back unasked. */
const cookieName = 'XSRF-TOKEN';
const headerName = 'x-xsrf-token';
const safe = new Set(['GET', 'HEAD', 'OPTIONS']);

export interface Xsrf {
  /** Refuses what changes something without proof that our own page asks; hands out the proof. */
  readonly guard: RequestHandler;
  /** Hands out a proof for another session: after signing in (its id) or out (null). */
  renew(response: Response, sessionId: string | null): void;
}

const readCookie = (header: string | undefined, name: string) =>
  header
    ?.split(';')
    .map((pair) => pair.trim())
    .find((pair) => pair.startsWith(`${name}=`))
    ?.slice(name.length + 1);

const stalePage = () =>
  new DomainFailure(403, 'stale-page', 'This page has been open since before you signed in or out.', 'Try again; if it keeps failing, reload the page.');
const otherSite = () =>
  new DomainFailure(403, 'other-site', 'This request came from another site.', 'Open Oriel at its own address and do it there.');

/**
 * Signed double-submit cookie (OWASP, *Cross-Site Request Forgery Prevention*): token = nonce.HMAC(secret, session id ! nonce). A request
 * that changes something must carry the cookie's value in a header too, which another site cannot read. Browsers that say where a request
 * comes from (W3C Fetch Metadata) are held to it as well.
 */
export function createXsrf(secret: string, secure: boolean): Xsrf {
  const key = createHmac('sha256', secret).update('xsrf').digest();
  const sign = (nonce: string, session: string) => createHmac('sha256', key).update(`${session}!${nonce}`).digest('base64url');
  const valid = (token: string, session: string) => {
    const [nonce = '', signature = ''] = token.split('.');
    const expected = Buffer.from(sign(nonce, session));
    const given = Buffer.from(signature);
    return expected.length === given.length && timingSafeEqual(expected, given);
  };
  const renew: Xsrf['renew'] = (response, sessionId) => {
    const nonce = randomBytes(18).toString('base64url');
    response.cookie(cookieName, `${nonce}.${sign(nonce, sessionId ?? '')}`, { sameSite: 'lax', secure, path: '/' });
  };

  return {
    renew,
    guard: (request, response, next) => {
      const session = request.session.accountId ? request.sessionID : null;
      const cookie = readCookie(request.headers.cookie, cookieName) ?? '';
      const cookieIsValid = valid(cookie, session ?? '');
      if (!cookieIsValid) renew(response, session);
      if (safe.has(request.method)) return next();

      const site = request.get('sec-fetch-site') ?? 'none';
      if (site !== 'same-origin' && site !== 'none') return next(otherSite());
      if (!cookieIsValid || request.get(headerName) !== cookie) return next(stalePage());
      next();
    },
  };
}
