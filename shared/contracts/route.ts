import * as z from 'zod';
import type { Role } from './role';

/** The things an address can name; each belongs to one household, which decides the asker's role. */
export type Owned = 'household' | 'photo' | 'scene' | 'image' | 'wall' | 'run';

/**
 * Who may use a route: anyone; whoever is signed in; or members of the household that owns the thing named in the address
 * (`householdId`, `photoId`, `sceneId` and so on), in one of the roles, to anyone else the thing does not exist (404); or a paired screen,
 * which by its own credential reaches its own wall and nothing else.
 */
export type Access =
  | { readonly kind: 'anyone' }
  | { readonly kind: 'signed-in' }
  | { readonly kind: 'member'; readonly of: Owned; readonly roles: readonly Role[] }
  | { readonly kind: 'wall' };

export const anyone: Access = { kind: 'anyone' };
export const signedIn: Access = { kind: 'signed-in' };
export const theWall: Access = { kind: 'wall' };
export const members = (of: Owned, roles: readonly Role[]): Access => ({ kind: 'member', of, roles });

export type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

/** How a body travels: `json`, or `multipart` with one file in the field `file`. */
export type Sends = 'json' | 'multipart';
/** How an answer travels: `json`, or the bytes of a `file`. */
export type Answers = 'json' | 'file';

/** One route as data: the server mounts it, the page calls it, the tests walk it. */
export interface Route<
  P extends z.ZodType = z.ZodType,
  Q extends z.ZodType = z.ZodType,
  B extends z.ZodType = z.ZodType,
  R extends z.ZodType = z.ZodType,
> {
  readonly method: Method;
  /** Express notation, e.g. `/api/scenes/:sceneId`. */
  readonly path: string;
  readonly access: Access;
  readonly params: P;
  readonly query: Q;
  readonly body: B;
  readonly reply: R;
  readonly sends: Sends;
  /** The most a JSON body may hold; a larger one is answered 413. */
  readonly bodyMaxBytes: number;
  readonly answers: Answers;
  /** HTTP status of a good answer. */
  readonly status: number;
}

export const nothing = z.object({});
export type Nothing = typeof nothing;

interface Definition<P, Q, B, R> {
  method: Method;
  path: string;
  access: Access;
  params?: P;
  query?: Q;
  body?: B;
  reply?: R;
  sends?: Sends;
  bodyMaxBytes?: number;
  answers?: Answers;
  status?: number;
}

/** Defines a route; what is left out is empty, travels as JSON and answers 200. */
export function defineRoute<
  P extends z.ZodType = Nothing,
  Q extends z.ZodType = Nothing,
  B extends z.ZodType = Nothing,
  R extends z.ZodType = Nothing,
>(definition: Definition<P, Q, B, R>): Route<P, Q, B, R> {
  const empty = nothing as unknown;
  return {
    params: empty as P,
    query: empty as Q,
    body: empty as B,
    reply: empty as R,
    sends: 'json',
    bodyMaxBytes: 1_000_000,
    answers: 'json',
    status: 200,
    ...definition,
  };
}

export type BodyOf<T> = T extends Route<z.ZodType, z.ZodType, infer B, z.ZodType> ? z.input<B> : never;
export type ReplyOf<T> = T extends Route<z.ZodType, z.ZodType, z.ZodType, infer R> ? z.output<R> : never;
