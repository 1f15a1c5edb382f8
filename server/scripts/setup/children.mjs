import { spawn } from 'node:child_process';

/**
 * Starts a program in a group of its own, so that Ctrl-C in the terminal reaches the starter alone, which then stops
 * things in order. A Node.js program gets a channel that closes with the starter, and ends by itself then.
 *
 * @param {string[]} args Of node.
 * @param {{ env: Record<string, string | undefined>, quiet?: boolean }} options
 */
export const startNode = (args, { env, quiet = false }) => {
  const child = spawn(process.execPath, args, {
    env,
    detached: true,
    stdio: ['ignore', quiet ? 'ignore' : 'inherit', 'pipe', 'ipc'],
  });
  let complaint = '';
  child.stderr?.on('data', (chunk) => {
    complaint = `${complaint}${chunk}`.slice(-4000);
    if (!quiet) process.stderr.write(chunk);
  });
  const ended = new Promise((resolve) => child.once('exit', resolve));
  return {
    child,
    ended,
    complaint: () => complaint.trim(),
    stop: async () => {
      if (child.exitCode !== null || child.signalCode !== null) return;
      child.kill('SIGTERM');
      const late = setTimeout(() => child.kill('SIGKILL'), 10_000);
      await ended;
      clearTimeout(late);
    },
  };
};

/** Resolves when the server says that it is ready, to false if it ends before. */
export const whenReady = ({ child, ended }) =>
  Promise.race([
    new Promise((resolve) => child.on('message', (message) => message?.ready && resolve(true))),
    ended.then(() => false),
  ]);
