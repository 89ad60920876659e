import type { NextFunction, Request, RequestHandler, Response } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import type { Logger } from 'pino';
import type { Database } from '../database/database';
import { DomainFailure } from './failure';
import { triesFor } from './tries';

/** How many requests in how long. */
export interface Allowance {
  readonly tries: number;
  readonly windowMs: number;
}
export interface LimitSettings {
  readonly passwordsByAccount: Allowance;
  readonly passwordsByAddress: Allowance;
  readonly mailsByAccount: Allowance;
  readonly mailsByAddress: Allowance;
  readonly codesAskedByAddress: Allowance;
  readonly claimsByAddress: Allowance;
  readonly codesTriedByAccount: Allowance;
  readonly codesTriedByAddress: Allowance;
}

const minuteMs = 60_000;
export const usualLimits: LimitSettings = {
  passwordsByAccount: { tries: 10, windowMs: 15 * minuteMs },
  passwordsByAddress: { tries: 50, windowMs: 15 * minuteMs },
  mailsByAccount: { tries: 5, windowMs: 60 * minuteMs },
  mailsByAddress: { tries: 60, windowMs: 60 * minuteMs },
  // A screen asks for a code every ten minutes and claims every two seconds; several may stand behind one address.
  codesAskedByAddress: { tries: 30, windowMs: 10 * minuteMs },
  claimsByAddress: { tries: 300, windowMs: minuteMs },
  codesTriedByAccount: { tries: 10, windowMs: 15 * minuteMs },
  codesTriedByAddress: { tries: 50, windowMs: 15 * minuteMs },
};

/**
 * Limits against guessing and against flooding somebody's mailbox, each by account and by network address. Whether the account exists
 * makes no difference. Counted in the database, by all its servers together.
 */
export interface Limits {
  /** For signing in to the account of an address that someone typed; only failures count. */
  readonly passwords: RequestHandler;
  /** For whoever is signed in and tries the password of that account; only failures count. */
  readonly ownPassword: RequestHandler;
  /** For routes that send a mail to an address someone typed. */
  readonly mails: RequestHandler;
  /** For screens that ask for a pairing code, and those that claim what came of it. */
  readonly codesAsked: RequestHandler;
  readonly claims: RequestHandler;
  /** For members who enter a pairing code; only failures count. */
  readonly codesTried: RequestHandler;
}

const typedEmail = (request: Request): string => {
  const body: unknown = request.body;
  const email = typeof body === 'object' && body !== null && 'email' in body ? body.email : '';
  return typeof email === 'string' ? email.trim().toLowerCase() : '';
};
const signedIn = (request: Request) => request.session.accountId ?? '';
const address = (request: Request) => ipKeyGenerator(request.ip ?? '');

const tooManyTries = (_request: Request, response: Response, next: NextFunction) => {
  const minutes = Math.max(1, Math.ceil(Number(response.getHeader('retry-after')) / 60));
  next(new DomainFailure(429, 'too-many-tries', 'There were too many tries.', `Wait ${minutes === 1 ? 'a minute' : `${minutes} minutes`} and try again.`));
};

export function createLimits(settings: LimitSettings, db: Database, log: Logger): Limits {
  const limit = (name: keyof LimitSettings, keyGenerator: (request: Request) => string, skipSuccessfulRequests: boolean) => {
    const { tries, windowMs } = settings[name];
    const store = triesFor(name, windowMs, db, log);
    return rateLimit({ windowMs, limit: tries, store, keyGenerator, skipSuccessfulRequests, handler: tooManyTries, standardHeaders: false, legacyHeaders: true });
  };
  const both = (first: RequestHandler, second: RequestHandler): RequestHandler => (request, response, next) =>
    void first(request, response, (error?: unknown) => (error ? next(error) : void second(request, response, next)));

  const passwordsByAddress = limit('passwordsByAddress', address, true);
  return {
    passwords: both(passwordsByAddress, limit('passwordsByAccount', typedEmail, true)),
    ownPassword: both(passwordsByAddress, limit('passwordsByAccount', signedIn, true)),
    mails: both(limit('mailsByAddress', address, false), limit('mailsByAccount', typedEmail, false)),
    codesAsked: limit('codesAskedByAddress', address, false),
    claims: limit('claimsByAddress', address, false),
    codesTried: both(limit('codesTriedByAddress', address, true), limit('codesTriedByAccount', signedIn, true)),
  };
}
