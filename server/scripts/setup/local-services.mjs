import { join } from 'node:path';
import { ensureDebianPackage } from './debian.mjs';
import { keptPorts, keptSecrets } from './folder.mjs';
import { hasMariadb, startMariadb } from './mariadb.mjs';
import { localStore, startObjectStore } from '../fakes/object-store.mjs';
import { startMailCatcher } from '../fakes/mail-catcher.mjs';

/** MariaDB from Debian. */
export const ensureMariadb = () =>
  ensureDebianPackage({ name: 'mariadb-server', present: hasMariadb, purpose: 'the database' });

/** Known to everybody who reads this: demo accounts exist on loopback in development only. */
const demoPassword = 'roll call at the bench';

/** People of the demo whose sign-in is printed. */
export const demoAccounts = ['technician', 'contributor', 'moderator', 'owner'].map(
  (role) => `${role}@rowcall.example`,
);

/**
 * Starts the database, the mail catcher and the object store of a development machine, all on loopback with their
 * data in `folder`, and returns the environment for the server. The variables of `set` win.
 */
export const startLocalServices = async ({ folder, port, stops, set }) => {
  const secrets = keptSecrets(folder);
  const ports = await keptPorts(folder);
  const database = await startMariadb({
    folder: join(folder, 'database'),
    port: ports.database,
    password: secrets.database,
    databases: 'rowcall',
  });
  stops.add(database.stop);
  const caught = join(folder, 'mail');
  stops.add((await startMailCatcher({ port: ports.mail, folder: caught })).stop);
  stops.add((await startObjectStore({ port: ports.store, folder: join(folder, 'store') })).stop);
  const env = {
    NODE_ENV: 'development',
    HOST: '127.0.0.1',
    PORT: String(port),
    PUBLIC_URL: `http://localhost:${port}`,
    DATABASE_URL: `${database.url}/rowcall`,
    TOKEN_SECRET: secrets.token,
    SMTP_URL: `smtp://127.0.0.1:${ports.mail}`,
    MAIL_FROM: 'Rowcall <post@rowcall.example>',
    MAIL_FOLDER: caught,
    S3_ENDPOINT: `http://127.0.0.1:${ports.store}`,
    S3_BUCKET: localStore.bucket,
    S3_ACCESS_KEY: localStore.accessKey,
    S3_SECRET_KEY: localStore.secretKey,
    OWNER_EMAIL: 'owner@rowcall.example',
    OWNER_NAME: 'Maren Oddsdal',
    OWNER_PASSWORD: demoPassword,
    DEMO_DATA: '1',
    DEMO_PASSWORD: demoPassword,
    LOG_LEVEL: 'warn',
    AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true',
    ...set,
  };
  return { env, database };
};
