import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { run } from './run.mjs';
import { GiveUp, say } from './say.mjs';

/** All that the export is made of. */
const sources = [
  'app',
  'components',
  'lib',
  'shared',
  'assets',
  'public',
  'app.json',
  'babel.config.js',
  'metro.config.js',
  'tsconfig.json',
  'package-lock.json',
  'server/scripts/finish-export.mjs',
];

/** Environment of every build. */
export const exportSettings = { NODE_ENV: 'production', EXPO_OFFLINE: '1', EXPO_NO_TELEMETRY: '1', CI: '1' };

const finish = 'server/scripts/finish-export.mjs';

/** Kept inside the export, under a name that is never served. */
const mark = '.sources';

const filesUnder = (path) => {
  if (!existsSync(path)) return [];
  try {
    return readdirSync(path, { recursive: true, withFileTypes: true })
      .filter((entry) => entry.isFile())
      .map((entry) => join(entry.parentPath, entry.name));
  } catch {
    return [path];
  }
};

/** Hash of the content of all sources. */
const sourceHash = () => {
  const hash = createHash('sha256');
  for (const file of sources.flatMap(filesUnder).sort())
    hash.update(`${file}\0`).update(readFileSync(file)).update('\0');
  return hash.digest('hex');
};

const build = async (args, env = {}) => {
  const { status, output } = await run(process.execPath, args, { env });
  if (status === 0) return;
  if (/ENOSPC|No space left/.test(output)) {
    throw new GiveUp('the web application could not be built: the disk is full.');
  }
  process.stderr.write(`${output}\n`);
  throw new GiveUp('the web application could not be built; the reason is above.');
};

/**
 * Builds the web export into `folder` when it is missing or when a source has changed since. It is built beside and
 * moved when whole, so that a build that was broken off leaves the old one.
 */
export const ensureWebExport = async (folder = 'dist') => {
  const hash = sourceHash();
  const markFile = join(folder, mark);
  if (existsSync(join(folder, 'index.html')) && existsSync(markFile) && readFileSync(markFile, 'utf8') === hash) return;
  say('Building the web application (half a minute)...');
  const making = `${folder}.new`;
  rmSync(making, { recursive: true, force: true });
  await build(['node_modules/expo/bin/cli', 'export', '-p', 'web', '--output-dir', making], exportSettings);
  await build([finish, making, folder]);
  writeFileSync(join(making, mark), hash);
  rmSync(folder, { recursive: true, force: true });
  renameSync(making, folder);
};
