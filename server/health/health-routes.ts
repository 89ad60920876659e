import { sql } from 'kysely';
import { health, readiness } from '@oriel/shared/contracts/health';
import type { Feature } from '../app';
import type { Database } from '../database/database';
import { DomainFailure } from '../http/failure';

export const healthRoutes =
  (db: Database): Feature =>
  (mount) => {
    mount(health, () => ({ state: 'running' }) as const);
    mount(readiness, async () => {
      await sql`select 1`.execute(db).catch(() => {
        throw new DomainFailure(503, 'not-ready', 'The database does not answer.', 'Wait a moment; Oriel tries again by itself.');
      });
      return { state: 'ready' } as const;
    });
  };
