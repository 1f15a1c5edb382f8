import { Op, type Transaction } from 'sequelize';
import { z } from 'zod';
import { readCursor, toPage } from './cursor';
import type { Context, Platform } from '@/server/context';
import { AppError } from '@/server/errors';
import type { Layout } from '@/server/models/layout';
import type { LayoutVersion } from '@/server/models/layout-version';
import type { User } from '@/server/models/user';
import { maySendLayouts, presentWho, seesVersion } from '@/server/policies/layouts';
import type { OwnVersionsQuery } from '@/shared/api/layouts';

/** A version with its board and its people. */
export interface VersionOf {
  readonly version: LayoutVersion;
  readonly layout: Layout;
  /** Undefined when the account is gone. */
  readonly author: User | undefined;
  readonly moderator: User | undefined;
}

/** What a list leaves out: documents are large. */
export const withoutDocument = { exclude: ['document'] };

/** Most versions that the list of one board shows. */
const mostShown = 200;

const cursorValues = z.tuple([z.iso.datetime(), z.uuid()]);

/** The versions of a board that whoever asks may see, the newest first; throws `not-found` if there is none. */
export const listVersions = async (context: Context, slug: string): Promise<readonly VersionOf[]> => {
  const who = await presentWho(context);
  const layout = await findLayout(context, slug);
  const versions = await context.db.LayoutVersion.findAll({
    where: { layoutId: layout.id },
    attributes: withoutDocument,
    order: [['number', 'DESC']],
    limit: mostShown,
  });
  const seen = versions.filter((version) => seesVersion(who, version));
  if (!seen.length) throw new AppError('not-found', { message: 'There is no such board.' });
  return withPeople(context, seen);
};

/** One version with its document; throws `not-found` also for one that whoever asks may not see. */
export const loadVersion = async (
  context: Context,
  { slug, number }: { slug: string; number: number },
): Promise<VersionOf> => {
  const who = await presentWho(context);
  const layout = await findLayout(context, slug);
  const version = await context.db.LayoutVersion.findOne({ where: { layoutId: layout.id, number } });
  if (!version || !seesVersion(who, version)) throw new AppError('not-found', { message: 'There is no such version.' });
  const [row] = await withPeople(context, [version]);
  if (!row) throw new RangeError(`the board of version ${version.id} is missing`);
  return row;
};

const findLayout = async ({ db }: Platform, slug: string): Promise<Layout> => {
  const layout = await db.Layout.findOne({ where: { slug } });
  if (!layout) throw new AppError('not-found', { message: 'There is no such board.' });
  return layout;
};

/** What whoever asks has sent, the last change first. */
export const listOwnVersions = async (
  context: Context,
  { limit, cursor, state }: OwnVersionsQuery,
): Promise<{ rows: readonly VersionOf[]; nextCursor: string | null }> => {
  const { userId } = maySendLayouts(context);
  const versions = await context.db.LayoutVersion.findAll({
    where: { authorId: userId, ...(state ? { state } : {}), ...(cursor === undefined ? {} : before(cursor)) },
    attributes: withoutDocument,
    order: [
      ['updatedAt', 'DESC'],
      ['id', 'DESC'],
    ],
    limit: limit + 1,
  });
  const { rows, nextCursor } = toPage(versions, limit, ({ updatedAt, id }) => [updatedAt.toISOString(), id]);
  return { rows: await withPeople(context, rows), nextCursor };
};

const before = (cursor: string) => {
  const [at, id] = readCursor(cursor, cursorValues);
  const updatedAt = new Date(at);
  return { [Op.or]: [{ updatedAt: { [Op.lt]: updatedAt } }, { updatedAt, id: { [Op.lt]: id } }] };
};

/** Adds boards and people to versions, in three queries however many they are. */
export const withPeople = async (
  { db }: Platform,
  versions: readonly LayoutVersion[],
  transaction?: Transaction,
): Promise<VersionOf[]> => {
  const userIds = versions.flatMap(({ authorId, moderatorId }) => [authorId, moderatorId]).filter((id) => id !== null);
  const layoutIds = versions.map(({ layoutId }) => layoutId);
  const layouts = await db.Layout.findAll({ where: { id: unique(layoutIds) }, transaction });
  const users = await db.User.findAll({ where: { id: unique(userIds) }, transaction });
  const layoutOf = new Map(layouts.map((layout) => [layout.id, layout]));
  const userOf = new Map<string | null, User>(users.map((user) => [user.id, user]));
  return versions.flatMap((version) => {
    const layout = layoutOf.get(version.layoutId);
    if (!layout) return [];
    return [{ version, layout, author: userOf.get(version.authorId), moderator: userOf.get(version.moderatorId) }];
  });
};

const unique = (ids: readonly string[]): string[] => [...new Set(ids)];
