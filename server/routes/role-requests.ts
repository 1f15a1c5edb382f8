import { z } from 'zod';
import { created, ok, route, type Route } from '@/server/http/route';
import { presentRoleRequest } from '@/server/presenters/role-request';
import { askForRole, decideRoleRequest, listRoleRequests, loadOwnRequest } from '@/server/services/role-requests';
import {
  ownRoleRequest,
  roleDecision,
  roleRequestInput,
  roleRequestPage,
  roleRequestQuery,
  roleRequestRow,
} from '@/shared/api/people';

const tag = 'people';

export const roleRequestRoutes: readonly Route[] = [
  route({
    method: 'post',
    path: '/role-requests',
    may: 'technician',
    tag,
    summary: 'Ask for the role of contributor.',
    body: roleRequestInput,
    answer: { status: 201, schema: roleRequestRow, words: 'The request; a moderator answers it.' },
    problems: ['request-open', 'conflict'],
    handler: async ({ context, body }) => {
      const { request, person } = await askForRole(context, body);
      return created('/api/v1/me/role-request', presentRoleRequest(request, person));
    },
  }),
  route({
    method: 'get',
    path: '/me/role-request',
    may: 'technician',
    tag,
    summary: 'The latest request of whoever asks; null if there was none.',
    answer: { status: 200, schema: ownRoleRequest, words: 'The request, or null.' },
    handler: async ({ context }) => {
      const own = await loadOwnRequest(context);
      return ok({ request: own ? presentRoleRequest(own.request, own.person) : null });
    },
  }),
  route({
    method: 'get',
    path: '/role-requests',
    may: 'moderator',
    tag,
    summary: 'Requests for the role of contributor, the oldest first.',
    query: roleRequestQuery,
    answer: { status: 200, schema: roleRequestPage, words: 'One page.' },
    handler: async ({ context, query }) => {
      const { rows, nextCursor } = await listRoleRequests(context, query);
      return ok({ items: rows.map(({ request, person }) => presentRoleRequest(request, person)), nextCursor });
    },
  }),
  route({
    method: 'patch',
    path: '/role-requests/:id',
    may: 'moderator',
    tag,
    summary: 'Grant or decline a request.',
    params: z.strictObject({ id: z.uuid() }),
    body: roleDecision,
    answer: { status: 200, schema: roleRequestRow, words: 'The answered request.' },
    problems: ['not-found', 'conflict', 'role-required'],
    handler: async ({ context, params, body }) => {
      const { request, person } = await decideRoleRequest(context, { id: params.id, decision: body.decision });
      return ok(presentRoleRequest(request, person));
    },
  }),
];
