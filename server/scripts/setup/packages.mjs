import { existsSync, readFileSync } from 'node:fs';
import { run } from './run.mjs';
import { GiveUp, say } from './say.mjs';

const read = (path) => JSON.parse(readFileSync(path, 'utf8')).packages;

/** True if node_modules holds exactly the versions of the lock file. Packages for other systems may be missing. */
export const packagesMatch = () => {
  const kept = 'node_modules/.package-lock.json';
  if (!existsSync(kept)) return false;
  const here = read(kept);
  return Object.entries(read('package-lock.json')).every(
    ([path, wanted]) =>
      path === '' || (here[path] ? here[path].version === wanted.version : Boolean(wanted.optional || wanted.peer)),
  );
};

/** Installs the packages of the lock file when they are missing or differ from it. */
export const ensurePackages = async () => {
  if (packagesMatch()) return;
  say('Installing the npm packages of the lock file (a minute or two)...');
  const done = await run('npm', ['ci', '--no-audit', '--no-fund', '--loglevel=error']);
  if (done.status === 0) return;
  const lines = done.output.split('\n').filter((line) => /npm (error|ERR!)/.test(line));
  const full = lines.find((line) => /ENOSPC/.test(line));
  const reason = full ? 'the disk is full' : (lines.find((line) => !/code/.test(line)) ?? 'npm gave no reason');
  throw new GiveUp(`the npm packages could not be installed: ${reason.replace(/^npm (error|ERR!)\s*/, '')}`);
};
