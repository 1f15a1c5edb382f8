import { promisify } from 'node:util';
import { brotliCompress, constants, gzip } from 'node:zlib';
import { LRUCache } from 'lru-cache';
import { QueryTypes } from 'sequelize';
import { batchLookups } from './batched-lookup';
import type { Context, Platform } from '@/server/context';
import { AppError } from '@/server/errors';
import type { Database } from '@/server/models';

/** How the bytes of an answer are packed. */
export type Encoding = 'identity' | 'gzip' | 'br';

/** A published version as it goes out, once for each encoding that somebody asked for. */
interface Rendered {
  readonly tag: string;
  readonly bodies: Partial<Record<Encoding, Buffer>>;
}

const shrink = {
  gzip: promisify(gzip),
  br: (bytes: Buffer) => promisify(brotliCompress)(bytes, { params: { [constants.BROTLI_PARAM_QUALITY]: 6 } }),
};

/**
 * Published versions as they are sent. The database is asked each time which version is published; what a
 * published version says never changes, so its text is kept, up to 64 MB.
 */
const rendered = new LRUCache<string, Rendered>({
  maxSize: 64_000_000,
  sizeCalculation: ({ bodies }) => 1 + (bodies.identity?.length ?? 0) * 2,
});

/** The published version of a board as bytes in an encoding; throws `not-found`, or `layout-retired`. */
export const sendablePublished = async (
  context: Context,
  { slug, encoding }: { slug: string; encoding: Encoding },
): Promise<{ tag: string; body: Buffer }> => {
  const versionId = await publishedVersionId(context, slug);
  const known = rendered.get(versionId) ?? (await render(context, slug, versionId));
  const body = known.bodies[encoding] ?? (await encode(known, encoding));
  return { tag: known.tag, body };
};

/** What the table of boards says of an address; null while no version is published. */
type Pointer = string | null;

const lookups = new WeakMap<Database, (slug: string) => Promise<Pointer | undefined>>();

/** One lookup a database: the route that everybody asks must not wait for a query of its own each time. */
const lookupOf = (db: Database): ((slug: string) => Promise<Pointer | undefined>) => {
  const known = lookups.get(db);
  if (known) return known;
  const lookup = batchLookups(async (slugs) => {
    const rows = await db.sequelize.query<{ slug: string; versionId: Pointer }>(
      'SELECT slug, published_version_id AS versionId FROM layouts WHERE slug IN (:slugs)',
      { type: QueryTypes.SELECT, replacements: { slugs: [...slugs] } },
    );
    return new Map(rows.map(({ slug, versionId }) => [slug, versionId]));
  });
  lookups.set(db, lookup);
  return lookup;
};

/** The id of the version of a board that is published now; throws `not-found`, or `layout-retired`. */
export const publishedVersionId = async ({ db }: Platform, slug: string): Promise<string> => {
  const pointer = await lookupOf(db)(slug);
  if (pointer) return pointer;
  const remarks = pointer === null ? await retiredRemarks(db, slug) : undefined;
  if (remarks === undefined) throw new AppError('not-found', { message: 'There is no such board.' });
  throw new AppError('layout-retired', { message: remarks ?? undefined });
};

const retiredRemarks = async (db: Platform['db'], slug: string): Promise<string | null | undefined> => {
  const layout = await db.Layout.findOne({ where: { slug }, attributes: ['id'] });
  const version = await db.LayoutVersion.findOne({
    where: { layoutId: layout?.id ?? '', state: 'retired' },
    order: [['number', 'DESC']],
    attributes: ['remarks'],
  });
  return version === null ? undefined : version.remarks;
};

const render = async ({ db }: Platform, slug: string, versionId: string): Promise<Rendered> => {
  const version = await db.LayoutVersion.findByPk(versionId);
  if (!version) throw new RangeError(`the published version ${versionId} is missing`);
  const head = { slug, number: version.number, publishedAt: version.decidedAt?.toISOString() };
  const text = `${JSON.stringify(head).slice(0, -1)},"document":${version.document}}`;
  const entry: Rendered = {
    tag: `W/"${version.number}-${version.checksum.slice(0, 24)}"`,
    bodies: { identity: Buffer.from(text) },
  };
  rendered.set(versionId, entry);
  return entry;
};

const encode = async ({ bodies }: Rendered, encoding: Encoding): Promise<Buffer> => {
  const identity = bodies.identity;
  if (!identity) throw new RangeError('a rendered layout has its plain text');
  if (encoding === 'identity') return identity;
  return (bodies[encoding] = await shrink[encoding](identity));
};
