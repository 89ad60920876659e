import connectPgSimple from 'connect-pg-simple';
import type { RequestHandler } from 'express';
import session from 'express-session';
import type pg from 'pg';
import type { SessionCookie } from './session-cookie';
import './session-data';

const dayMs = 24 * 3_600_000;
/** A session ends this long after it was last used, and at the latest so long after the sign-in (OWASP ASVS 5.0.0, 7.3). */
const idleDays = 30;
const longestDays = 180;

/** Sessions in PostgreSQL. A stranger gets none; a session is written at sign-in and then once a day of use, not at every request. */
export function keepSession(pool: pg.Pool, secret: string, cookie: SessionCookie): RequestHandler[] {
  const Store = connectPgSimple(session);
  return [
    session({
      name: cookie.name,
      store: new Store({ pool, tableName: 'session', pruneSessionInterval: 3600, disableTouch: true }),
      secret,
      resave: false,
      saveUninitialized: false,
      cookie: { ...cookie.attributes, maxAge: idleDays * dayMs },
    }),
    (request, _response, next) => {
      const { accountId, signedInAt = 0, renewedAt = 0 } = request.session;
      if (!accountId) return next();
      const now = Date.now();
      if (now - signedInAt > longestDays * dayMs) return request.session.regenerate(next);
      if (now - renewedAt <= dayMs) return next();
      request.session.renewedAt = now;
      request.session.touch();
      // At once, not at the end of the answer: a long upload would bring back a session that was ended meanwhile.
      request.session.save(next);
    },
  ];
}
