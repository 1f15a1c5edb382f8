import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startMariadb } from '@/server/scripts/setup/mariadb.mjs';
import { freePort } from '@/server/scripts/setup/ports.mjs';

const folder = mkdtempSync(join(tmpdir(), 'rowcall-mariadb-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const until = async (holds: () => boolean): Promise<boolean> => {
  for (let waited = 0; waited < 45_000; waited += 100) {
    if (holds()) return true;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  return false;
};

it('a private database ends with the process that started it, even if that one is killed', async () => {
  const own = join(folder, 'own');
  const code = `import('./server/scripts/setup/mariadb.mjs').then(({ startMariadb }) =>
    startMariadb({ folder: ${JSON.stringify(own)}, port: ${await freePort()}, password: 'x', databases: 'rowcall' }))`;
  // Killed while it is still starting, the database would not hear the signal yet.
  const ready = join(folder, 'ready');
  const told = `.then(() => require('node:fs').writeFileSync(${JSON.stringify(ready)}, ''))`;
  const starter = spawn(process.execPath, ['-e', `${code}${told}; setTimeout(() => {}, 60000)`], { stdio: 'ignore' });
  const pidFile = join(own, 'mariadb.pid');
  expect(await until(() => existsSync(pidFile) && readFileSync(pidFile, 'utf8').trim() !== '')).toBe(true);
  expect(await until(() => existsSync(ready))).toBe(true);
  const pid = Number(readFileSync(pidFile, 'utf8'));
  expect(existsSync(`/proc/${pid}`)).toBe(true);
  starter.kill('SIGKILL');
  expect(await until(() => !existsSync(`/proc/${pid}`))).toBe(true);
}, 120_000);

it('a broken data folder is told in one line, and is not touched', async () => {
  const broken = join(folder, 'broken');
  mkdirSync(join(broken, 'data/mysql'), { recursive: true });
  writeFileSync(join(broken, 'data/ibdata1'), 'nothing that a database could read');
  const started = startMariadb({ folder: broken, port: await freePort(), password: 'x', databases: 'rowcall' });
  await expect(started).rejects.toThrow(/^MariaDB cannot use .*broken \(move it away to start afresh\): \S[^\n]*$/);
  expect(readFileSync(join(broken, 'data/ibdata1'), 'utf8')).toBe('nothing that a database could read');
});
