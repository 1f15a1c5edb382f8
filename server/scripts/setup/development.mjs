import { checkRoom, dataFolder, makeFolder, takeFolder } from './folder.mjs';
import { ensurePackages, packagesMatch } from './packages.mjs';
import { isFree } from './ports.mjs';
import { GiveUp } from './say.mjs';
import { ensureWebExport } from './web-export.mjs';

/** Megabytes that a first run needs (packages, database, build) and that any run needs. */
const room = { first: 2500, later: 200 };

/**
 * The port that a variable of the environment names.
 * @param {string} name
 * @param {number} fallback
 */
export const portOf = (name, fallback) => {
  const value = Number(process.env[name] || fallback);
  if (Number.isInteger(value) && value > 0 && value < 65_536) return value;
  throw new GiveUp(`${name} has to be a number from 1 to 65535, not "${process.env[name]}".`);
};

const checkPort = async (name, port) => {
  if (await isFree(port, process.env.HOST || '127.0.0.1')) return;
  throw new GiveUp(
    port < 1024 && process.getuid?.() !== 0
      ? `only root may use port ${port}. Take another: ${name}=3000 npm start`
      : `port ${port} is in use by another program. Take another: ${name}=${port + 1} npm start`,
  );
};

/**
 * Sets up what a development machine needs and starts its database, mail catcher and object store. Gives up in one line
 * when a port is taken, the disk is full, the folder is in use or something cannot be installed.
 *
 * @param {object} options
 * @param {Record<string, number>} options.ports Ports to be free, by the variable that names each.
 * @param {string} options.address Where people open it.
 * @param {boolean} options.built True if the web export is served.
 * @param {ReturnType<typeof import('./stopping.mjs').stopList>} options.stops
 */
export const setUpDevelopment = async ({ ports, address, built, stops }) => {
  const folder = dataFolder();
  makeFolder(folder);
  stops.add(takeFolder(folder, address));
  for (const [name, port] of Object.entries(ports)) await checkPort(name, port);
  checkRoom(folder, packagesMatch() ? room.later : room.first);
  await ensurePackages();
  // Loaded when the packages are there: the fakes need some of them.
  const { demoAccounts, ensureMariadb, startLocalServices } = await import('./local-services.mjs');
  await ensureMariadb();
  if (built) await ensureWebExport();
  const set = { PUBLIC_URL: address, ...process.env };
  const { env, database } = await startLocalServices({ folder, port: ports.PORT, stops, set });
  const databaseLost = new Promise((_, reject) => {
    database.child.once('exit', () => stops.isStopping() || reject(new GiveUp('the database has ended by itself.')));
  });
  const welcome = [
    '',
    `  Rowcall is ready:  ${address}`,
    `  Its mail:          ${address}/dev/mail`,
    `  Demo accounts:     ${demoAccounts.join('\n                     ')}`,
    `  Their password:    ${env.DEMO_PASSWORD}`,
    `  Data:              ${folder}`,
    '  Stop with Ctrl-C.',
    '',
  ].join('\n');
  return { env, databaseLost, welcome };
};
