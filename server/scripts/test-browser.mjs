import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startNode, whenReady } from './setup/children.mjs';
import { hasMariadb } from './setup/mariadb.mjs';
import { freePort } from './setup/ports.mjs';
import { ensureWebExport } from './setup/web-export.mjs';

/**
 * Jest's global set-up of the browser's tests: the product as `npm start` runs it, on a free port, with the demo data in
 * a folder of its own. Tests find it by ROWCALL_URL, and the password of the demo accounts by ROWCALL_DEMO_PASSWORD.
 */
export default async function setUp() {
  if (!hasMariadb()) throw new Error('MariaDB is missing. `npm test` installs it.');
  await ensureWebExport();
  const folder = mkdtempSync(join(tmpdir(), 'rowcall-browser-'));
  const { startLocalServices } = await import('./setup/local-services.mjs');
  const stops = [];
  const port = await freePort();
  // Jest's own NODE_ENV, or a database that somebody has set, must not reach the server.
  const set = { PATH: process.env.PATH, HOME: process.env.HOME };
  const { env } = await startLocalServices({ folder, port, stops: { add: (stop) => stops.push(stop) }, set });
  const server = startNode(['--import', 'tsx', 'server/index.ts'], { env });
  stops.push(server.stop);
  const stop = async () => {
    for (const step of stops.reverse()) await step();
    rmSync(folder, { recursive: true, force: true });
  };
  if (!(await whenReady(server))) {
    await stop();
    throw new Error(`The server did not start: ${server.complaint()}`);
  }
  process.env.ROWCALL_URL = `http://localhost:${port}`;
  process.env.ROWCALL_DEMO_PASSWORD = env.DEMO_PASSWORD;
  globalThis.rowcallBrowserServer = { stop };
}
