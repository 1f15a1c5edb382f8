import { z } from 'zod';
import { versionTag } from '@/server/http/if-match';
import { ok, route, type Route } from '@/server/http/route';
import { presentVersionDetail, presentVersionRow } from '@/server/presenters/layout';
import { listOwnVersions, listVersions, loadVersion } from '@/server/services/layout-versions';
import {
  layoutSlug,
  ownVersionsQuery,
  versionDetail,
  versionNumber,
  versionsAnswer,
  versionsPage,
} from '@/shared/api/layouts';

const tag = 'layout versions';
const ofBoard = z.strictObject({ slug: layoutSlug });
const ofVersion = z.strictObject({ slug: layoutSlug, number: versionNumber });

export const layoutVersionRoutes: readonly Route[] = [
  route({
    method: 'get',
    path: '/layouts/:slug/versions',
    may: 'guest',
    tag,
    summary:
      'The versions of a board, the newest first. Those not yet published show to their author and to moderators.',
    params: ofBoard,
    answer: { status: 200, schema: versionsAnswer, words: 'The versions, without their documents.' },
    problems: ['not-found'],
    handler: async ({ context, params }) =>
      ok({ items: (await listVersions(context, params.slug)).map(presentVersionRow) }),
  }),
  route({
    method: 'get',
    path: '/layouts/:slug/versions/:number',
    may: 'guest',
    tag,
    summary: 'One version of a board, whole.',
    params: ofVersion,
    answer: { status: 200, schema: versionDetail, words: 'The version with its document; ETag is its change.' },
    problems: ['not-found'],
    handler: async ({ context, params }) => {
      const row = await loadVersion(context, params);
      return ok(presentVersionDetail(row), versionTag(row.version.change));
    },
  }),
  route({
    method: 'get',
    path: '/me/layout-versions',
    may: 'contributor',
    tag,
    summary: 'What whoever asks has sent, the last change first.',
    query: ownVersionsQuery,
    answer: { status: 200, schema: versionsPage, words: 'One page.' },
    handler: async ({ context, query }) => {
      const { rows, nextCursor } = await listOwnVersions(context, query);
      return ok({ items: rows.map(presentVersionRow), nextCursor });
    },
  }),
];
