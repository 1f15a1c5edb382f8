import request from 'supertest';
import { buildUser, builtPassword } from '../../factories/build-user';
import { linkToken, waitingMail } from '../support/mail';
import { testServer } from '../support/platform';
import { authorizationOf } from '../support/signed-in';

let server: Awaited<ReturnType<typeof testServer>>;

beforeAll(async () => {
  server = await testServer();
});
afterAll(() => server.close());

const signIn = (email: string, password: string) =>
  request(server.app).post('/api/v1/sessions').send({ email, password });

describe('a forgotten password', () => {
  it('is replaced with the link in the mail, and every session ends', async () => {
    const user = await buildUser(server.platform.db);
    const header = await authorizationOf(server.platform, user);
    await request(server.app).post('/api/v1/password-resets').send({ email: user.email }).expect(202);
    const token = await linkToken(server.platform.db, user.email);
    const complete = () =>
      request(server.app).post('/api/v1/password-resets/complete').send({ token, password: 'fresh off the bench' });
    await complete().expect(204);
    await complete().expect(410);
    await signIn(user.email, builtPassword).expect(401);
    await signIn(user.email, 'fresh off the bench').expect(201);
    const me = await request(server.app).get('/api/v1/me').set(header);
    expect(me.body.person).toBeNull();
  });

  it('answers an unknown address alike and sends nothing', async () => {
    const email = 'stranger@rowcall.test';
    await request(server.app).post('/api/v1/password-resets').send({ email }).expect(202, { status: 'mail-sent' });
    expect(await waitingMail(server.platform.db, email)).toHaveLength(0);
  });

  it('takes the same time for a known address and an unknown one', async () => {
    const user = await buildUser(server.platform.db);
    const time = async (email: string) => {
      const start = performance.now();
      await request(server.app).post('/api/v1/password-resets').send({ email }).expect(202);
      return performance.now() - start;
    };
    expect(await time(user.email)).toBeGreaterThan(95);
    expect(await time('somebody@rowcall.test')).toBeGreaterThan(95);
  });

  it('sends five mails an hour to one address and no more', async () => {
    const email = 'flooded@rowcall.test';
    for (let sent = 0; sent < 5; sent++) {
      await request(server.app).post('/api/v1/password-resets').send({ email }).expect(202);
    }
    await request(server.app).post('/api/v1/password-resets').send({ email }).expect(429);
  });
});

describe('a change of password', () => {
  it('keeps this session, ends the others and tells the person by mail', async () => {
    const user = await buildUser(server.platform.db);
    const here = await authorizationOf(server.platform, user);
    const elsewhere = await authorizationOf(server.platform, user);
    const change = { currentPassword: builtPassword, newPassword: 'soldered and sealed' };
    await request(server.app).put('/api/v1/me/password').set(here).send(change).expect(204);
    const personOf = async (header: Record<string, string>) =>
      (await request(server.app).get('/api/v1/me').set(header)).body.person as unknown;
    expect(await personOf(here)).toMatchObject({ id: user.id });
    expect(await personOf(elsewhere)).toBeNull();
    await signIn(user.email, 'soldered and sealed').expect(201);
    const [mail] = await waitingMail(server.platform.db, user.email);
    expect(mail?.subject).toBe('Your password was changed');
  });

  it('needs the present password', async () => {
    const user = await buildUser(server.platform.db);
    const change = { currentPassword: 'a guess', newPassword: 'soldered and sealed' };
    const answer = await request(server.app)
      .put('/api/v1/me/password')
      .set(await authorizationOf(server.platform, user))
      .send(change)
      .expect(422);
    expect(answer.body.fields[0].pointer).toBe('/currentPassword');
    await signIn(user.email, builtPassword).expect(201);
  });
});
