import express from 'express';
// eslint-disable-next-line no-restricted-imports -- a route with a SELECT in it is the very thing to compare with
import { QueryTypes } from 'sequelize';
import { openDatabase } from '@/server/models';

/** What the route of a board is measured against: Express, one SELECT by primary key on the same pool, and nothing else. */
const { sequelize, Layout } = openDatabase({ url: process.env.DATABASE_URL ?? '', pool: 16 });
const app = express();
app.get('/rows/:id', async (req, res) => {
  const sql = `SELECT * FROM layouts WHERE id = ${sequelize.escape(req.params.id)}`;
  const [row] = await sequelize.query(sql, { type: QueryTypes.SELECT });
  res.json(row);
});

const start = async (): Promise<void> => {
  const row = await Layout.findOne({ where: { slug: process.env.BENCH_SLUG } });
  if (row === null) throw new RangeError('The board of the measurement is missing.');
  const server = app.listen(Number(process.env.PORT), '127.0.0.1', () => process.send?.({ ready: true, id: row.id }));
  for (const signal of ['SIGTERM', 'disconnect']) {
    process.once(signal, () => {
      server.closeAllConnections();
      server.close(() => void sequelize.close());
    });
  }
};

void start();
