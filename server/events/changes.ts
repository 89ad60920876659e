import { sql } from 'kysely';
import pg from 'pg';
import type { Logger } from 'pino';
import type { Database } from '../database/database';

const channel = 'oriel_changes';
const firstRetryMs = 250;
const longestRetryMs = 10_000;
/** A connection that is dead without having been closed is found out so soon. */
const pulseMs = 15_000;
const patienceMs = 5_000;

/** Word of what changed, on whichever server it was changed. */
export interface Changes {
  /**
   * Calls `listener` after each committed change of `topic`, and whenever something may have been missed: after a lost connection.
   * @returns what ends the subscription.
   */
  subscribe(topic: string, listener: () => void): () => void;
  stop(): Promise<void>;
}

/** Makes it known that these topics changed, once the transaction is committed and not before (PostgreSQL manual, NOTIFY). */
export async function announce(transaction: Database, topics: readonly string[]): Promise<void> {
  for (const topic of topics) await sql`select pg_notify(${channel}, ${topic})`.execute(transaction);
}

/** Listens on a connection of its own, which is made again whenever it is lost. @throws when the first one cannot be made. */
export async function listenForChanges(databaseUrl: string, log: Logger): Promise<Changes> {
  const listeners = new Map<string, Set<() => void>>();
  let connection: { close(): Promise<void> } | null = null;
  let stopped = false;
  let retry: NodeJS.Timeout | undefined;
  let retryMs = firstRetryMs;

  const tell = (topic: string) => listeners.get(topic)?.forEach((listener) => listener());
  const tellAll = () => [...listeners.keys()].forEach(tell);

  function tryAgain(error: unknown): void {
    connection = null;
    if (stopped) return;
    log.warn({ err: error }, 'changes are not heard of for a moment: a database connection was lost');
    retry = setTimeout(() => void listen().then(tellAll, tryAgain), retryMs);
    retryMs = Math.min(retryMs * 2, longestRetryMs);
  }

  async function listen(): Promise<void> {
    const made = await openListener(databaseUrl, tell, tryAgain);
    if (stopped) return made.close();
    connection = made;
    retryMs = firstRetryMs;
  }

  await listen();
  return {
    subscribe(topic, listener) {
      const those = listeners.get(topic) ?? new Set();
      listeners.set(topic, those.add(listener));
      return () => {
        those.delete(listener);
        if (those.size === 0 && listeners.get(topic) === those) listeners.delete(topic);
      };
    },
    async stop() {
      stopped = true;
      clearTimeout(retry);
      await connection?.close();
    },
  };
}

/** One listening connection; `onLost` is called once, unless it was closed. @throws when it cannot be made */
async function openListener(
  databaseUrl: string,
  onTopic: (topic: string) => void,
  onLost: (error: unknown) => void,
): Promise<{ close(): Promise<void> }> {
  const client = new pg.Client({
    connectionString: databaseUrl,
    application_name: 'oriel changes',
    keepAlive: true,
    connectionTimeoutMillis: patienceMs,
    query_timeout: patienceMs,
  });
  let state: 'opening' | 'open' | 'over' = 'opening';
  const lose = (error: unknown) => {
    if (state !== 'open') return;
    state = 'over';
    clearInterval(pulse);
    client.end().catch(() => undefined);
    onLost(error);
  };
  client.on('error', lose);
  client.on('end', () => lose(new Error('the connection ended')));
  client.on('notification', ({ payload }) => onTopic(payload ?? ''));

  try {
    await client.connect();
    await client.query(`listen ${channel}`);
  } catch (error) {
    state = 'over';
    client.end().catch(() => undefined);
    throw error;
  }
  state = 'open';
  const pulse = setInterval(() => void client.query('select 1').catch(lose), pulseMs);
  return {
    async close() {
      state = 'over';
      clearInterval(pulse);
      await client.end();
    },
  };
}
