import request from 'supertest';
import { testServer } from '../support/platform';
import { authorization } from '../support/signed-in';
import { routes } from '@/server/routes';
import { includesRole, standings, type Standing } from '@/shared/roles';

/** Weakest standing that may call each route. A route that is added has to be entered here. */
const table: Record<string, Standing> = {
  'GET /health': 'guest',
  'GET /problems': 'guest',
  'GET /problems/:code': 'guest',
  'POST /accounts': 'guest',
  'POST /accounts/confirm': 'guest',
  'POST /accounts/resend-confirmation': 'guest',
  'POST /password-resets': 'guest',
  'POST /password-resets/complete': 'guest',
  'POST /sessions': 'guest',
  'POST /sessions/refresh': 'guest',
  'DELETE /sessions/current': 'guest',
  'GET /me': 'guest',
  'PUT /me/password': 'technician',
  'GET /me/role-request': 'technician',
  'POST /role-requests': 'technician',
  'GET /role-requests': 'moderator',
  'PATCH /role-requests/:id': 'moderator',
  'GET /people': 'moderator',
  'PATCH /people/:id': 'moderator',
  'GET /layouts': 'guest',
  'GET /layout-filters': 'guest',
  'GET /layout-schema': 'guest',
  'GET /layouts/:slug': 'guest',
  'GET /layouts/:slug/versions': 'guest',
  'GET /layouts/:slug/versions/:number': 'guest',
  'GET /me/layout-versions': 'contributor',
  'GET /openapi.json': 'guest',
  'POST /diagnoses': 'guest',
  'POST /layouts': 'contributor',
  'PUT /layouts/:slug/versions/:number': 'contributor',
  'POST /layout-checks': 'guest',
  'GET /reviews': 'moderator',
  'GET /reviews/:id': 'moderator',
  'POST /reviews/:id/publish': 'moderator',
  'POST /reviews/:id/return': 'moderator',
  'POST /reviews/:id/reject': 'moderator',
  'POST /layouts/:slug/versions/:number/retire': 'moderator',
};

const nameOf = ({ method, path }: { method: string; path: string }) => `${method.toUpperCase()} ${path}`;

let server: Awaited<ReturnType<typeof testServer>>;

beforeAll(async () => {
  server = await testServer();
});
afterAll(() => server.close());

it('lists every route that there is, and no other', () => {
  expect(routes.map(nameOf).sort()).toEqual(Object.keys(table).sort());
});

const refusals = new Set(['sign-in-required', 'session-ended', 'role-required']);

describe.each(standings)('a %s', (standing) => {
  it.each(routes.map((route) => [nameOf(route), route] as const))('is let in or refused by %s', async (name, route) => {
    const path = `/api/v1${route.path.replace(/:\w+/g, 'none')}`;
    const answer = await request(server.app)
      [route.method](path)
      .set(await authorization(server.platform, standing));
    const may = includesRole(standing, table[name] ?? 'owner');
    expect(refusals.has(answer.body.code)).toBe(!may);
    if (!may) expect(answer.status).toBe(standing === 'guest' ? 401 : 403);
  });
});
