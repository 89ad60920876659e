export interface RunningPostgres {
  /** Of the database `oriel`, as a role that may make other databases. */
  readonly url: string;
  readonly stop: () => Promise<void>;
}

/** See postgres.mjs. */
export function startPostgres(options: {
  readonly dataDir: string;
  readonly port?: number;
  readonly durable?: boolean;
  readonly say?: (text: string) => void;
  readonly signal?: AbortSignal;
}): Promise<RunningPostgres>;
