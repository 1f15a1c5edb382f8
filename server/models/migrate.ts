import { QueryTypes, type QueryInterface } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import type { Database } from '.';
import { migrations } from '@/server/migrations';

/** A step of the schema. Steps are applied in the order of their names and never changed once released. */
export interface Migration {
  readonly name: string;
  readonly up: (query: QueryInterface) => Promise<void>;
  readonly down: (query: QueryInterface) => Promise<void>;
}

/** Seconds that a process waits for another one that is migrating. */
const patience = 120;

/** Brings the schema up to date; of several processes that start at once, one does it and the others wait. */
export const migrate = async (db: Database): Promise<void> => {
  const umzug = new Umzug({
    migrations: migrations.map(({ name, up, down }) => ({
      name,
      up: ({ context }: { context: QueryInterface }) => up(context),
      down: ({ context }: { context: QueryInterface }) => down(context),
    })),
    context: db.sequelize.getQueryInterface(),
    storage: new SequelizeStorage({ sequelize: db.sequelize, tableName: 'schema_steps' }),
    logger: undefined,
  });
  // A transaction keeps one connection for the lock; the steps run on others.
  await db.sequelize.transaction(async (transaction) => {
    const [row] = await db.sequelize.query<{ got: number }>(
      "SELECT GET_LOCK(CONCAT(DATABASE(), '-schema'), :patience) AS got",
      { type: QueryTypes.SELECT, replacements: { patience }, transaction },
    );
    if (row?.got !== 1) throw new Error('Another process has been changing the schema for too long.');
    try {
      await umzug.up();
    } finally {
      await db.sequelize.query("DO RELEASE_LOCK(CONCAT(DATABASE(), '-schema'))", { transaction });
    }
  });
};
