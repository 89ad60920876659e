import type { CookieOptions, Request, Response } from 'express';
import { readCookie } from './read-cookie';

const yearMs = 365 * 24 * 3_600_000;

/** The cookie by which a paired screen is known: its wall's credential, for which no script and no other site can ask. */
export interface WallCookie {
  read(request: Request): string | null;
  /** Gives it, or gives it again for another year from now. */
  give(response: Response, credential: string): void;
}

export function createWallCookie(secure: boolean): WallCookie {
  const name = secure ? '__Host-oriel-wall' : 'oriel-wall';
  const attributes: CookieOptions = { httpOnly: true, sameSite: 'strict', secure, path: '/', maxAge: yearMs };
  return {
    read: (request) => readCookie(request.headers.cookie, name) || null,
    give: (response, credential) => void response.cookie(name, credential, attributes),
  };
}
