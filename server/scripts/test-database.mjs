import { randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { hasMariadb, startMariadb } from './setup/mariadb.mjs';
import { freePort } from './setup/ports.mjs';

/** Jest's global set-up of the server's tests: one private MariaDB a run; each test file makes its own database in it. */
export default async function setUp() {
  if (!hasMariadb()) throw new Error('MariaDB is missing. `npm test` installs it.');
  const folder = mkdtempSync(join(tmpdir(), 'rowcall-test-'));
  const password = randomBytes(12).toString('hex');
  const database = await startMariadb({
    folder,
    port: await freePort(),
    password,
    databases: 'rowcall_test_%',
    hasty: true,
  });
  process.env.ROWCALL_TEST_DATABASE = database.url;
  globalThis.rowcallTestDatabase = {
    stop: async () => {
      await database.stop();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
