import type { Request, RequestHandler, Response, Router } from 'express';
import type * as z from 'zod';
import type { Route } from '@oriel/shared/contracts/route';
import type { Role } from '@oriel/shared/contracts/role';
import type { Database } from '../database/database';
import { admit } from './access';

/** What a handler is given: the parsed request, and who asks. `accountId` and `householdId` are '' only where the access rule names nobody. */
export interface Asked<P, Q, B> {
  readonly params: P;
  readonly query: Q;
  readonly body: B;
  readonly accountId: string;
  readonly householdId: string;
  readonly role: Role | null;
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

/**
 * Makes the `mount` of one router: a route of the contract is admitted by its access rule, received (`receive` takes
 * a multipart body or counts against a limit, only after admission), parsed by its schemas, handled, and answered by its reply schema, which also drops whatever it does not name.
 * A handler of a file route writes the response itself.
 */
export function mountOn(router: Router, db: Database, mounted: (route: Route) => void): Mount {
  return (route, handler, receive) => {
    mounted(route);
    const receiveFile = (request: Request, response: Response) =>
      new Promise<void>((resolve, reject) => {
        if (!receive) return resolve();
        void receive(request, response, (error?: unknown) =>
          error ? reject(error instanceof Error ? error : new Error(String(error))) : resolve(),
        );
      });

    const method = route.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
    router[method](route.path, async (request, response) => {
      const asker = await admit(db, route.access, request.session.accountId ?? null, request.params);
      request.log.debug({ route: route.path }, 'admitted');
      await receiveFile(request, response);
      const reply = await handler({
        params: route.params.parse(request.params),
        query: route.query.parse(request.query),
        body: route.sends === 'json' ? route.body.parse(request.body ?? {}) : route.body.parse({}),
        accountId: asker.accountId ?? '',
        householdId: asker.member?.householdId ?? '',
        role: asker.member?.role ?? null,
        request,
        response,
      });
      if (route.answers === 'json') response.status(route.status).json(route.reply.parse(reply));
    });
  };
}
