import { existsSync } from 'node:fs';
import { spawnSync } from 'node:child_process';
import { startNode, whenReady } from './setup/children.mjs';
import { checkRoom, dataFolder, makeFolder, takeFolder } from './setup/folder.mjs';
import { ensurePackages, packagesMatch } from './setup/packages.mjs';
import { isFree } from './setup/ports.mjs';
import { giveUp, GiveUp, say } from './setup/say.mjs';
import { stopList } from './setup/stopping.mjs';
import { ensureWebExport } from './setup/web-export.mjs';

/** Megabytes that a first run needs (packages, database, build) and that any run needs. */
const room = { first: 2500, later: 200 };

const serverArgs = ['--import', 'tsx', 'server/index.ts'];

const port = () => {
  const value = Number(process.env.PORT || 3000);
  if (Number.isInteger(value) && value > 0 && value < 65_536) return value;
  throw new GiveUp(`PORT has to be a number from 1 to 65535, not "${process.env.PORT}".`);
};

const checkPort = async (wanted) => {
  if (await isFree(wanted, process.env.HOST || '127.0.0.1')) return;
  throw new GiveUp(
    wanted < 1024 && process.getuid?.() !== 0
      ? `only root may use port ${wanted}. Take another: PORT=3000 npm start`
      : `port ${wanted} is in use by another program. Take another: PORT=${wanted + 1} npm start`,
  );
};

/** Runs until the server ends or everything is stopped. */
const runServer = async ({ env, stops, ready }) => {
  const server = startNode(serverArgs, { env });
  stops.add(server.stop);
  if (await whenReady(server)) ready();
  else if (!stops.isStopping()) throw new GiveUp('the server did not start; the reason is above.');
  await server.ended;
  if (stops.isStopping()) return;
  throw new GiveUp('the server has ended by itself; the reason is above.');
};

const production = async (stops) => {
  await ensurePackages();
  const check = spawnSync(process.execPath, ['--import', 'tsx', 'server/scripts/check-config.ts'], {
    stdio: 'inherit',
  });
  if (check.status !== 0) throw new GiveUp('nothing was started.');
  await ensureWebExport();
  await runServer({ env: process.env, stops, ready: () => say(`Rowcall serves ${process.env.PUBLIC_URL}`) });
};

const development = async (stops) => {
  const folder = dataFolder();
  const address = `http://localhost:${port()}`;
  makeFolder(folder);
  stops.add(takeFolder(folder, address));
  await checkPort(port());
  const first = !packagesMatch() || !existsSync('dist');
  checkRoom(folder, first ? room.first : room.later);
  await ensurePackages();
  // Loaded when the packages are there: the fakes need some of them.
  const { demoAccounts, ensureMariadb, startLocalServices } = await import('./setup/local-services.mjs');
  await ensureMariadb();
  await ensureWebExport();
  const { env, database } = await startLocalServices({ folder, port: port(), stops });
  const lost = new Promise((_, reject) => {
    database.child.once('exit', () => stops.isStopping() || reject(new GiveUp('the database has ended by itself.')));
  });
  const ready = () =>
    say(
      [
        '',
        `  Rowcall is ready:  ${address}`,
        `  Its mail:          ${address}/dev/mail`,
        `  Demo accounts:     ${demoAccounts.join('\n                     ')}`,
        `  Their password:    ${env.DEMO_PASSWORD}`,
        `  Data:              ${folder}`,
        '  Stop with Ctrl-C.',
        '',
      ].join('\n'),
    );
  await Promise.race([runServer({ env, stops, ready }), lost]);
};

const stops = stopList();
try {
  await (process.env.NODE_ENV === 'production' ? production(stops) : development(stops));
  await stops.stopAll();
  process.exit(0);
} catch (error) {
  // What fails because it was told to stop is no failure.
  const stopped = stops.isStopping();
  await stops.stopAll();
  if (stopped) process.exit(0);
  giveUp(error);
}
