import express, { type Express } from 'express';
import type { Route } from '@oriel/shared/contracts/route';
import { features } from './features';
import { answerFailure } from './http/answer-failure';
import { closeWhenDraining } from './http/close-when-draining';
import { notFound } from './http/failure';
import { keepSession } from './http/keep-session';
import { logRequests } from './http/log-requests';
import { mountOn } from './http/mount';
import { requireHttps } from './http/require-https';
import { noStore, securityHeaders } from './http/security-headers';
import { servePage } from './http/serve-page';
import type { Parts } from './parts';

export interface App {
  readonly express: Express;
  /** The routes mounted, for the test that holds them against the contract. */
  readonly mounted: readonly Route[];
}

/** Composes middleware and features into one Express application; starts nothing. */
export function createApp(parts: Parts): App {
  const { config, connection, log, cookie, wallCookie, xsrf, mailPage, draining } = parts;
  const secure = config.publicUrl.startsWith('https:');
  const app = express();
  const mounted: Route[] = [];
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustProxy);
  app.use(logRequests(log), closeWhenDraining(draining), securityHeaders(secure, secure && config.https === 'off'));
  if (secure) app.use('/api', requireHttps(config.publicUrl));
  app.use(keepSession(connection.pool, config.sessionSecret, cookie));
  app.use(xsrf.guard);
  app.use('/api', noStore);

  const router = express.Router();
  const mount = mountOn({ router, db: connection.db, wallCookie, mounted: (route) => mounted.push(route) });
  for (const feature of features(parts)) feature(mount);
  app.use(router);
  if (mailPage) app.use(mailPage.router);

  app.use('/api/{*path}', (_request, _response, next) => next(notFound()));
  app.use(servePage(config.webDir));
  app.use(answerFailure);
  return { express: app, mounted };
}
