import type { RequestHandler } from 'express';
import { DomainFailure } from './failure';

/** PostgreSQL's text and jsonb hold neither NUL nor half of a surrogate pair (PostgreSQL manual, 8.3 and 8.14). */
const unstorable = /[\0\p{Surrogate}]/u;

function holdsUnstorable(value: unknown): boolean {
  if (typeof value === 'string') return unstorable.test(value);
  if (typeof value !== 'object' || value === null) return false;
  return Object.entries(value).some(([name, inner]) => unstorable.test(name) || holdsUnstorable(inner));
}

/** Refuses such characters wherever they stand in the body or the query, instead of failing in the database. */
export const refuseUnstorableText: RequestHandler = (request, _response, next) =>
  holdsUnstorable(request.body) || holdsUnstorable(request.query)
    ? next(new DomainFailure(400, 'not-understood', 'A text holds characters that cannot be kept.', 'Type it again instead of pasting it in.'))
    : next();
