import connectPgSimple from 'connect-pg-simple';
import express, { type Express } from 'express';
import session from 'express-session';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import { randomUUID } from 'node:crypto';
import type { Route } from '@oriel/shared/contracts/route';
import type { Config } from './config';
import type { Connection } from './database/database';
import { answerFailure } from './http/answer-failure';
import { notFound } from './http/failure';
import { mountOn, type Mount } from './http/mount';
import { securityHeaders } from './http/security-headers';
import './http/session-data';
import { servePage } from './http/serve-page';
import { guardXsrf } from './http/xsrf';

/** One feature's routes, put on the server. */
export type Feature = (mount: Mount) => void;

export interface App {
  readonly express: Express;
  /** The routes mounted, for the test that holds them against the contract. */
  readonly mounted: readonly Route[];
}

const sessionDays = 30;

/** Composes middleware and features into one Express application; starts nothing. */
export function createApp(config: Config, connection: Connection, log: Logger, features: readonly Feature[]): App {
  const app = express();
  const mounted: Route[] = [];
  const secure = config.publicUrl.startsWith('https:');
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustProxy);
  app.use(
    pinoHttp({
      logger: log,
      genReqId: () => randomUUID(),
      redact: ['req.headers.cookie', 'req.headers["x-xsrf-token"]', 'req.headers.authorization', 'res.headers["set-cookie"]'],
      autoLogging: { ignore: (request) => request.url === '/health' || request.url === '/ready' },
    }),
  );
  app.use(securityHeaders(secure));

  const Store = connectPgSimple(session);
  app.use(
    session({
      name: secure ? '__Host-oriel' : 'oriel',
      store: new Store({ pool: connection.pool, tableName: 'session', pruneSessionInterval: 3600 }),
      secret: config.sessionSecret,
      resave: false,
      saveUninitialized: false,
      rolling: true,
      cookie: { httpOnly: true, sameSite: 'lax', secure, path: '/', maxAge: sessionDays * 24 * 3600 * 1000 },
    }),
  );
  app.use(guardXsrf(config.sessionSecret, secure));
  app.use('/api', express.json({ limit: '1mb' }));

  const router = express.Router();
  const mount = mountOn(router, connection.db, (route) => mounted.push(route));
  for (const feature of features) feature(mount);
  app.use(router);

  app.use('/api/{*path}', (_request, _response, next) => next(notFound()));
  app.use(servePage(config.webDir));
  app.use(answerFailure);
  return { express: app, mounted };
}
