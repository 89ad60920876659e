import type { Parts } from './parts';
import { workOnDerivatives } from './photos/derivative-job';

/** Takes up the work that is done apart from requests. */
export async function startWork({ connection, storage, jobs }: Parts): Promise<void> {
  await workOnDerivatives(connection.db, storage, jobs);
}
