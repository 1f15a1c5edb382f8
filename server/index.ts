import { createServer, type Server } from 'node:http';
import { buildApp } from './app';
import { ConfigError, readConfig, type Config } from './config';
import type { Platform } from './context';
import { createLogger } from './http/log';
import { openMailTransport } from './mail/transport';
import { startMailWorker } from './mail/worker';
import { openDatabase } from './models';
import { migrate } from './models/migrate';
import { seedDemo } from './seeders';
import { ensureOwner } from './services/owner';
import { sweep } from './services/sweep';
import { openObjectStore } from './storage/object-store';

const hour = 3_600_000;

/** Milliseconds that open requests have to end when the process is told to stop. */
const lastWait = 5000;

const listen = (server: Server, { port, host }: Config): Promise<void> =>
  new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen({ port, host }, resolve);
  });

const prepare = async (): Promise<Platform> => {
  const config = readConfig(process.env);
  const platform = { config, db: openDatabase(config.database), logger: createLogger(config), now: () => new Date() };
  await migrate(platform.db);
  await ensureOwner(platform);
  await seedDemo(platform);
  return platform;
};

/** A store that cannot be reached is told in the log; what needs it fails then, and everything else goes on. */
const checkStore = async ({ config, logger }: Platform): Promise<void> => {
  const store = await openObjectStore(config);
  await store
    .check()
    .catch((error: unknown) => logger.warn({ reason: String(error) }, 'the object store does not answer'));
  store.close();
};

const start = async (): Promise<void> => {
  const platform = await prepare();
  const { config, db, logger } = platform;
  const server = createServer(buildApp(platform));
  await listen(server, config);
  logger.info({ port: config.port, host: config.host }, 'listening');
  process.send?.({ ready: true });
  const worker = startMailWorker(platform, openMailTransport(config));
  const sweeping = setInterval(() => {
    sweep(platform).catch((error: unknown) => logger.error({ err: error }, 'sweep'));
  }, hour);
  void checkStore(platform);

  let stopping = false;
  const stop = async (): Promise<void> => {
    if (stopping) return;
    stopping = true;
    clearInterval(sweeping);
    const closed = new Promise((resolve) => server.close(resolve));
    server.closeIdleConnections();
    setTimeout(() => server.closeAllConnections(), lastWait).unref();
    await Promise.all([closed, worker.stop()]);
    await db.sequelize.close();
    process.exit(0);
  };
  // The starter's end of the channel closes with it, however it ended.
  for (const signal of ['SIGTERM', 'SIGINT', 'disconnect']) process.once(signal, () => void stop());
};

/** One line for what the person who starts it can mend; the stack for a defect. */
const reasonOf = (error: unknown): string => {
  if (error instanceof ConfigError) return error.message;
  if (!(error instanceof Error)) return String(error);
  if (error.name.startsWith('Sequelize')) return `The database does not answer as it should: ${error.message}`;
  return 'code' in error ? error.message : (error.stack ?? error.message);
};

start().catch((error: unknown) => {
  process.stderr.write(`${reasonOf(error)}\n`);
  process.exit(1);
});
