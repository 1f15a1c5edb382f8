import type { Request, Response } from 'express';
import { z } from 'zod';
import { handled, ok, route, type Reply, type Route } from '@/server/http/route';
import { exampleList, exampleSlug } from './examples';
import { presentLayoutCard } from '@/server/presenters/layout';
import { listLayoutFilters, listLayouts } from '@/server/services/layouts';
import { sendablePublished, type Encoding } from '@/server/services/published-layouts';
import { layoutFilters, layoutSlug, layoutsPage, layoutsQuery, publishedLayout } from '@/shared/api/layouts';
import { layoutDocument } from '@/shared/layout/document';

const tag = 'layouts';

/** Made once: the schema does not change while the process runs. */
let schemaText: string | undefined;

const schemaOfDocuments = (): string =>
  (schemaText ??= JSON.stringify({
    title: 'Rowcall layout document',
    ...z.toJSONSchema(layoutDocument, { io: 'input' }),
  }));

export const layoutRoutes: readonly Route[] = [
  route({
    method: 'get',
    path: '/layouts',
    may: 'guest',
    tag,
    summary: 'Find published boards, by maker, name and revision.',
    example: { query: { q: 't-64 loom', limit: 10 }, answer: exampleList },
    query: layoutsQuery,
    answer: { status: 200, schema: layoutsPage, words: 'One page; send nextCursor as cursor for the next.' },
    handler: async ({ context, query }) => {
      const { rows, nextCursor } = await listLayouts(context, query);
      return ok({ items: rows.map(presentLayoutCard), nextCursor });
    },
  }),
  route({
    method: 'get',
    path: '/layout-filters',
    may: 'guest',
    tag,
    summary: 'What the published boards can be narrowed by.',
    answer: { status: 200, schema: layoutFilters, words: 'The values that occur.' },
    handler: async ({ context }) => ok(await listLayoutFilters(context)),
  }),
  route({
    method: 'get',
    path: '/layouts/:slug',
    may: 'guest',
    tag,
    summary: 'The published layout of a board, whole.',
    example: { params: { slug: exampleSlug } },
    params: z.strictObject({ slug: layoutSlug }),
    answer: {
      status: 200,
      schema: publishedLayout,
      words: 'The published version. Keep its ETag and ask with If-None-Match.',
    },
    problems: ['not-found', 'layout-retired'],
    handler: async ({ context, params, request, response }) => {
      const encoding = encodingFor(request);
      const layout = await sendablePublished(context, { slug: params.slug, encoding });
      return sendBytes({ request, response }, { ...layout, encoding });
    },
  }),
  route({
    method: 'get',
    path: '/layout-schema',
    may: 'guest',
    tag,
    summary: 'The JSON Schema (2020-12) of a layout document as it is sent.',
    answer: { status: 200, schema: z.record(z.string(), z.unknown()), words: 'The schema.' },
    handler: ({ response }) => {
      response.type('application/schema+json').set('Cache-Control', 'no-cache').send(schemaOfDocuments());
      return handled;
    },
  }),
];

const encodingFor = (request: Request): Encoding => {
  if (!request.headers['accept-encoding']) return 'identity';
  // One by one: asked for both, Express would take the one that the browser happens to name first.
  return (['br', 'gzip'] as const).find((encoding) => request.acceptsEncodings(encoding) === encoding) ?? 'identity';
};

/** Sends bytes that are ready, past Express's own way, which would hash and measure them again for every request. */
const sendBytes = (
  { request, response }: { request: Request; response: Response },
  { tag: version, body, encoding }: { tag: string; body: Buffer; encoding: Encoding },
): Reply => {
  response.setHeader('ETag', version);
  response.setHeader('Cache-Control', 'no-cache');
  response.setHeader('Vary', 'Accept-Encoding');
  if (request.headers['if-none-match'] && request.fresh) {
    response.statusCode = 304;
    response.end();
    return handled;
  }
  response.setHeader('Content-Type', 'application/json; charset=utf-8');
  response.setHeader('Content-Length', body.length);
  if (encoding !== 'identity') response.setHeader('Content-Encoding', encoding);
  response.end(request.method === 'HEAD' ? undefined : body);
  return handled;
};
