import { spawn } from 'node:child_process';
import { portOf, setUpDevelopment } from './setup/development.mjs';
import { startNode } from './setup/children.mjs';
import { GiveUp, say } from './setup/say.mjs';
import { untilStopped } from './setup/stopping.mjs';

/** Expo's server, which reloads the page; it keeps the terminal, because its keys are typed there. */
const startExpo = ({ port, apiPort, stops }) => {
  const child = spawn(process.execPath, ['node_modules/expo/bin/cli', 'start', '--web', '--port', String(port)], {
    stdio: 'inherit',
    env: {
      ...process.env,
      EXPO_OFFLINE: '1',
      EXPO_NO_TELEMETRY: '1',
      BROWSER: 'none',
      ROWCALL_API_PORT: String(apiPort),
    },
  });
  const ended = new Promise((resolve) => child.once('exit', resolve));
  stops.add(() => {
    child.kill('SIGTERM');
    return ended;
  });
  return ended;
};

const developmentWithReload = async (stops) => {
  const port = portOf('WEB_PORT', 8081);
  const apiPort = portOf('PORT', 3000);
  const ports = { WEB_PORT: port, PORT: apiPort };
  const address = `http://localhost:${port}`;
  const { env, databaseLost, welcome } = await setUpDevelopment({ ports, address, built: false, stops });
  const server = startNode(['node_modules/tsx/dist/cli.mjs', 'watch', '--clear-screen=false', 'server/index.ts'], {
    env,
  });
  stops.add(server.stop);
  say(welcome);
  const expo = startExpo({ port, apiPort, stops });
  const ended = Promise.race([server.ended, expo]).then(() => {
    throw new GiveUp('a part has ended by itself.');
  });
  await Promise.race([ended, databaseLost]);
};

await untilStopped(developmentWithReload);
