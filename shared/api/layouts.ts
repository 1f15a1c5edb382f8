import { z } from 'zod';
import { page, pageQuery } from './page';
import { boardKinds, layoutDocument } from '@/shared/layout/document';
import { layoutProblem } from '@/shared/layout/problem';
import { words } from '@/shared/layout/primitives';
import { limits } from '@/shared/limits';

/** The address of a board: maker, name and revision in small letters, such as tarnvall-t-64-rev-b. */
export const layoutSlug = z
  .string()
  .min(1)
  .max(limits.slug)
  .regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'Small letters, digits and single dashes.');

/** Number of a version of a board, from 1. */
export const versionNumber = z.coerce.number().int().min(1).max(1_000_000);

/**
 * How far a version has come. submitted waits for a moderator; returned waits for its author; published, rejected
 * and retired are final, and the document of a published or retired one never changes.
 */
export const versionStates = ['draft', 'submitted', 'returned', 'published', 'rejected', 'retired'] as const;
export const versionState = z.enum(versionStates);
export type VersionState = z.output<typeof versionState>;

/** A person who wrote or reviewed a version, as everybody may see him. */
export const personName = z.strictObject({ id: z.uuid(), name: z.string() });
export type PersonName = z.output<typeof personName>;

const boardName = { maker: z.string(), name: z.string(), revision: z.string() };

/** One published board in the library. */
export const layoutCard = z.strictObject({
  slug: layoutSlug,
  ...boardName,
  kind: z.enum(boardKinds),
  year: z.number().int().nullable(),
  families: z.array(z.string()).describe('Ids of the chip families in its sockets.'),
  dataBits: z.number().int(),
  banks: z.number().int().describe('How many banks.'),
  sockets: z.number().int().describe('How many sockets.'),
  number: z.number().int().describe('Number of the published version.'),
  publishedAt: z.iso.datetime(),
});
export type LayoutCard = z.output<typeof layoutCard>;

/** Query of GET /layouts. Every filter that is given must fit. */
export const layoutsQuery = pageQuery.extend({
  q: z
    .string()
    .trim()
    .max(120)
    .optional()
    .describe('Each word must begin a word of maker, name, revision or marks; capitals and accents do not matter.'),
  maker: z.string().trim().max(60).optional().describe('The maker, whole; capitals do not matter.'),
  kind: z.enum(boardKinds).optional(),
  family: z.string().max(64).optional().describe('Id of a chip family that at least one socket takes.'),
  bits: z.coerce.number().int().min(1).max(limits.dataBits).optional().describe('Data bits of a word.'),
});
export type LayoutsQuery = z.output<typeof layoutsQuery>;
/** The query as a screen or a script writes it. */
export type LayoutsQueryInput = z.input<typeof layoutsQuery>;

export const layoutsPage = page(layoutCard);
export type LayoutsPage = z.output<typeof layoutsPage>;

/** Answer of GET /layout-filters: what there is to choose from among the published boards. */
export const layoutFilters = z.strictObject({
  makers: z.array(z.string()),
  kinds: z.array(z.enum(boardKinds)),
  families: z.array(z.string()),
  bits: z.array(z.number().int()),
});
export type LayoutFilters = z.output<typeof layoutFilters>;

/** Answer of GET /layouts/:slug: the published version, whole. It has a weak ETag of its content. */
export const publishedLayout = z.strictObject({
  slug: layoutSlug,
  number: z.number().int(),
  publishedAt: z.iso.datetime(),
  document: layoutDocument,
});
export type PublishedLayout = z.output<typeof publishedLayout>;

/** One version of a board without its document. */
export const versionRow = z.strictObject({
  id: z.uuid().describe('For the routes of /reviews.'),
  slug: layoutSlug,
  ...boardName,
  number: z.number().int().min(1),
  state: versionState,
  current: z.boolean().describe('True for the version that the look-up shows.'),
  author: personName.nullable().describe('Null when the account is gone.'),
  moderator: personName.nullable().describe('Who decided on it last.'),
  remarks: z.string().nullable().describe('Words of the moderator who returned, rejected or retired it.'),
  problems: z.number().int().describe('How many warnings the check gave when it was sent.'),
  checksum: z.string().describe('SHA-256 of the document as it is stored.'),
  change: z.number().int().min(1).describe('Grows with each change of the version; send it in If-Match.'),
  submittedAt: z.iso.datetime().nullable(),
  decidedAt: z.iso.datetime().nullable().describe('When it was published, returned, rejected or retired last.'),
});
export type VersionRow = z.output<typeof versionRow>;

/** Answer of GET /layouts/:slug/versions, the newest first: what was published, and for its people what waits. */
export const versionsAnswer = z.strictObject({ items: z.array(versionRow) });
export type VersionsAnswer = z.output<typeof versionsAnswer>;

/** One version with its document. */
export const versionDetail = versionRow.extend({ document: layoutDocument });
export type VersionDetail = z.output<typeof versionDetail>;

/** Query of GET /me/layout-versions: what whoever asks has sent, the last change first. */
export const ownVersionsQuery = pageQuery.extend({ state: versionState.optional() });
export type OwnVersionsQuery = z.output<typeof ownVersionsQuery>;

export const versionsPage = page(versionRow);
export type VersionsPage = z.output<typeof versionsPage>;

/**
 * A layout document as it is sent. It is read by the service, so that problems of form and of content come in one
 * list; the API's documentation shows the schema of the document.
 */
export const sentDocument = z.unknown().meta({ $ref: '#/components/schemas/LayoutDocumentInput' });

/** Answer of POST /layouts and PUT /layouts/:slug/versions/:number. */
export const importAnswer = z.strictObject({
  version: versionRow,
  problems: z.array(layoutProblem).describe('Warnings: the version was taken, but look at these again.'),
});
export type ImportAnswer = z.output<typeof importAnswer>;

/** One submitted version in the queue of moderators, the longest waiting first. */
export const reviewRow = versionRow.extend({
  own: z.boolean().describe('True when whoever asks wrote it: then another moderator must decide.'),
  publishedNumber: z
    .number()
    .int()
    .nullable()
    .describe('The version that the look-up shows now; null for a new board.'),
});
export type ReviewRow = z.output<typeof reviewRow>;

/** Query of GET /reviews. */
export const reviewsQuery = pageQuery;
export const reviewsPage = page(reviewRow);
export type ReviewsPage = z.output<typeof reviewsPage>;

/** Answer of GET /reviews/:id. */
export const reviewDetail = reviewRow.extend({ document: layoutDocument, problemList: z.array(layoutProblem) });
export type ReviewDetail = z.output<typeof reviewDetail>;

/** Body of POST /reviews/:id/return, /reviews/:id/reject and /layouts/:slug/versions/:number/retire. */
export const remarksInput = z.strictObject({
  remarks: words(2000).describe('What the author should know, in words; he gets them by mail.'),
});

/** Answer of POST /layout-checks. */
export const layoutCheck = z.strictObject({
  publishable: z.boolean().describe('True when there is no problem of severity error.'),
  problems: z.array(layoutProblem),
  more: z.number().int().min(0).describe('How many problems were found beyond the ones listed.'),
});
export type LayoutCheck = z.output<typeof layoutCheck>;
