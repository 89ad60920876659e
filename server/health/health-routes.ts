import { sql } from 'kysely';
import { health, readiness } from '@oriel/shared/contracts/health';
import { DomainFailure } from '../http/failure';
import type { Feature } from '../http/mount';
import type { Parts } from '../parts';

const notReady = (message: string, remedy: string) => new DomainFailure(503, 'not-ready', message, remedy);

export const healthRoutes =
  ({ connection, draining }: Parts): Feature =>
  (mount) => {
    mount(health, () => ({ state: 'running' }) as const);
    mount(readiness, async () => {
      if (draining()) throw notReady('This server is stopping.', 'Ask again in a moment.');
      await sql`select 1`.execute(connection.db).catch(() => {
        throw notReady('The database does not answer.', 'Wait a moment; Oriel tries again by itself.');
      });
      return { state: 'ready' } as const;
    });
  };
