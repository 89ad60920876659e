import { createServer, type RequestListener } from 'node:http';
import { createServer as createSecureServer } from 'node:https';
import { join } from 'node:path';
import { createApp } from './app';
import { readConfig, type Config } from './config';
import { connect, migrate } from './database/database';
import { loadDemo } from './demo/load-demo';
import { listenForChanges } from './events/changes';
import { stopGracefully } from './http/graceful-stop';
import { openLog } from './http/open-log';
import { ownCertificate } from './http/own-certificate';
import { startJobs } from './jobs/jobs';
import { openPostOffice } from './mail/post-office';
import { assemble } from './parts';
import { folderStorage } from './storage/folder-storage';
import { startWork } from './work';

const uploadMs = 30 * 60_000;

const config = readConfig(process.env);
const log = openLog(config.logLevel);
const serverFor = async ({ https, tlsDir, storageDir }: Config, listener: RequestListener) =>
  https === 'off'
    ? createServer(listener)
    : createSecureServer(await ownCertificate(tlsDir ?? join(storageDir, 'tls')), listener);

async function start(): Promise<void> {
  const connection = connect(config.databaseUrl, (error) => log.warn({ err: error }, 'a database connection was lost'));
  await migrate(connection.db);
  const storage = await folderStorage(config.storageDir);
  const jobs = await startJobs(config.databaseUrl, log);
  const changes = await listenForChanges(config.databaseUrl, log);
  const { mailer, mailPage, close: closePostOffice } = await openPostOffice(config, log);

  let draining = false;
  const parts = assemble({ config, connection, log, storage, jobs, changes, mailer, mailPage, draining: () => draining });
  await startWork(parts);
  if (config.demo) await loadDemo(parts).catch((error: unknown) => log.error({ err: error }, 'the demo could not be loaded'));
  const server = await serverFor(config, createApp(parts).express);
  // Node's own five minutes would cut a large photograph off on a slow line.
  server.requestTimeout = uploadMs;
  server.once('error', failToStart);
  server.listen(config.port, config.host, () => log.info({ address: config.publicUrl }, 'serving'));

  const stop = () => {
    if (draining) return;
    draining = true;
    parts.eventStreams.endAll();
    const work = () => Promise.all([jobs.stop(), changes.stop(), parts.layerFiles.settled()]);
    const steps = [work, closePostOffice, () => connection.db.destroy()];
    void stopGracefully({ server, log, steps, exit: (code) => process.exit(code) });
  };
  process.on('SIGTERM', stop);
  process.on('SIGINT', stop);
}

function failToStart(error: unknown): void {
  log.fatal({ err: error }, 'could not start');
  process.exit(1);
}

start().catch(failToStart);
