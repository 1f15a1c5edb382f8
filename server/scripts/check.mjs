import { spawn } from 'node:child_process';
import { ensurePackages } from './setup/packages.mjs';
import { giveUp, say } from './setup/say.mjs';
import { stopList } from './setup/stopping.mjs';

/** What is checked, with what; all of it is run even if one finds something. */
const checks = [
  { name: 'types', args: ['node_modules/typescript/bin/tsc', '--noEmit'] },
  {
    name: 'lint',
    args: ['node_modules/eslint/bin/eslint.js', '.', '--cache', '--cache-location', 'node_modules/.cache/eslint/'],
  },
  {
    name: 'form',
    args: ['node_modules/prettier/bin/prettier.cjs', '--check', '--log-level=warn', '**/*.{ts,tsx,js,mjs,cjs}'],
  },
  { name: 'unused code and cycles', args: ['node_modules/knip/bin/knip.js'] },
];

const runCheck = (args, stops) =>
  new Promise((resolve) => {
    const child = spawn(process.execPath, args, { stdio: 'inherit' });
    stops.add(() => child.kill('SIGTERM'));
    child.once('exit', (code) => resolve(code === 0));
  });

try {
  const stops = stopList();
  await ensurePackages();
  const failed = [];
  for (const { name, args } of checks) {
    if (!(await runCheck(args, stops))) failed.push(name);
  }
  say(failed.length ? `Check: failed in ${failed.join(', ')}.` : 'Check: all is well.');
  process.exit(failed.length ? 1 : 0);
} catch (error) {
  giveUp(error);
}
