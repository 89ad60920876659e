import type { Request, Response } from 'express';
import type { Database } from '../database/database';
import type { SessionCookie } from '../http/session-cookie';
import type { WallCookie } from '../http/wall-cookie';
import type { Xsrf } from '../http/xsrf';

/** Signing a browser in and out, and ending what other browsers hold. */
export interface Sessions {
  /** Signs in under a session id that nobody has seen before (session fixation; OWASP ASVS 5.0.0, 7.2.4). */
  begin(request: Request, response: Response, accountId: string): Promise<void>;
  end(request: Request, response: Response): Promise<void>;
  endEverywhere(accountId: string): Promise<void>;
  endElsewhere(accountId: string, sessionId: string): Promise<void>;
}

const done = (act: (callback: (error?: unknown) => void) => void) =>
  new Promise<void>((resolve, reject) =>
    act((error) => (error ? reject(error instanceof Error ? error : new Error(String(error))) : resolve())),
  );

export function createSessions(db: Database, xsrf: Xsrf, cookie: SessionCookie, wallCookie: WallCookie): Sessions {
  const ofAccount = (accountId: string) => db.deleteFrom('session').where((on) => on(on.ref('sess', '->>').key('accountId'), '=', accountId));
  return {
    async begin(request, response, accountId) {
      await done((callback) => request.session.regenerate(callback));
      const now = Date.now();
      Object.assign(request.session, { accountId, signedInAt: now, renewedAt: now });
      await done((callback) => request.session.save(callback));
      xsrf.renew(response, request.sessionID);
    },
    async end(request, response) {
      await done((callback) => request.session.destroy(callback));
      response.clearCookie(cookie.name, cookie.attributes);
      xsrf.renew(response, wallCookie.read(request));
    },
    async endEverywhere(accountId) {
      await ofAccount(accountId).execute();
    },
    async endElsewhere(accountId, sessionId) {
      await ofAccount(accountId).where('sid', '!=', sessionId).execute();
    },
  };
}
