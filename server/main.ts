import { createServer } from 'node:http';
import { pino } from 'pino';
import { createApp } from './app';
import { readConfig } from './config';
import { connect, migrate } from './database/database';
import { healthRoutes } from './health/health-routes';

const config = readConfig(process.env);
const log = pino({ level: config.logLevel });
const connection = connect(config.databaseUrl, (error) => log.warn({ err: error }, 'a database connection was lost'));
await migrate(connection.db);

const { express } = createApp(config, connection, log, [healthRoutes(connection.db)]);
const server = createServer(express);
server.listen(config.port, config.host, () => log.info({ address: config.publicUrl }, 'serving'));

const stop = () => {
  server.close(() => void connection.db.destroy().then(() => process.exit(0)));
  server.closeIdleConnections();
};
process.once('SIGTERM', stop);
process.once('SIGINT', stop);
