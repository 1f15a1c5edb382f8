import { spawnSync } from 'node:child_process';
import { startNode, whenReady } from './setup/children.mjs';
import { portOf, setUpDevelopment } from './setup/development.mjs';
import { ensurePackages } from './setup/packages.mjs';
import { GiveUp, say } from './setup/say.mjs';
import { untilStopped } from './setup/stopping.mjs';
import { ensureWebExport } from './setup/web-export.mjs';

/** Runs until the server ends or everything is stopped. */
const runServer = async ({ env, stops, welcome }) => {
  const server = startNode(['--import', 'tsx', 'server/index.ts'], { env });
  stops.add(server.stop);
  if (await whenReady(server)) say(welcome);
  else throw new GiveUp('the server did not start; the reason is above.');
  await server.ended;
  throw new GiveUp('the server has ended by itself.');
};

const production = async (stops) => {
  await ensurePackages();
  const check = spawnSync(process.execPath, ['--import', 'tsx', 'server/scripts/check-config.ts'], {
    stdio: 'inherit',
  });
  if (check.status !== 0) throw new GiveUp('nothing was started.');
  await ensureWebExport();
  await runServer({ env: process.env, stops, welcome: `Rowcall serves ${process.env.PUBLIC_URL}` });
};

const development = async (stops) => {
  const port = portOf('PORT', 3000);
  const address = `http://localhost:${port}`;
  const { env, databaseLost, welcome } = await setUpDevelopment({ ports: { PORT: port }, address, built: true, stops });
  await Promise.race([runServer({ env, stops, welcome }), databaseLost]);
};

await untilStopped(process.env.NODE_ENV === 'production' ? production : development);
