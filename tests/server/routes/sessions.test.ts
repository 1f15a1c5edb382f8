import request from 'supertest';
import { buildUser, builtPassword } from '../../factories/build-user';
import { testServer } from '../support/platform';

let server: Awaited<ReturnType<typeof testServer>>;

beforeAll(async () => {
  server = await testServer();
});
afterAll(() => server.close());

const signIn = (email: string, more: object = {}) =>
  request(server.app)
    .post('/api/v1/sessions')
    .send({ email, password: builtPassword, ...more });

/** The cookies that an answer set, as a browser would send them back. */
const cookiesOf = (answer: request.Response): string[] =>
  ((answer.headers['set-cookie'] as unknown as string[] | undefined) ?? []).map((line) => line.split(';')[0] ?? '');

const cookie = (answer: request.Response, name: string): string =>
  cookiesOf(answer).find((line) => line.startsWith(`${name}=`)) ?? '';

const refresh = (refreshCookie: string) =>
  request(server.app).post('/api/v1/sessions/refresh').set('Cookie', refreshCookie);

const signedIn = async () => {
  const user = await buildUser(server.platform.db);
  const answer = await signIn(user.email).expect(201);
  return { user, access: cookie(answer, 'rowcall_access'), refresh: cookie(answer, 'rowcall_refresh') };
};

describe('sign-in', () => {
  it('sets cookies that no script can read and no other site can send', async () => {
    const user = await buildUser(server.platform.db);
    const answer = await signIn(user.email).expect(201);
    for (const line of answer.headers['set-cookie'] as unknown as string[]) {
      expect(line).toMatch(/HttpOnly/);
      expect(line).toMatch(/SameSite=Strict/);
    }
    expect(answer.body.accessToken).toBeUndefined();
    const me = await request(server.app).get('/api/v1/me').set('Cookie', cookiesOf(answer)).expect(200);
    expect(me.body.person.id).toBe(user.id);
  });

  it('gives a script a bearer token and no cookie', async () => {
    const user = await buildUser(server.platform.db);
    const answer = await signIn(user.email, { bearer: true }).expect(201);
    expect(answer.headers['set-cookie']).toBeUndefined();
    const me = await request(server.app).get('/api/v1/me').auth(answer.body.accessToken, { type: 'bearer' });
    expect(me.body.person.id).toBe(user.id);
  });

  it('answers an unknown address and a wrong password with the same words', async () => {
    const user = await buildUser(server.platform.db);
    const strip = ({ body, status }: request.Response) => ({ ...body, requestId: undefined, status });
    const unknown = await signIn('nobody@rowcall.test');
    const wrong = await signIn(user.email, { password: 'not the password' });
    expect(strip(unknown)).toEqual(strip(wrong));
    expect(unknown.body.code).toBe('sign-in-failed');
  });

  it('stops after ten wrong passwords, for a known address as for an unknown one', async () => {
    for (const email of [(await buildUser(server.platform.db)).email, 'unknown@rowcall.test']) {
      for (let tries = 0; tries < 10; tries++) await signIn(email, { password: 'a guess' }).expect(401);
      const stopped = await signIn(email).expect(429);
      expect(stopped.body.code).toBe('too-many-attempts');
      expect(Number(stopped.headers['retry-after'])).toBeGreaterThan(0);
    }
  });

  it('counts attempts that come at the same moment', async () => {
    const { email } = await buildUser(server.platform.db);
    const answers = await Promise.all(Array.from({ length: 15 }, () => signIn(email, { password: 'a guess' })));
    expect(answers.filter((answer) => answer.status === 401)).toHaveLength(10);
  });
});

