import { createServer } from 'node:http';
import { pino } from 'pino';
import { createApp } from './app';
import { readConfig } from './config';
import { connect, migrate } from './database/database';
import { startJobs } from './jobs/jobs';
import { createMailer, smtpDelivery } from './mail/mailer';
import { assemble } from './parts';
import { folderStorage } from './storage/folder-storage';
import { startWork } from './work';

const config = readConfig(process.env);
const log = pino({ level: config.logLevel });
const connection = connect(config.databaseUrl, (error) => log.warn({ err: error }, 'a database connection was lost'));
await migrate(connection.db);

const storage = await folderStorage(config.storageDir);
const jobs = await startJobs(config.databaseUrl, log);

let draining = false;
const mailer = createMailer(smtpDelivery(config.smtpUrl ?? 'smtp://127.0.0.1:2525', config.mailFrom), log);
const parts = assemble({ config, connection, log, storage, jobs, mailer, mailPage: null, draining: () => draining });
await startWork(parts);
const { express } = createApp(parts);
const server = createServer(express);
server.listen(config.port, config.host, () => log.info({ address: config.publicUrl }, 'serving'));

const stop = () => {
  draining = true;
  server.close(() => void jobs.stop().then(() => connection.db.destroy()).then(() => process.exit(0)));
  server.closeIdleConnections();
};
process.once('SIGTERM', stop);
process.once('SIGINT', stop);
