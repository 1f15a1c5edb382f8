import { Op, type Transaction } from 'sequelize';
import { z } from 'zod';
import { recordAct } from './audit';
import { readCursor, toPage } from './cursor';
import { catalogueFields, putIntoLibrary, takeOutOfLibrary } from './layout-catalogue';
import { requireSoundLayout } from './layout-check';
import { withoutDocument, withPeople, type VersionOf } from './layout-versions';
import { queueMail } from './outbox';
import type { Context } from '@/server/context';
import { AppError } from '@/server/errors';
import { decisionMail } from '@/server/mail/layout-messages';
import type { Layout } from '@/server/models/layout';
import type { LayoutVersion } from '@/server/models/layout-version';
import { inTransaction } from '@/server/models/transaction';
import { mayDecide, mayReview } from '@/server/policies/layouts';
import type { PageQuery } from '@/shared/api/page';
import type { VersionState } from '@/shared/api/layouts';

const cursorValues = z.tuple([z.iso.datetime(), z.uuid()]);

/** The versions that wait for a moderator, the longest waiting first. */
export const listReviews = async (
  context: Context,
  { limit, cursor }: PageQuery,
): Promise<{ rows: readonly VersionOf[]; nextCursor: string | null }> => {
  mayReview(context);
  const versions = await context.db.LayoutVersion.findAll({
    where: { state: 'submitted', ...(cursor === undefined ? {} : after(cursor)) },
    attributes: withoutDocument,
    order: [
      ['submittedAt', 'ASC'],
      ['id', 'ASC'],
    ],
    limit: limit + 1,
  });
  const { rows, nextCursor } = toPage(versions, limit, ({ submittedAt, id }) => [submittedAt?.toISOString() ?? '', id]);
  return { rows: await withPeople(context, rows), nextCursor };
};

const after = (cursor: string) => {
  const [at, id] = readCursor(cursor, cursorValues);
  const submittedAt = new Date(at);
  return { [Op.or]: [{ submittedAt: { [Op.gt]: submittedAt } }, { submittedAt, id: { [Op.gt]: id } }] };
};

/** One version, in whatever state, as a moderator sees it; throws `not-found`. */
export const loadReview = async (context: Context, id: string): Promise<VersionOf> => {
  mayReview(context);
  const version = await context.db.LayoutVersion.findByPk(id);
  const [row] = version ? await withPeople(context, [version]) : [];
  if (!row) throw new AppError('not-found', { message: 'There is no such version.' });
  return row;
};

interface Act {
  readonly id: string;
  /** The change of the version that the moderator has seen. */
  readonly change: number;
  /** No mail to the author: for demo data. */
  readonly quiet?: boolean;
}

/**
 * Publishes a submitted version: the board is in the library and in the look-up with the same transaction, and the
 * version that was published before gives way. Throws `own-version`, `version-conflict`, `conflict`.
 */
export const publishVersion = (context: Context, act: Act): Promise<VersionOf> =>
  decide(
    context,
    { ...act, from: 'submitted', to: 'published', remarks: null },
    async ({ layout, version }, transaction) => {
      const { document } = requireSoundLayout(JSON.parse(version.document));
      const before = layout.publishedNumber;
      await layout.update(
        {
          ...catalogueFields(document),
          listed: true,
          publishedVersionId: version.id,
          publishedNumber: version.number,
          publishedAt: version.decidedAt,
        },
        { transaction },
      );
      await putIntoLibrary(context, { layout, document }, transaction);
      return { before };
    },
  );

/** Gives a submitted version back to its author with words. Throws as publishVersion does. */
export const returnVersion = (context: Context, act: Act & { remarks: string }): Promise<VersionOf> =>
  decide(context, { ...act, from: 'submitted', to: 'returned' });

/** Turns a submitted version down for good, with words. Throws as publishVersion does. */
export const rejectVersion = (context: Context, act: Act & { remarks: string }): Promise<VersionOf> =>
  decide(context, { ...act, from: 'submitted', to: 'rejected' });

