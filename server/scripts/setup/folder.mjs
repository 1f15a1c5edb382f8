import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, renameSync, rmSync, statfsSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { freePort, isFree } from './ports.mjs';
import { GiveUp } from './say.mjs';

const megabyte = 2 ** 20;

/** The folder of everything that a run keeps: database, mail, files, secrets. ROWCALL_FOLDER names another. */
export const dataFolder = () => resolve(process.env.ROWCALL_FOLDER || '.rowcall');

/** Makes the folder; says in one line if it cannot be written. */
export const makeFolder = (folder) => {
  try {
    mkdirSync(folder, { recursive: true, mode: 0o700 });
    writeFileSync(join(folder, '.probe'), 'x');
    rmSync(join(folder, '.probe'));
  } catch (error) {
    const full = error.code === 'ENOSPC';
    throw new GiveUp(
      full
        ? `the disk is full: nothing can be written to ${folder}.`
        : `the folder ${folder} cannot be written: ${error.message}`,
    );
  }
};

/** Says in one line if there is less room than what is about to be done needs. */
export const checkRoom = (folder, neededMegabytes) => {
  const { bavail, bsize } = statfsSync(existsSync(folder) ? folder : '.');
  const free = Math.floor((bavail * bsize) / megabyte);
  if (free < neededMegabytes)
    throw new GiveUp(`the disk is full: ${free} MB are free, ${neededMegabytes} MB are needed.`);
};

/** Reads a JSON file of the folder; undefined when it is missing. */
const readKept = (file) => {
  if (!existsSync(file)) return undefined;
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    throw new GiveUp(`${file} is broken. Move the folder away to start afresh.`);
  }
};

const keep = (file, value) => {
  writeFileSync(`${file}.new`, `${JSON.stringify(value, null, 2)}\n`, { mode: 0o600 });
  renameSync(`${file}.new`, file);
};

const random = () => randomBytes(24).toString('hex');

/** Secrets of this machine, made at random on the first run and kept. They are for development only. */
export const keptSecrets = (folder) => {
  const file = join(folder, 'secrets.json');
  const secrets = { token: random(), database: random(), ...readKept(file) };
  keep(file, secrets);
  return secrets;
};

/** Ports of the database, the mail catcher and the object store: chosen once, and again when somebody has taken one. */
export const keptPorts = async (folder) => {
  const file = join(folder, 'ports.json');
  const kept = readKept(file) ?? {};
  const ports = {};
  for (const name of ['database', 'mail', 'store']) {
    const free = Number.isInteger(kept[name]) && (await isFree(kept[name]));
    ports[name] = free ? kept[name] : await freePort();
  }
  keep(file, ports);
  return ports;
};

/** Says in one line if another run uses the folder; otherwise takes it until the returned function is called. */
export const takeFolder = (folder, address) => {
  const file = join(folder, 'running.json');
  const other = existsSync(file) ? safeParse(readFileSync(file, 'utf8')) : undefined;
  if (other && isStarter(other.pid)) {
    throw new GiveUp(`it runs already at ${other.address} (process ${other.pid}). Stop that one first.`);
  }
  keep(file, { pid: process.pid, address });
  return () => rmSync(file, { force: true });
};

const safeParse = (text) => {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
};

/** A process id may have gone to another program since. */
const isStarter = (pid) => {
  const file = `/proc/${pid}/cmdline`;
  return pid !== process.pid && existsSync(file) && /scripts\/(start|dev)\.mjs/.test(readFileSync(file, 'utf8'));
};
