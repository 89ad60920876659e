import pg from 'pg';

/** Any number will do, as long as nothing else locks it. */
const lock = 0x0e1e1;

export interface Presence {
  leave(): Promise<void>;
}

/**
 * Marks that a server is at work on this database, for as long as its connection lives: PostgreSQL itself takes the mark of a killed
 * server away. Before that, `alone` runs if no other server is at work, while none can come.
 */
export async function announceServer(
  databaseUrl: string,
  alone: () => Promise<void>,
  onLost: (error: Error) => void,
): Promise<Presence> {
  const client = new pg.Client({ connectionString: databaseUrl, application_name: 'oriel presence', keepAlive: true });
  client.on('error', onLost);
  await client.connect();
  try {
    const { rows } = await client.query<{ taken: boolean }>('select pg_try_advisory_lock($1) as taken', [lock]);
    if (rows[0].taken) await alone();
    await client.query('select pg_advisory_lock_shared($1)', [lock]);
    if (rows[0].taken) await client.query('select pg_advisory_unlock($1)', [lock]);
  } catch (error) {
    await client.end();
    throw error;
  }
  return { leave: () => client.end() };
}
