import request from 'supertest';
import { buildUser } from '../../factories/build-user';
import { waitingMail } from '../support/mail';
import { testServer } from '../support/platform';
import { authorization, authorizationOf } from '../support/signed-in';
import { roles, type Role } from '@/shared/roles';

let server: Awaited<ReturnType<typeof testServer>>;

beforeAll(async () => {
  server = await testServer();
});
afterAll(() => server.close());

const change = (id: string, options: { role: string; version?: number; header: Record<string, string> }) => {
  const sent = request(server.app).patch(`/api/v1/people/${id}`).set(options.header).send({ role: options.role });
  return options.version === undefined ? sent : sent.set('If-Match', `"${options.version}"`);
};

describe('roles', () => {
  // Who may change whom into what; every change that is not named here is refused.
  const allowed = new Set([
    'moderator: technician to contributor',
    'moderator: contributor to technician',
    ...['technician', 'contributor', 'moderator'].flatMap((from) =>
      ['technician', 'contributor', 'moderator'].map((to) => `owner: ${from} to ${to}`),
    ),
    'moderator: technician to technician',
    'moderator: contributor to contributor',
  ]);

  it.each(roles.flatMap((by) => roles.map((from) => [by, from] as const)))(
    'a %s changes a %s only within his power',
    async (by, from) => {
      const header = await authorization(server.platform, by);
      for (const to of roles) {
        const user = await buildUser(server.platform.db, { role: from });
        const answer = await change(user.id, { role: to, version: 1, header });
        expect([`${by}: ${from} to ${to}`, answer.status]).toEqual([
          `${by}: ${from} to ${to}`,
          allowed.has(`${by}: ${from} to ${to}`) ? 200 : 403,
        ]);
      }
    },
  );

  it('count at once, without a new sign-in, and are in the audit trail', async () => {
    const person = await buildUser(server.platform.db, { role: 'moderator' });
    const own = await authorizationOf(server.platform, person);
    await request(server.app).get('/api/v1/people').set(own).expect(200);
    const header = await authorization(server.platform, 'owner');
    await change(person.id, { role: 'technician', version: 1, header }).expect(200);
    await request(server.app).get('/api/v1/people').set(own).expect(403);
    const trail = await server.platform.db.AuditEntry.findAll({ where: { subjectId: person.id } });
    expect(trail.map((entry) => [entry.act, entry.detail])).toEqual([
      ['role-changed', { from: 'moderator', to: 'technician' }],
    ]);
  });

  it('are not changed by two people over each other', async () => {
    const header = await authorization(server.platform, 'owner');
    const { id } = await buildUser(server.platform.db);
    await change(id, { role: 'contributor', header }).expect(428);
    await change(id, { role: 'contributor', version: 1, header }).expect(200);
    const late = await change(id, { role: 'moderator', version: 1, header }).expect(412);
    expect(late.body.code).toBe('version-conflict');
  });

  it('are never one’s own to change', async () => {
    const owner = await buildUser(server.platform.db, { role: 'owner' });
    const header = await authorizationOf(server.platform, owner);
    await change(owner.id, { role: 'technician', version: 1, header }).expect(403);
  });
});

describe('the list of people', () => {
  it('goes through everybody once, page by page, and finds by part of a name', async () => {
    for (const name of ['Zeta 50%', 'Zeta A', 'Zeta a', 'Zeta B', 'Zeta_C'])
      await buildUser(server.platform.db, { name });
    const header = await authorization(server.platform, 'moderator');
    const seen: string[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const query: Record<string, string> = { search: 'zeta', limit: '2', ...(cursor ? { cursor } : {}) };
      const answer = await request(server.app).get('/api/v1/people').query(query).set(header).expect(200);
      seen.push(...answer.body.items.map((person: { name: string }) => person.name));
      cursor = answer.body.nextCursor as string | null;
    }
    expect([...seen].sort()).toEqual(['Zeta 50%', 'Zeta A', 'Zeta B', 'Zeta a', 'Zeta_C']);
    const literal = await request(server.app).get('/api/v1/people').query({ search: 'a_' }).set(header).expect(200);
    expect(literal.body.items.map((person: { name: string }) => person.name)).toEqual(['Zeta_C']);
  });

  it('refuses a cursor that it did not give', async () => {
    const header = await authorization(server.platform, 'moderator');
    const answer = await request(server.app).get('/api/v1/people?cursor=nonsense').set(header).expect(400);
    expect(answer.body.fields[0].pointer).toBe('/cursor');
  });
});

describe('a request for the role of contributor', () => {
  const ask = (header: Record<string, string>) =>
    request(server.app).post('/api/v1/role-requests').set(header).send({ reason: 'I keep tide recorders.' });

  it('is granted by a moderator, who is shown it, and its person is told by mail', async () => {
    const user = await buildUser(server.platform.db);
    const header = await authorizationOf(server.platform, user);
    const asked = await ask(header).expect(201);
    await ask(header).expect(409);
    const moderator = await authorization(server.platform, 'moderator');
    const queue = await request(server.app).get('/api/v1/role-requests').set(moderator).expect(200);
    expect(queue.body.items.map((item: { id: string }) => item.id)).toContain(asked.body.id);
    const decide = (decision: string) =>
      request(server.app).patch(`/api/v1/role-requests/${asked.body.id}`).set(moderator).send({ decision });
    await decide('granted').expect(200);
    await decide('declined').expect(409);
    const me = await request(server.app).get('/api/v1/me').set(header);
    expect(me.body.person.role satisfies Role).toBe('contributor');
    const own = await request(server.app).get('/api/v1/me/role-request').set(header).expect(200);
    expect(own.body.request.state).toBe('granted');
    expect((await waitingMail(server.platform.db, user.email))[0]?.subject).toBe('You are a contributor now');
    await ask(header).expect(409);
  });

  it('can be made again after it was declined', async () => {
    const header = await authorization(server.platform, 'technician');
    const asked = await ask(header).expect(201);
    await request(server.app)
      .patch(`/api/v1/role-requests/${asked.body.id}`)
      .set(await authorization(server.platform, 'owner'))
      .send({ decision: 'declined' })
      .expect(200);
    await ask(header).expect(201);
  });
});
