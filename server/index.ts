import { createServer } from 'node:http';
import { buildApp } from './app';
import { ConfigError, readConfig } from './config';
import { createLogger } from './http/log';
import { openDatabase } from './models';
import { migrate } from './models/migrate';

const start = async (): Promise<void> => {
  const config = readConfig(process.env);
  const logger = createLogger(config);
  const db = openDatabase(config.database);
  await migrate(db);
  const server = createServer(buildApp({ config, db, logger, now: () => new Date() }));
  server.listen(config.port, config.host, () => logger.info({ port: config.port }, 'listening'));

  const stop = () => {
    server.close(() => void db.sequelize.close());
    server.closeIdleConnections();
  };
  process.once('SIGTERM', stop);
  process.once('SIGINT', stop);
};

start().catch((error: unknown) => {
  process.stderr.write(`${error instanceof ConfigError ? error.message : String(error)}\n`);
  process.exitCode = 1;
});
