import { existsSync, rmSync, writeFileSync } from 'node:fs';
import { run } from './run.mjs';
import { GiveUp, say } from './say.mjs';

const apt = (...args) => run('apt-get', ['-q', ...args], { env: { DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C' } });

const policy = '/usr/sbin/policy-rc.d';

/** Does `work` while packages may not start services: what we need of them we start ourselves. */
const withoutServices = async (work) => {
  const ours = !existsSync(policy);
  if (ours) writeFileSync(policy, '#!/bin/sh\nexit 101\n', { mode: 0o755 });
  try {
    return await work();
  } finally {
    if (ours) rmSync(policy, { force: true });
  }
};

/**
 * Installs a Debian package unless `present` says it is there; only root can.
 * @param {{ name: string, present: () => boolean, purpose: string }} wanted
 */
export const ensureDebianPackage = async ({ name, present, purpose }) => {
  if (present()) return;
  if (process.getuid?.() !== 0) {
    throw new GiveUp(
      `${name} is missing (${purpose}) and only root can install it: run \`apt-get install ${name}\` as root once.`,
    );
  }
  if (!existsSync('/usr/bin/apt-get'))
    throw new GiveUp(`${name} is missing (${purpose}) and there is no apt-get to install it with.`);
  say(`Installing ${name} from Debian (${purpose})...`);
  await apt('update');
  const done = await withoutServices(() => apt('install', '-y', '--no-install-recommends', name));
  if (done.status === 0 && present()) return;
  const lines = done.output.split('\n').filter((line) => /^E: |No space left/.test(line));
  throw new GiveUp(`${name} could not be installed: ${lines.at(-1)?.replace(/^E: /, '') ?? 'apt-get gave no reason'}`);
};

const chromium = '/usr/bin/chromium';

/** Chromium for the browser tests. */
export const ensureChromium = () =>
  ensureDebianPackage({ name: 'chromium', present: () => existsSync(chromium), purpose: 'the browser of the tests' });

/** Pin tables of chips, which a test of the chip families compares with. */
const kicadSymbols = '/usr/share/kicad/symbols/Memory_RAM.kicad_sym';

/** The symbols of KiCad for the tests against published pin tables. */
export const ensureKicadSymbols = () =>
  ensureDebianPackage({
    name: 'kicad-symbols',
    present: () => existsSync(kicadSymbols),
    purpose: 'the pin tables of the tests',
  });

/** A small and fast awk, which the import of logs is measured against. */
export const ensureMawk = () =>
  ensureDebianPackage({
    name: 'mawk',
    present: () => existsSync('/usr/bin/mawk'),
    purpose: 'what the import of logs is measured against',
  });
