import { z } from 'zod';
import { requiredVersion, versionTag } from '@/server/http/if-match';
import { created, ok, route, type Route } from '@/server/http/route';
import { exampleCheck, exampleDocument, exampleSlug } from './examples';
import { presentImport, presentVersionDetail, presentVersionRow } from '@/server/presenters/layout';
import { checkSentLayout } from '@/server/services/layout-check';
import { importLayout, resubmitVersion } from '@/server/services/layout-import';
import { listOwnVersions, listVersions, loadVersion } from '@/server/services/layout-versions';
import {
  importAnswer,
  layoutCheck,
  layoutSlug,
  ownVersionsQuery,
  sentDocument,
  versionDetail,
  versionNumber,
  versionsAnswer,
  versionsPage,
} from '@/shared/api/layouts';
import { limits } from '@/shared/limits';

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
    example: { params: { slug: exampleSlug } },
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
    example: { params: { slug: exampleSlug, number: 1 } },
    params: ofVersion,
    answer: { status: 200, schema: versionDetail, words: 'The version with its document; ETag is its change.' },
    problems: ['not-found'],
    handler: async ({ context, params }) => {
      const row = await loadVersion(context, params);
      return ok(presentVersionDetail(row), versionTag(row.version.change));
    },
  }),
  route({
    method: 'post',
    path: '/layouts',
    may: 'contributor',
    tag,
    summary: 'Send a layout document: a new board, or a new version of the board with that maker, name and revision.',
    details:
      'The version waits in state `submitted` until a moderator publishes it, returns it with words or rejects it. A document with an error is refused with `layout-invalid` and every problem in `problems`; try it with `POST /layout-checks` first.',
    example: { body: exampleDocument },
    body: sentDocument,
    bodyBytes: limits.layoutBytes,
    answer: { status: 201, schema: importAnswer, words: 'The version waits for a moderator.' },
    problems: ['layout-invalid', 'conflict', 'too-many-attempts'],
    handler: async ({ context, body }) => {
      const { warnings, ...row } = await importLayout(context, { document: body });
      const { layout, version } = row;
      const location = `/api/v1/layouts/${layout.slug}/versions/${version.number}`;
      return created(location, presentImport(row, warnings), versionTag(version.change));
    },
  }),
  route({
    method: 'put',
    path: '/layouts/:slug/versions/:number',
    may: 'contributor',
    tag,
    summary: 'Change a version of your own that was returned or still waits, and submit it again.',
    params: ofVersion,
    body: sentDocument,
    bodyBytes: limits.layoutBytes,
    answer: { status: 200, schema: importAnswer, words: 'The version waits for a moderator again.' },
    problems: ['not-found', 'layout-invalid', 'version-required', 'version-conflict', 'conflict'],
    handler: async ({ context, params, body, request }) => {
      const change = requiredVersion(request);
      const { warnings, ...row } = await resubmitVersion(context, { ...params, change, document: body });
      return ok(presentImport(row, warnings), versionTag(row.version.change));
    },
  }),
  route({
    method: 'post',
    path: '/layout-checks',
    may: 'guest',
    tag,
    summary: 'Check a layout document without storing it: every problem of its form and of its content.',
    details:
      'Problems of form (what the schema says, see `GET /layout-schema`) have codes that begin with `schema-`; the others are found by looking at the layout as a whole. `pointer` is a JSON pointer into the document.',
    example: { body: exampleDocument, answer: exampleCheck },
    body: sentDocument,
    bodyBytes: limits.layoutBytes,
    answer: { status: 200, schema: layoutCheck, words: 'The problems, errors first; none if the list is empty.' },
    problems: ['too-many-requests'],
    handler: ({ context, body }) => ok(checkSentLayout(context, body)),
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
