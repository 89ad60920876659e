import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto';
import type { RequestHandler } from 'express';
import { DomainFailure } from './failure';

/** Angular's own names, so that its client sends the header back unasked. */
const cookieName = 'XSRF-TOKEN';
const headerName = 'x-xsrf-token';
const safe = new Set(['GET', 'HEAD', 'OPTIONS']);

const readCookie = (header: string | undefined, name: string) =>
  header?.split(';').map((pair) => pair.trim()).find((pair) => pair.startsWith(`${name}=`))?.slice(name.length + 1);

/**
 * Signed double-submit cookie (OWASP, Cross-Site Request Forgery Prevention): token = nonce.HMAC(secret, session id + nonce), bound to the
 * session once there is one. A request that changes something must carry the cookie's value in a header too, which another site cannot read.
 */
export function guardXsrf(secret: string, secure: boolean): RequestHandler {
  const sign = (nonce: string, session: string) => createHmac('sha256', secret).update(`${session}!${nonce}`).digest('base64url');
  const valid = (token: string, session: string) => {
    const [nonce = '', signature = ''] = token.split('.');
    const expected = Buffer.from(sign(nonce, session));
    const given = Buffer.from(signature);
    return expected.length === given.length && timingSafeEqual(expected, given);
  };

  return (request, response, next) => {
    const session = request.session.accountId ? request.sessionID : '';
    const cookie = readCookie(request.headers.cookie, cookieName) ?? '';
    const cookieIsValid = valid(cookie, session);
    if (!safe.has(request.method)) {
      const header = request.get(headerName) ?? '';
      if (!cookieIsValid || header !== cookie)
        return next(new DomainFailure(403, 'stale-page', 'This page has been open since before you signed in or out.', 'Try again; if it keeps failing, reload the page.'));
      return next();
    }
    if (!cookieIsValid) giveXsrfToken(request.sessionID);
    next();

    function giveXsrfToken(sessionId: string) {
      const nonce = randomBytes(18).toString('base64url');
      const bound = request.session.accountId ? sessionId : '';
      response.cookie(cookieName, `${nonce}.${sign(nonce, bound)}`, { sameSite: 'lax', secure, path: '/' });
    }
  };
}
