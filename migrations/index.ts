import type { Migration } from 'kysely';
import { foundation } from './0001-foundation';

/** Every migration by name, in order. A static table, for the server is one bundle and has no folder to scan. */
export const migrations: Record<string, Migration> = {
  '0001-foundation': foundation,
};