/**
 * Withdraws a published version, with words. If it is the one that the look-up shows, the board leaves the library
 * until another version is published: an older one was given up for a reason. Throws as publishVersion does.
 */
export const retireVersion = async (
  context: Context,
  { slug, number, ...act }: { slug: string; number: number; change: number; remarks: string },
): Promise<VersionOf> => {
  mayReview(context);
  const layout = await context.db.Layout.findOne({ where: { slug } });
  const version = layout && (await context.db.LayoutVersion.findOne({ where: { layoutId: layout.id, number } }));
  if (!version) throw new AppError('not-found', { message: 'There is no such version.' });
  return decide(context, { ...act, id: version.id, from: 'published', to: 'retired' }, takeBack(context));
};

const takeBack =
  (context: Context) =>
  async ({ layout, version }: Pair, transaction: Transaction) => {
    if (layout.publishedVersionId !== version.id) return { wasCurrent: false };
    const nothing = { listed: false, publishedVersionId: null, publishedNumber: null, publishedAt: null };
    await layout.update(nothing, { transaction });
    await takeOutOfLibrary(context, layout, transaction);
    return { wasCurrent: true };
  };

interface Pair {
  readonly layout: Layout;
  readonly version: LayoutVersion;
}

interface Decision extends Act {
  readonly from: VersionState;
  readonly to: Extract<VersionState, 'published' | 'returned' | 'rejected' | 'retired'>;
  readonly remarks: string | null;
}

/** One act of a moderator: the new state, what follows from it, the audit trail and the mail, all or nothing. */
const decide = (
  context: Context,
  decision: Decision,
  follow?: (pair: Pair, transaction: Transaction) => Promise<Record<string, unknown>>,
): Promise<VersionOf> =>
  inTransaction(context.db, async (transaction) => {
    const { from, to, remarks, change } = decision;
    mayReview(context);
    const pair = await lockPair(context, decision.id, transaction);
    const { layout, version } = pair;
    const moderator = mayDecide(context, version);
    if (version.change !== change) throw new AppError('version-conflict');
    if (version.state !== from) throw new AppError('conflict', { message: `This version is ${version.state}.` });
    await version.update(
      { state: to, moderatorId: moderator.userId, remarks, decidedAt: context.now(), change: change + 1 },
      { transaction },
    );
    const detail = { slug: layout.slug, number: version.number, remarks, ...(await follow?.(pair, transaction)) };
    const subject = { kind: 'layout-version', id: version.id };
    await recordAct(context, { act: `layout-${to}`, subject, detail }, transaction);
    if (!decision.quiet) await tellAuthor(context, { ...pair, to }, transaction);
    return withPair(context, pair, transaction);
  });

/** Locks the board first and then the version, in the order in which an import does. */
const lockPair = async ({ db }: Context, id: string, transaction: Transaction): Promise<Pair> => {
  const found = await db.LayoutVersion.findByPk(id, { attributes: ['layoutId'], transaction });
  const layout = found && (await db.Layout.findByPk(found.layoutId, { lock: true, transaction }));
  const version = layout && (await db.LayoutVersion.findByPk(id, { lock: true, transaction }));
  if (!version) throw new AppError('not-found', { message: 'There is no such version.' });
  return { layout, version };
};

const tellAuthor = async (
  context: Context,
  { layout, version, to }: Pair & { to: Decision['to'] },
  transaction: Transaction,
): Promise<void> => {
  const author = version.authorId && (await context.db.User.findByPk(version.authorId, { transaction }));
  if (!author) return;
  const { slug, maker, name, revision } = layout;
  const board = `${maker} ${name}, revision ${revision}`;
  const { number, remarks } = version;
  await queueMail(
    context,
    decisionMail(context.config, author, { board, slug, number, remarks, decision: to }),
    transaction,
  );
};

const withPair = async ({ db }: Context, { layout, version }: Pair, transaction: Transaction): Promise<VersionOf> => {
  const load = async (id: string | null) => (id && (await db.User.findByPk(id, { transaction }))) || undefined;
  return { layout, version, author: await load(version.authorId), moderator: await load(version.moderatorId) };
};
