import { QueryTypes } from 'sequelize';
import { freshDatabase } from '../support/database';
import { inTransaction } from '@/server/models/transaction';

let database: Awaited<ReturnType<typeof freshDatabase>>;

beforeAll(async () => {
  database = await freshDatabase();
  await database.db.sequelize.query('CREATE TABLE pairs (id INT PRIMARY KEY, n INT NOT NULL)');
  await database.db.sequelize.query('INSERT INTO pairs VALUES (1, 0), (2, 0)');
});
afterAll(() => database.drop());

it('work that the database gave up in a deadlock is done again', async () => {
  const { db } = database;
  let runs = 0;
  const meet = { waiting: 0, go: () => {} };
  const met = new Promise<void>((resolve) => {
    meet.go = resolve;
  });
  const cross = (first: number, second: number) =>
    inTransaction(db, async (transaction) => {
      runs++;
      await db.sequelize.query('UPDATE pairs SET n = n + 1 WHERE id = ?', { replacements: [first], transaction });
      if (++meet.waiting === 2) meet.go();
      await met;
      await db.sequelize.query('UPDATE pairs SET n = n + 1 WHERE id = ?', { replacements: [second], transaction });
    });
  await Promise.all([cross(1, 2), cross(2, 1)]);
  const rows = await db.sequelize.query<{ n: number }>('SELECT n FROM pairs', { type: QueryTypes.SELECT });
  expect(rows.map((row) => row.n)).toEqual([2, 2]);
  expect(runs).toBeGreaterThan(2);
});

it('work that failed for another reason is not done again', async () => {
  let runs = 0;
  const work = inTransaction(database.db, async () => {
    runs++;
    throw new Error('no');
  });
  await expect(work).rejects.toThrow('no');
  expect(runs).toBe(1);
});

it('every table has a primary key, so that several database nodes can serve it', async () => {
  const tables = await database.db.sequelize.query<{ name: string }>(
    `SELECT t.table_name AS name FROM information_schema.tables t
     LEFT JOIN information_schema.table_constraints c
       ON c.table_schema = t.table_schema AND c.table_name = t.table_name AND c.constraint_type = 'PRIMARY KEY'
     WHERE t.table_schema = DATABASE() AND c.constraint_name IS NULL`,
    { type: QueryTypes.SELECT },
  );
  expect(tables).toEqual([]);
});
