import { z } from 'zod';
import { requiredVersion, versionTag } from '@/server/http/if-match';
import { ok, route, type Reply, type Route } from '@/server/http/route';
import { presentReviewDetail, presentReviewRow, presentVersionRow } from '@/server/presenters/layout';
import { checkLayout } from '@/server/services/layout-check';
import {
  listReviews,
  loadReview,
  publishVersion,
  rejectVersion,
  retireVersion,
  returnVersion,
} from '@/server/services/layout-reviews';
import type { VersionOf } from '@/server/services/layout-versions';
import type { ErrorCode } from '@/shared/error-codes';
import {
  layoutSlug,
  remarksInput,
  reviewDetail,
  reviewsPage,
  reviewsQuery,
  versionNumber,
  versionRow,
} from '@/shared/api/layouts';

const tag = 'reviews';
const ofReview = z.strictObject({ id: z.uuid() });
const decided = { status: 200, schema: versionRow, words: 'The version in its new state.' };
const problems: readonly ErrorCode[] = [
  'not-found',
  'own-version',
  'version-required',
  'version-conflict',
  'conflict',
  'layout-invalid',
];

const answerOf = (row: VersionOf): Reply => ok(presentVersionRow(row), versionTag(row.version.change));

export const reviewRoutes: readonly Route[] = [
  route({
    method: 'get',
    path: '/reviews',
    may: 'moderator',
    tag,
    summary: 'The versions that wait for a moderator, the longest waiting first.',
    query: reviewsQuery,
    answer: { status: 200, schema: reviewsPage, words: 'One page.' },
    handler: async ({ context, query }) => {
      const { rows, nextCursor } = await listReviews(context, query);
      return ok({ items: rows.map((row) => presentReviewRow(context, row)), nextCursor });
    },
  }),
  route({
    method: 'get',
    path: '/reviews/:id',
    may: 'moderator',
    tag,
    summary: 'One version with its document and what the check says of it now.',
    params: ofReview,
    answer: { status: 200, schema: reviewDetail, words: 'The version; its ETag is for If-Match.' },
    problems: ['not-found'],
    handler: async ({ context, params }) => {
      const row = await loadReview(context, params.id);
      const { problems: problemList } = checkLayout(JSON.parse(row.version.document));
      return ok(presentReviewDetail(context, row, problemList), versionTag(row.version.change));
    },
  }),
  route({
    method: 'post',
    path: '/reviews/:id/publish',
    may: 'moderator',
    tag,
    summary: 'Publish a submitted version. The board is in the library at once.',
    params: ofReview,
    answer: decided,
    problems,
    handler: async ({ context, params, request }) =>
      answerOf(await publishVersion(context, { id: params.id, change: requiredVersion(request) })),
  }),
  route({
    method: 'post',
    path: '/reviews/:id/return',
    may: 'moderator',
    tag,
    summary: 'Give a submitted version back to its author, with words.',
    params: ofReview,
    body: remarksInput,
    answer: decided,
    problems,
    handler: async ({ context, params, body, request }) =>
      answerOf(await returnVersion(context, { id: params.id, ...body, change: requiredVersion(request) })),
  }),
  route({
    method: 'post',
    path: '/reviews/:id/reject',
    may: 'moderator',
    tag,
    summary: 'Turn a submitted version down for good, with words.',
    params: ofReview,
    body: remarksInput,
    answer: decided,
    problems,
    handler: async ({ context, params, body, request }) =>
      answerOf(await rejectVersion(context, { id: params.id, ...body, change: requiredVersion(request) })),
  }),
  route({
    method: 'post',
    path: '/layouts/:slug/versions/:number/retire',
    may: 'moderator',
    tag,
    summary: 'Withdraw a published version, with words. If it is the current one the board leaves the library.',
    params: z.strictObject({ slug: layoutSlug, number: versionNumber }),
    body: remarksInput,
    answer: decided,
    problems,
    handler: async ({ context, params, body, request }) =>
      answerOf(await retireVersion(context, { ...params, ...body, change: requiredVersion(request) })),
  }),
];
