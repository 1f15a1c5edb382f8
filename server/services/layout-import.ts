import { createHash } from 'node:crypto';
import { Op, UniqueConstraintError, type Transaction } from 'sequelize';
import { spendAttempts } from './attempts';
import { catalogueFields } from './layout-catalogue';
import { requireSoundLayout } from './layout-check';
import { boardKeyOf, slugOf } from './layout-names';
import { withPeople, type VersionOf } from './layout-versions';
import type { Context } from '@/server/context';
import { AppError } from '@/server/errors';
import type { Layout } from '@/server/models/layout';
import { inTransaction } from '@/server/models/transaction';
import { mayChangeVersion, maySendLayouts } from '@/server/policies/layouts';
import type { LayoutDocument } from '@/shared';
import type { LayoutProblem } from '@/shared/layout/problem';

interface Imported extends VersionOf {
  readonly warnings: readonly LayoutProblem[];
}

interface Sent {
  readonly document: LayoutDocument;
  readonly warnings: readonly LayoutProblem[];
  /** The document as it is stored. */
  readonly text: string;
  readonly checksum: string;
}

const readSent = (sent: unknown): Sent => {
  const sound = requireSoundLayout(sent);
  const text = JSON.stringify(sound.document);
  return { ...sound, text, checksum: createHash('sha256').update(text).digest('hex') };
};

/**
 * Takes a layout document in as a submitted version: of the board with that maker, name and revision, or of a new
 * board. Throws `layout-invalid` with all problems if it has an error, `conflict` if the very same document waits,
 * was rejected or is published already. `slug` is the address of a new board; without it one is made of its name.
 */
export const importLayout = async (
  context: Context,
  { document, slug }: { document: unknown; slug?: string },
): Promise<Imported> => {
  const { userId } = maySendLayouts(context);
  await spendAttempts(context, [{ kind: 'layout-import', subject: userId }]);
  const sent = readSent(document);
  const store = () => storeVersion(context, { sent, slug, authorId: userId });
  try {
    return await store();
  } catch (error) {
    // Two imports of a new board at the same moment: the second one finds the first.
    if (!(error instanceof UniqueConstraintError)) throw error;
    return store();
  }
};

const storeVersion = (
  context: Context,
  { sent, slug, authorId }: { sent: Sent; slug: string | undefined; authorId: string },
): Promise<Imported> =>
  inTransaction(context.db, async (transaction) => {
    const { db, now } = context;
    const layout = await findOrMakeLayout(context, { document: sent.document, slug }, transaction);
    await refuseSame(context, { layout, checksum: sent.checksum }, transaction);
    const number = layout.lastNumber + 1;
    await layout.update({ lastNumber: number }, { transaction });
    const version = await db.LayoutVersion.create(
      { layoutId: layout.id, number, state: 'submitted', authorId, ...stored(sent), submittedAt: now(), ...undecided },
      { transaction },
    );
    const author = (await db.User.findByPk(authorId, { transaction })) ?? undefined;
    return { version, layout, author, moderator: undefined, warnings: sent.warnings };
  });

const undecided = { moderatorId: null, remarks: null, decidedAt: null };

const stored = ({ text, checksum, warnings }: Sent) => ({
  document: text,
  checksum,
  problemCount: Math.min(warnings.length, 65_535),
});

const findOrMakeLayout = async (
  { db }: Context,
  { document, slug: wished }: { document: LayoutDocument; slug: string | undefined },
  transaction: Transaction,
): Promise<Layout> => {
  const boardKey = boardKeyOf(document.board);
  const known = await db.Layout.findOne({ where: { boardKey }, lock: true, transaction });
  if (known) return known;
  if (wished !== undefined) {
    return db.Layout.create({ slug: wished, boardKey, ...catalogueFields(document) }, { transaction });
  }
  const start = slugOf(document.board, new Set());
  const alike = await db.Layout.findAll({
    where: { slug: { [Op.startsWith]: start } },
    attributes: ['slug'],
    transaction,
  });
  const slug = slugOf(document.board, new Set(alike.map((layout) => layout.slug)));
  return db.Layout.create({ slug, boardKey, ...catalogueFields(document) }, { transaction });
};

const refuseSame = async (
  { db }: Context,
  { layout, checksum }: { layout: Layout; checksum: string },
  transaction: Transaction,
): Promise<void> => {
  const same = await db.LayoutVersion.findOne({
    where: {
      layoutId: layout.id,
      checksum,
      [Op.or]: [{ state: ['submitted', 'returned', 'rejected'] }, { id: layout.publishedVersionId ?? '' }],
    },
    attributes: ['number', 'state'],
    transaction,
  });
  if (!same) return;
  throw new AppError('conflict', { message: `This very document is version ${same.number}, which is ${same.state}.` });
};

/**
 * Replaces the document of a version of one's own that was returned or still waits, and submits it again. Throws
 * `version-conflict` if it was changed or decided in the meantime, `conflict` if the document is of another board.
 */
export const resubmitVersion = async (
  context: Context,
  { slug, number, change, document }: { slug: string; number: number; change: number; document: unknown },
): Promise<Imported> => {
  maySendLayouts(context);
  const sent = readSent(document);
  return inTransaction(context.db, async (transaction) => {
    const { db, now } = context;
    const layout = await db.Layout.findOne({ where: { slug }, lock: true, transaction });
    const version =
      layout && (await db.LayoutVersion.findOne({ where: { layoutId: layout.id, number }, lock: true, transaction }));
    if (!version) throw new AppError('not-found', { message: 'There is no such version.' });
    mayChangeVersion(context, version);
    if (version.change !== change) throw new AppError('version-conflict');
    if (boardKeyOf(sent.document.board) !== layout.boardKey) {
      throw new AppError('conflict', {
        message: 'Maker, name or revision are those of another board. Send it as a new layout.',
      });
    }
    await version.update(
      { ...stored(sent), state: 'submitted', submittedAt: now(), change: change + 1 },
      { transaction },
    );
    const [row] = await withPeople(context, [version], transaction);
    if (!row) throw new RangeError(`the board of version ${version.id} is missing`);
    return { ...row, layout, warnings: sent.warnings };
  });
};
