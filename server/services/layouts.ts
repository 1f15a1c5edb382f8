import { Op, QueryTypes, type WhereOptions } from 'sequelize';
import { z } from 'zod';
import { readCursor, toPage } from './cursor';
import { askedWords } from './layout-names';
import type { Context } from '@/server/context';
import type { Database } from '@/server/models';
import type { Layout } from '@/server/models/layout';
import type { LayoutFilters, LayoutsQuery } from '@/shared/api/layouts';

const cursorValues = z.tuple([z.string(), z.string()]);

/** One page of the published boards, by maker, name and revision. */
export const listLayouts = async (
  { db }: Context,
  query: LayoutsQuery,
): Promise<{ rows: readonly Layout[]; nextCursor: string | null }> => {
  const rows = await db.Layout.findAll({
    where: { [Op.and]: conditions(db, query) },
    order: [
      ['sortKey', 'ASC'],
      ['slug', 'ASC'],
    ],
    limit: query.limit + 1,
  });
  return toPage(rows, query.limit, ({ sortKey, slug }) => [sortKey, slug]);
};

const conditions = (db: Database, { q, maker, kind, family, bits, cursor }: LayoutsQuery): WhereOptions[] => {
  const list: WhereOptions[] = [{ listed: true }];
  const within = (sql: string) => list.push({ id: { [Op.in]: db.sequelize.literal(`(${sql})`) } });
  const text = (value: string) => db.sequelize.escape(value);
  for (const word of askedWords(q ?? '')) {
    // A word has letters and digits only, so nothing in it is a wildcard.
    within(`SELECT layout_id FROM layout_words WHERE word LIKE ${text(`${word}%`)}`);
  }
  if (family) within(`SELECT layout_id FROM layout_families WHERE family = ${text(family)}`);
  if (maker) list.push({ maker });
  if (kind) list.push({ kind });
  if (bits) list.push({ dataBits: bits });
  if (cursor !== undefined) {
    const [sortKey, slug] = readCursor(cursor, cursorValues);
    list.push({ [Op.or]: [{ sortKey: { [Op.gt]: sortKey } }, { sortKey, slug: { [Op.gt]: slug } }] });
  }
  return list;
};

/** What the library can be narrowed by: every maker, kind, chip family and word width that a published board has. */
export const listLayoutFilters = async ({ db }: Context): Promise<LayoutFilters> => {
  const column = async <Value>(sql: string): Promise<Value[]> => {
    const rows = await db.sequelize.query<{ value: Value }>(sql, { type: QueryTypes.SELECT });
    return rows.map(({ value }) => value);
  };
  return {
    makers: await column('SELECT DISTINCT maker AS value FROM layouts WHERE listed = TRUE ORDER BY maker'),
    kinds: await column('SELECT DISTINCT kind AS value FROM layouts WHERE listed = TRUE ORDER BY kind'),
    families: await column('SELECT DISTINCT family AS value FROM layout_families ORDER BY family'),
    bits: await column('SELECT DISTINCT data_bits AS value FROM layouts WHERE listed = TRUE ORDER BY data_bits'),
  };
};
