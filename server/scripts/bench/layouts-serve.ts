import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import express, { type Express } from 'express';
import { createPool } from 'mariadb';
import { buildApp } from '@/server/app';
import { readConfig } from '@/server/config';
import { createLogger } from '@/server/http/log';
import { openDatabase } from '@/server/models';
import { migrate } from '@/server/models/migrate';
import { seedAccounts } from '@/server/seeders/accounts';
import { seedLayouts } from '@/server/seeders/layouts';

/** The two addresses that are compared. */
export interface Served {
  readonly layout: string;
  readonly bare: string;
}

const listen = async (app: Express): Promise<string> => {
  const server = createServer(app);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
};

/** The least that a route with one row of the database can be: Express and the connector, nothing between. */
const bareApp = (url: string, connectionLimit: number): Express => {
  const { hostname, port, username, password, pathname } = new URL(url);
  const connections = createPool({
    host: hostname,
    port: Number(port),
    user: username,
    password,
    database: pathname.slice(1),
    connectionLimit,
  });
  const app = express();
  app.get('/:id', async (req, res) => {
    const sql = 'SELECT id, slug, published_version_id FROM layouts WHERE id = ?';
    const [row] = await connections.query<unknown[]>(sql, [req.params.id]);
    res.json(row);
  });
  return app;
};

const serve = async (): Promise<void> => {
  const config = readConfig(process.env);
  const { url, pool } = config.database;
  const platform = { config, db: openDatabase({ url, pool }), logger: createLogger(config), now: () => new Date() };
  await migrate(platform.db);
  await seedAccounts(platform, 'only for this measurement');
  await seedLayouts(platform);
  const layout = await platform.db.Layout.findOne({ where: { listed: true }, order: [['slug', 'ASC']] });
  if (!layout) throw new Error('the demo boards are missing');
  const served: Served = {
    layout: `${await listen(buildApp(platform))}/api/v1/layouts/${layout.slug}`,
    bare: `${await listen(bareApp(url, pool))}/${layout.id}`,
  };
  process.send?.(served);
};

void serve();
