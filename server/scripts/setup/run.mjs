import { spawn } from 'node:child_process';

/** Programs that run now, each leader of its own group. */
const running = new Set();

let stopped = false;

/** Most of a program's output that is kept, in characters. */
const keptOutput = 200_000;

/**
 * Runs a program to its end and returns its exit code and output. It and what it starts are stopped by stopRunning.
 *
 * @param {string} command
 * @param {string[]} args
 * @param {{ env?: Record<string, string | undefined>, cwd?: string }} [options]
 * @returns {Promise<{ status: number | null, output: string }>}
 */
export const run = (command, args, { env = {}, cwd } = {}) =>
  new Promise((resolve) => {
    if (stopped) return resolve({ status: null, output: 'stopped' });
    const child = spawn(command, args, {
      detached: true,
      cwd,
      env: { ...process.env, ...env },
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    running.add(child);
    let output = '';
    const take = (chunk) => {
      output = `${output}${chunk}`.slice(-keptOutput);
    };
    child.stdout.on('data', take);
    child.stderr.on('data', take);
    child.once('error', (error) => {
      running.delete(child);
      resolve({ status: null, output: String(error) });
    });
    child.once('close', (status) => {
      running.delete(child);
      resolve({ status, output });
    });
  });

/** Stops every program that run started, with all that it started itself. */
export const stopRunning = () => {
  stopped = true;
  for (const child of running) {
    try {
      process.kill(-child.pid, 'SIGTERM');
    } catch {
      // It has ended in the meantime.
    }
  }
};