describe('refresh', () => {
  it('gives new cookies for the old one', async () => {
    const session = await signedIn();
    const renewed = await refresh(session.refresh).expect(200);
    expect(renewed.body.person.id).toBe(session.user.id);
    expect(cookie(renewed, 'rowcall_refresh')).not.toBe(session.refresh);
  });

  it('says guest to somebody who has no cookie', async () => {
    const answer = await request(server.app).post('/api/v1/sessions/refresh').expect(200);
    expect(answer.body).toEqual({ person: null, accessExpiresAt: null });
  });

  it('lets a second tab that refreshes at the same moment go on', async () => {
    const session = await signedIn();
    const [one, two] = await Promise.all([refresh(session.refresh), refresh(session.refresh)]);
    expect([one.status, two.status]).toEqual([200, 200]);
    const next = cookie(one, 'rowcall_refresh') || cookie(two, 'rowcall_refresh');
    await refresh(next).expect(200);
  });

  it('ends the whole session when a token comes a second time later', async () => {
    const session = await signedIn();
    const renewed = await refresh(session.refresh).expect(200);
    server.wait(60_000);
    const stolen = await refresh(session.refresh).expect(401);
    expect(stolen.body.code).toBe('session-ended');
    await refresh(cookie(renewed, 'rowcall_refresh')).expect(401);
    const me = await request(server.app).get('/api/v1/me').set('Cookie', cookie(renewed, 'rowcall_access'));
    expect(me.body.person).toBeNull();
  });

  it('keeps refresh tokens as hashes only', async () => {
    const session = await signedIn();
    const token = session.refresh.split('=')[1] ?? '';
    expect(token.length).toBeGreaterThan(40);
    expect(JSON.stringify(await server.platform.db.RefreshToken.findAll({ raw: true }))).not.toContain(token);
  });
});

describe('sign-out', () => {
  it('ends the session at once, for its access token too', async () => {
    const session = await signedIn();
    await request(server.app)
      .delete('/api/v1/sessions/current')
      .set('Cookie', [session.access, session.refresh])
      .expect(204);
    await refresh(session.refresh).expect(401);
    await request(server.app)
      .put('/api/v1/me/password')
      .set('Cookie', session.access)
      .send({ currentPassword: builtPassword, newPassword: 'another password' })
      .expect(401);
  });
});

describe('a token', () => {
  it('that was tampered with is refused on every route, a public one too', async () => {
    const user = await buildUser(server.platform.db);
    const { body } = await signIn(user.email, { bearer: true });
    const [head, , seal] = String(body.accessToken).split('.');
    const claims = { sub: user.id, sid: user.id, role: 'owner', iss: 'rowcall', exp: 4_000_000_000 };
    const forged = `${head}.${Buffer.from(JSON.stringify(claims)).toString('base64url')}.${seal}`;
    const unsigned = `${Buffer.from('{"alg":"none","typ":"JWT"}').toString('base64url')}.${forged.split('.')[1]}.`;
    for (const token of [forged, unsigned, 'nonsense', '']) {
      const answer = await request(server.app)
        .get('/api/v1/health')
        .set('Authorization', `Bearer ${token}`)
        .expect(401);
      expect(answer.body.code).toBe('token-invalid');
    }
    const answer = await request(server.app)
      .get('/api/v1/people')
      .set('Cookie', `rowcall_access=${forged}`)
      .expect(401);
    expect(answer.body.code).toBe('token-invalid');
    expect(cookie(answer, 'rowcall_access')).toBe('rowcall_access=');
  });

  it('that has expired is told to a script, and makes a browser a guest', async () => {
    const user = await buildUser(server.platform.db);
    const own = await testServer({ ACCESS_MINUTES: '1' });
    own.wait(-120_000);
    const person = await buildUser(own.platform.db, { email: user.email });
    const answer = await request(own.app)
      .post('/api/v1/sessions')
      .send({ email: person.email, password: builtPassword, bearer: true })
      .expect(201);
    const token = String(answer.body.accessToken);
    const script = await request(own.app).get('/api/v1/health').set('Authorization', `Bearer ${token}`).expect(401);
    expect(script.body.code).toBe('token-expired');
    await request(own.app).get('/api/v1/health').set('Cookie', `rowcall_access=${token}`).expect(200);
    await own.close();
  });
});

describe('a write from another site', () => {
  it('is refused, and one from this site is not', async () => {
    const { email } = await buildUser(server.platform.db);
    const foreign = await signIn(email).set('Origin', 'https://elsewhere.example').expect(403);
    expect(foreign.body.code).toBe('foreign-origin');
    await signIn(email).set('Origin', 'null').expect(403);
    await signIn(email).set('Sec-Fetch-Site', 'cross-site').expect(403);
    await signIn(email).set('Origin', 'http://rowcall.test').expect(201);
    await signIn(email).set('Host', 'bench.local:3000').set('Origin', 'http://bench.local:3000').expect(201);
  });
});
