import type { Server } from 'node:http';
import type { Logger } from 'pino';

/** Sooner than whoever started the server loses patience (10 s is customary). */
const hardStopMs = 9_000;

export interface Stopping {
  readonly server: Server;
  readonly log: Logger;
  /** What to close once the last answer is out, in this order. */
  readonly steps: readonly (() => Promise<unknown>)[];
  readonly exit: (code: number) => void;
  readonly hardStopAfterMs?: number;
}

/** Finishes the requests in flight, closes everything in order and exits 0; after nine seconds cuts off what is left and exits 1. */
export async function stopGracefully({ server, log, steps, exit, hardStopAfterMs = hardStopMs }: Stopping): Promise<void> {
  log.info('stopping');
  setTimeout(() => {
    log.error('could not finish in time: cutting off what is left');
    server.closeAllConnections();
    exit(1);
  }, hardStopAfterMs).unref();
  const closed = new Promise<void>((resolve) => server.close(() => resolve()));
  server.closeIdleConnections();
  await closed;
  for (const step of steps) await step().catch((error: unknown) => log.error({ err: error }, 'could not close everything'));
  log.info('stopped');
  exit(0);
}
