import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type * as z from 'zod';
import { whoAmI } from '@oriel/shared/contracts/accounts';
import type { Route } from '@oriel/shared/contracts/route';
import { type ApiFailure, toApiFailure } from './api-failure';

interface Parts {
  readonly params?: Record<string, unknown>;
  readonly query?: Record<string, unknown>;
  readonly body?: unknown;
}

/** The address of a route with its parameters filled in; for `<img src>` and downloads too. */
export function addressOf(route: Route, params: Record<string, unknown> = {}): string {
  return route.path.replace(/:(\w+)/g, (_match, name: string) => encodeURIComponent(String(params[name])));
}

const given = (query: Record<string, unknown> = {}) =>
  Object.fromEntries(Object.entries(query).filter(([, value]) => value !== undefined).map(([name, value]) => [name, String(value)]));

/** Calls the server by the contract's own routes. Every failure comes out as an ApiFailure. */
@Injectable({ providedIn: 'root' })
export class Api {
  private readonly http = inject(HttpClient);

  async call<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
    route: Route<P, Q, B, R>,
    parts: { params?: z.input<P> & object; query?: z.input<Q> & object; body?: z.input<B> } = {},
  ): Promise<z.output<R>> {
    try {
      return route.reply.parse(await this.send(route, parts as Parts));
    } catch (error) {
      const failure = toApiFailure(error);
      if (!isStale(failure)) throw failure;
    }
    return this.callAfresh(route, parts as Parts);
  }

  /** Signing in or out elsewhere changes the forgery token; asking who we are brings the new one. */
  private async callAfresh<R extends z.ZodType>(route: Route<z.ZodType, z.ZodType, z.ZodType, R>, parts: Parts) {
    try {
      await this.send(whoAmI, {});
      return route.reply.parse(await this.send(route, parts));
    } catch (error) {
      throw toApiFailure(error);
    }
  }

  private send(route: Route, { params, query, body }: Parts): Promise<unknown> {
    return firstValueFrom(
      this.http.request<unknown>(route.method, addressOf(route, params), { body, params: given(query) }),
    );
  }
}

const isStale = (failure: ApiFailure) => failure.failure.code === 'stale-page';
