import type { Transaction } from 'sequelize';
import { foundByWords, sortKeyOf } from './layout-names';
import type { Platform } from '@/server/context';
import type { Layout } from '@/server/models/layout';
import type { LayoutDocument } from '@/shared';

/** What the library shows and sorts of a board, taken from its document. */
export const catalogueFields = ({ board, memory, sockets }: LayoutDocument) => ({
  maker: board.maker,
  name: board.name,
  revision: board.revision,
  sortKey: sortKeyOf(board),
  kind: board.kind,
  year: board.year ?? null,
  dataBits: memory.dataBits,
  bankCount: memory.banks.length,
  socketCount: sockets.length,
  families: [...new Set(sockets.map(({ family }) => family))].sort(),
});

/** Puts a board into the library as its document describes it, in place of what was there. */
export const putIntoLibrary = async (
  { db }: Platform,
  { layout, document }: { layout: Layout; document: LayoutDocument },
  transaction: Transaction,
): Promise<void> => {
  await takeOutOfLibrary({ db }, layout, transaction);
  const { maker, name, revision, marks } = document.board;
  const words = foundByWords([maker, name, revision, ...marks]);
  const { families } = catalogueFields(document);
  const layoutId = layout.id;
  await db.LayoutWord.bulkCreate(
    words.map((word) => ({ word, layoutId })),
    { transaction },
  );
  await db.LayoutFamily.bulkCreate(
    families.map((family) => ({ family, layoutId })),
    { transaction },
  );
};

/** Takes the words and families of a board out of the search. */
export const takeOutOfLibrary = async (
  { db }: Pick<Platform, 'db'>,
  { id }: Layout,
  transaction: Transaction,
): Promise<void> => {
  await db.LayoutWord.destroy({ where: { layoutId: id }, transaction });
  await db.LayoutFamily.destroy({ where: { layoutId: id }, transaction });
};
