import express, { type Request, type RequestHandler, type Response, type Router } from 'express';
import type * as z from 'zod';
import type { Route } from '@oriel/shared/contracts/route';
import type { Role } from '@oriel/shared/contracts/role';
import type { Database } from '../database/database';
import { admit } from './access';
import { refuseUnstorableText } from './storable-text';
import type { WallCookie } from './wall-cookie';

/** What a handler is given: the parsed request, and who asks. `accountId`, `householdId` and `wallId` are '' only where the access rule names none. */
export interface Asked<P, Q, B> {
  readonly params: P;
  readonly query: Q;
  readonly body: B;
  readonly accountId: string;
  readonly householdId: string;
  readonly role: Role | null;
  readonly wallId: string;
  readonly request: Request;
  readonly response: Response;
}

export type Mount = <P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  route: Route<P, Q, B, R>,
  handler: (asked: Asked<z.output<P>, z.output<Q>, z.output<B>>) => Promise<z.input<R>> | z.input<R>,
  receive?: RequestHandler,
) => void;

/** One feature's routes, put on the server. */
export type Feature = (mount: Mount) => void;

/** Sends a request through one middleware. @throws what it passes on. */
const through = (middleware: RequestHandler, request: Request, response: Response) =>
  new Promise<void>((resolve, reject) => {
    void middleware(request, response, (error?: unknown) =>
      error ? reject(error instanceof Error ? error : new Error(String(error))) : resolve(),
    );
  });

/** One router, and what its routes are told by. */
export interface MountingOn {
  readonly router: Router;
  readonly db: Database;
  readonly wallCookie: WallCookie;
  readonly mounted: (route: Route) => void;
}

/**
 * Makes the `mount` of one router: a route of the contract is admitted by its access rule, its body read (`receive` takes a multipart body
 * or counts against a limit; nothing is read before admission), parsed by its schemas, handled, and answered by its reply schema, which
 * also drops whatever it does not name. A handler of a file route writes the response itself.
 */
export function mountOn({ router, db, wallCookie, mounted }: MountingOn): Mount {
  return (route, handler, receive) => {
    mounted(route);
    const readJson = express.json({ limit: route.bodyMaxBytes });
    const steps = [...(route.sends === 'json' ? [readJson] : []), refuseUnstorableText, ...(receive ? [receive] : [])];

    const method = route.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
    router[method](route.path, async (request, response) => {
      const shown = { accountId: request.session.accountId ?? null, wallCredential: wallCookie.read(request) };
      const asker = await admit(db, route.access, shown, request.params);
      request.log.debug({ route: route.path }, 'admitted');
      for (const step of steps) await through(step, request, response);
      const reply = await handler({
        params: route.params.parse(request.params),
        query: route.query.parse(request.query),
        body: route.sends === 'json' ? route.body.parse(request.body ?? {}) : route.body.parse({}),
        accountId: asker.accountId ?? '',
        householdId: asker.member?.householdId ?? asker.wall?.householdId ?? '',
        role: asker.member?.role ?? null,
        wallId: asker.wall?.id ?? '',
        request,
        response,
      });
      if (route.answers === 'json') response.status(route.status).json(route.reply.parse(reply));
    });
  };
}
