import express from 'express';
import { openDatabase } from '@/server/models';

/** What the route of a board is measured against: Express, one SELECT by primary key on the same pool, and nothing else. */
const { sequelize, Layout } = openDatabase({ url: process.env.DATABASE_URL ?? '', pool: 16 });
const app = express();
app.get('/rows/:id', async (req, res) => {
  const [rows] = await sequelize.query(`SELECT * FROM layouts WHERE id = ${sequelize.escape(req.params.id)}`);
  res.json(rows[0]);
});
const row = await Layout.findOne({ where: { slug: process.env.BENCH_SLUG } });
if (row === null) throw new RangeError('The board of the measurement is missing.');
const server = app.listen(Number(process.env.PORT), '127.0.0.1', () => process.send?.({ ready: true, id: row.id }));
for (const signal of ['SIGTERM', 'disconnect'] as const) {
  process.once(signal, () => {
    server.closeAllConnections();
    server.close(() => void sequelize.close());
  });
}
