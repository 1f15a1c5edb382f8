import { randomBytes } from 'node:crypto';
import { Sequelize } from 'sequelize';
import { openDatabase, type Database } from '@/server/models';
import { migrate } from '@/server/models/migrate';

/** A database of its own for a test file, with the schema up to date; `drop` removes it and closes the pool. */
export const freshDatabase = async (): Promise<{ db: Database; url: string; drop: () => Promise<void> }> => {
  const server = process.env.ROWCALL_TEST_DATABASE;
  if (!server)
    throw new Error('The server project of Jest starts the database; run its tests with --selectProjects server.');
  const name = `rowcall_test_${randomBytes(6).toString('hex')}`;
  await runOn(server, `CREATE DATABASE ${name} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`);
  const url = `${server}/${name}`;
  const db = openDatabase({ url, pool: 8 });
  await migrate(db);
  const drop = async () => {
    await db.sequelize.close();
    await runOn(server, `DROP DATABASE ${name}`);
  };
  return { db, url, drop };
};

const runOn = async (url: string, sql: string): Promise<void> => {
  const connection = new Sequelize(url, { dialect: 'mariadb', logging: false });
  await connection.query(sql);
  await connection.close();
};
