import type { CookieOptions } from 'express';

export interface SessionCookie {
  readonly name: string;
  readonly attributes: CookieOptions;
}

/** Out of reach of scripts and of other sites; over https also nailed to this host by its name prefix (RFC 6265bis, 4.1.3.2). */
export const sessionCookie = (secure: boolean): SessionCookie => ({
  name: secure ? '__Host-oriel' : 'oriel',
  attributes: { httpOnly: true, sameSite: 'lax', secure, path: '/' },
});
