import request from 'supertest';
import { buildUser, builtPassword } from '../../factories/build-user';
import { linkToken, waitingMail } from '../support/mail';
import { testServer } from '../support/platform';

let server: Awaited<ReturnType<typeof testServer>>;

beforeAll(async () => {
  server = await testServer();
});
afterAll(() => server.close());

const signUp = (email: string, password = 'a quiet oscilloscope') =>
  request(server.app).post('/api/v1/accounts').send({ name: 'Asta Verholm', email, password });
const signIn = (email: string, password = 'a quiet oscilloscope') =>
  request(server.app).post('/api/v1/sessions').send({ email, password });
const confirm = (token: string) => request(server.app).post('/api/v1/accounts/confirm').send({ token });

describe('sign-up', () => {
  it('makes a technician who can sign in after the link in the mail was followed', async () => {
    await signUp('asta@rowcall.test').expect(202, { status: 'mail-sent' });
    const early = await signIn('asta@rowcall.test').expect(403);
    expect(early.body.code).toBe('email-not-confirmed');
    await confirm(await linkToken(server.platform.db, 'asta@rowcall.test')).expect(204);
    const answer = await signIn('ASTA@rowcall.test').expect(201);
    expect(answer.body.person).toMatchObject({ name: 'Asta Verholm', role: 'technician', email: 'asta@rowcall.test' });
  });

  it('lists every field that is wrong at once', async () => {
    const answer = await request(server.app)
      .post('/api/v1/accounts')
      .send({ name: ' ', email: 'nobody', password: 'short', role: 'owner' })
      .expect(400);
    expect(answer.body.fields.map((field: { pointer: string }) => field.pointer).sort()).toEqual([
      '/email',
      '/name',
      '/password',
      '/role',
    ]);
  });

  it('takes a password of at most 72 bytes, which is all that the hash reads', async () => {
    await signUp('long@rowcall.test', 'ä'.repeat(36)).expect(202);
    await signUp('longer@rowcall.test', 'ä'.repeat(37)).expect(400);
  });

  it('answers a known address like an unknown one, and tells its owner by mail', async () => {
    const known = await buildUser(server.platform.db);
    await signUp(known.email).expect(202, { status: 'mail-sent' });
    const [mail] = await waitingMail(server.platform.db, known.email);
    expect(mail?.subject).toBe('You have an account already');
    await signIn(known.email, builtPassword).expect(201);
    await signIn(known.email).expect(401);
  });

  it('lets the last of two sign-ups count while the address is not confirmed', async () => {
    await signUp('twice@rowcall.test', 'the first password').expect(202);
    const first = await linkToken(server.platform.db, 'twice@rowcall.test');
    await signUp('twice@rowcall.test', 'the second password').expect(202);
    await confirm(first).expect(410);
    await confirm(await linkToken(server.platform.db, 'twice@rowcall.test')).expect(204);
    await signIn('twice@rowcall.test', 'the first password').expect(401);
    await signIn('twice@rowcall.test', 'the second password').expect(201);
  });

  it('makes one account of many sign-ups at the same moment', async () => {
    const answers = await Promise.all(Array.from({ length: 4 }, () => signUp('race@rowcall.test')));
    expect(answers.map((answer) => answer.status)).toEqual([202, 202, 202, 202]);
    expect(await server.platform.db.User.count({ where: { emailKey: 'race@rowcall.test' } })).toBe(1);
  });
});

describe('the link in the mail', () => {
  it('is good once', async () => {
    await signUp('once@rowcall.test').expect(202);
    const token = await linkToken(server.platform.db, 'once@rowcall.test');
    await confirm(token).expect(204);
    const again = await confirm(token).expect(410);
    expect(again.body.code).toBe('link-invalid');
  });

  it('is not good for another purpose', async () => {
    await signUp('other@rowcall.test').expect(202);
    const token = await linkToken(server.platform.db, 'other@rowcall.test');
    const reset = { token, password: 'another password' };
    await request(server.app).post('/api/v1/password-resets/complete').send(reset).expect(410);
  });

  it('can be sent again, and the earlier one ends', async () => {
    const user = await buildUser(server.platform.db, { confirmed: false });
    const resend = () => request(server.app).post('/api/v1/accounts/resend-confirmation').send({ email: user.email });
    await resend().expect(202, { status: 'mail-sent' });
    await confirm(await linkToken(server.platform.db, user.email)).expect(204);
    await resend().expect(202, { status: 'mail-sent' });
    expect(await waitingMail(server.platform.db, user.email)).toHaveLength(1);
  });

  it('is kept as a hash only', async () => {
    await signUp('hash@rowcall.test').expect(202);
    const token = await linkToken(server.platform.db, 'hash@rowcall.test');
    const kept = await server.platform.db.EmailToken.findAll({ raw: true });
    expect(JSON.stringify(kept)).not.toContain(token);
  });

  it('ends after two days', async () => {
    await signUp('late@rowcall.test').expect(202);
    const token = await linkToken(server.platform.db, 'late@rowcall.test');
    server.wait(49 * 3_600_000);
    await confirm(token).expect(410);
  });
});
