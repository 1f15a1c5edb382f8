import { z } from 'zod';
import { requiredVersion, versionTag } from '@/server/http/if-match';
import { ok, route, type Route } from '@/server/http/route';
import { presentPersonRow } from '@/server/presenters/person';
import { changeRole, listPeople } from '@/server/services/people';
import { peoplePage, peopleQuery, personChange, personRow } from '@/shared/api/people';

const tag = 'people';

export const peopleRoutes: readonly Route[] = [
  route({
    method: 'get',
    path: '/people',
    may: 'moderator',
    tag,
    summary: 'People with an account, by name.',
    query: peopleQuery,
    answer: { status: 200, schema: peoplePage, words: 'One page.' },
    handler: async ({ context, query }) => {
      const { rows, nextCursor } = await listPeople(context, query);
      return ok({ items: rows.map(presentPersonRow), nextCursor });
    },
  }),
  route({
    method: 'patch',
    path: '/people/:id',
    may: 'moderator',
    tag,
    summary: 'Give a person another role. A moderator gives and takes contributor, the owner moderator too.',
    params: z.strictObject({ id: z.uuid() }),
    body: personChange,
    answer: { status: 200, schema: personRow, words: 'The person with the new role.' },
    problems: ['not-found', 'role-required', 'version-required', 'version-conflict'],
    handler: async ({ context, params, body, request }) => {
      const change = { id: params.id, role: body.role, version: requiredVersion(request) };
      const user = await changeRole(context, change);
      return ok(presentPersonRow(user), versionTag(user.version));
    },
  }),
];
