import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ensurePackages } from './setup/packages.mjs';
import { giveUp, say } from './setup/say.mjs';
import { stopList } from './setup/stopping.mjs';
import { closingLine, projectsOf } from './setup/test-run.mjs';
import { ensureWebExport } from './setup/web-export.mjs';

const prepare = async (wanted) => {
  await ensurePackages();
  const { ensureMariadb } = await import('./setup/local-services.mjs');
  const { ensureChromium, ensureKicadSymbols } = await import('./setup/debian.mjs');
  if (wanted.includes('server') || wanted.includes('browser')) await ensureMariadb();
  if (wanted.includes('published')) await ensureKicadSymbols();
  if (!wanted.includes('browser')) return;
  await ensureChromium();
  await ensureWebExport();
};

/** Runs Jest in a group of its own; stopping the run stops its workers and servers too. */
const runJest = (args, { resultFile, stops }) =>
  new Promise((resolve) => {
    const reporter = join(import.meta.dirname, 'setup/result-reporter.cjs');
    const child = spawn(
      process.execPath,
      ['node_modules/jest/bin/jest.js', ...args, '--reporters=default', `--reporters=${reporter}`],
      { stdio: 'inherit', env: { ...process.env, ROWCALL_RESULT: resultFile } },
    );
    const ended = new Promise((done) => child.once('exit', done));
    stops.add(() => {
      child.kill('SIGTERM');
      return ended;
    });
    child.once('exit', (code) => resolve(code ?? 1));
  });

const main = async () => {
  const stops = stopList();
  const args = process.argv.slice(2);
  const folder = mkdtempSync(join(tmpdir(), 'rowcall-result-'));
  const resultFile = join(folder, 'counts.json');
  try {
    await prepare(projectsOf(args));
    const code = await runJest(args, { resultFile, stops });
    if (stops.isStopping()) return;
    const told = existsSync(resultFile);
    const counts = told ? JSON.parse(readFileSync(resultFile, 'utf8')) : { passed: 0, failed: 1, skipped: 0 };
    say(closingLine(counts));
    process.exitCode = code || (counts.failed ? 1 : 0);
  } catch (error) {
    giveUp(error);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
};

await main();
