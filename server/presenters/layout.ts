import type { Context } from '@/server/context';
import type { Layout } from '@/server/models/layout';
import { readStoredDocument } from '@/server/models/layout-version';
import type { User } from '@/server/models/user';
import type { VersionOf } from '@/server/services/layout-versions';
import type {
  ImportAnswer,
  LayoutCard,
  PersonName,
  ReviewDetail,
  ReviewRow,
  VersionDetail,
  VersionRow,
} from '@/shared/api/layouts';
import type { LayoutProblem } from '@/shared/layout/problem';

/** A published board in the library. */
export const presentLayoutCard = (layout: Layout): LayoutCard => {
  const { slug, maker, name, revision, kind, year, families, dataBits, publishedNumber, publishedAt } = layout;
  if (publishedNumber === null || publishedAt === null) throw new RangeError(`${slug} is listed but not published`);
  const banks = layout.bankCount;
  const sockets = layout.socketCount;
  return {
    ...{ slug, maker, name, revision, kind, year, families, dataBits, banks, sockets },
    number: publishedNumber,
    publishedAt: publishedAt.toISOString(),
  };
};

const presentName = (user: User | undefined): PersonName | null => (user ? { id: user.id, name: user.name } : null);

/** A version without its document. */
export const presentVersionRow = ({ version, layout, author, moderator }: VersionOf): VersionRow => ({
  id: version.id,
  slug: layout.slug,
  maker: layout.maker,
  name: layout.name,
  revision: layout.revision,
  number: version.number,
  state: version.state,
  current: layout.publishedVersionId === version.id,
  author: presentName(author),
  moderator: presentName(moderator),
  remarks: version.remarks,
  problems: version.problemCount,
  checksum: version.checksum,
  change: version.change,
  submittedAt: version.submittedAt?.toISOString() ?? null,
  decidedAt: version.decidedAt?.toISOString() ?? null,
});

/** A version with its document. */
export const presentVersionDetail = (row: VersionOf): VersionDetail => ({
  ...presentVersionRow(row),
  document: readStoredDocument(row.version),
});

/** A version as the moderator who asks sees it in the queue. */
export const presentReviewRow = ({ who }: Context, row: VersionOf): ReviewRow => ({
  ...presentVersionRow(row),
  own: who.standing !== 'guest' && row.version.authorId === who.userId,
  publishedNumber: row.layout.publishedNumber,
});

/** A version as a moderator sees it, with its document and what the check says of it. */
export const presentReviewDetail = (
  context: Context,
  row: VersionOf,
  problemList: readonly LayoutProblem[],
): ReviewDetail => ({
  ...presentReviewRow(context, row),
  document: readStoredDocument(row.version),
  problemList: [...problemList],
});

/** A version that was just taken in, with the warnings of the check. */
export const presentImport = (row: VersionOf, warnings: readonly LayoutProblem[]): ImportAnswer => ({
  version: presentVersionRow(row),
  problems: [...warnings],
});
