import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument, type LayoutDocument } from '@/shared';
import type { LayoutCard, ReviewDetail, VersionRow } from '@/shared/api/layouts';

/** The document of a demo board; a RangeError where there is none of that name. */
export function demoDocument(slug: string): LayoutDocument {
  const found = demoBoards.find((one) => one.slug === slug);
  if (!found) throw new RangeError(`There is no demo board ${slug}.`);
  return layoutDocument.parse(found.document);
}

/** A board as the server's list tells it. */
export function cardOf(slug: string, over: Partial<LayoutCard> = {}): LayoutCard {
  const { board, memory, sockets } = demoDocument(slug);
  return {
    slug,
    maker: board.maker,
    name: board.name,
    revision: board.revision,
    kind: board.kind,
    year: board.year ?? null,
    families: [...new Set(sockets.map(({ family }) => family))],
    dataBits: memory.dataBits,
    banks: memory.banks.length,
    sockets: sockets.length,
    number: 1,
    publishedAt: '2026-01-05T10:00:00.000Z',
    ...over,
  };
}

/** A published board as the server gives it. */
export const publishedOf = (slug: string, document = demoDocument(slug)) => ({
  status: 200,
  body: { slug, number: 1, publishedAt: '2026-01-05T10:00:00.000Z', document },
});

/** A version as a list tells it. */
export function buildVersion(slug: string, over: Partial<VersionRow> = {}): VersionRow {
  const { maker, name, revision } = demoDocument(slug).board;
  return {
    id: '7d0c9f1e-2f5b-4b57-9d55-1f0a3e8f2b11',
    slug,
    maker,
    name,
    revision,
    number: 2,
    state: 'submitted',
    current: false,
    author: { id: 'a', name: 'Ivo Marschak' },
    moderator: null,
    remarks: null,
    problems: 0,
    checksum: 'x',
    change: 4,
    submittedAt: '2026-02-01T10:00:00.000Z',
    decidedAt: null,
    ...over,
  };
}

/** A version as a moderator opens it. */
export const buildReview = (slug: string, over: Partial<ReviewDetail> = {}): ReviewDetail => ({
  ...buildVersion(slug),
  own: false,
  publishedNumber: 1,
  document: demoDocument(slug),
  problemList: [],
  ...over,
});
