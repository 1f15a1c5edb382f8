import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ensurePackages } from './setup/packages.mjs';
import { giveUp, say } from './setup/say.mjs';
import { stopList } from './setup/stopping.mjs';
import { ensureWebExport } from './setup/web-export.mjs';

const projects = ['lib', 'shared', 'published', 'server', 'browser', 'ui'];

/** Projects that a run with these arguments may touch: those it selects, or those its paths lie in, or all. */
export const projectsOf = (args) => {
  const at = args.indexOf('--selectProjects');
  if (at >= 0) {
    const names = args.slice(at + 1);
    const end = names.findIndex((name) => name.startsWith('-'));
    return projects.filter((name) => (end < 0 ? names : names.slice(0, end)).includes(name));
  }
  const paths = args.filter((arg) => /(^|\/)tests\//.test(arg));
  return paths.length ? projects.filter((name) => paths.some((path) => path.includes(`tests/${name}`))) : projects;
};

/** The closing line of a run. */
export const closingLine = ({ passed, failed, skipped }) =>
  `Rowcall: ${passed} passed, ${failed} failed${skipped ? `, ${skipped} skipped` : ''}`;

const prepare = async (wanted) => {
  await ensurePackages();
  const { ensureMariadb } = await import('./setup/local-services.mjs');
  const { ensureChromium } = await import('./setup/debian.mjs');
  if (wanted.includes('server') || wanted.includes('browser')) await ensureMariadb();
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
