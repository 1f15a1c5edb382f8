import request from 'supertest';
import { buildUser, builtPassword } from '../../factories/build-user';
import { linkToken } from '../support/mail';
import { testServer } from '../support/platform';
import { ensureOwner } from '@/server/services/owner';

const owner = { OWNER_EMAIL: 'owner@rowcall.test', OWNER_NAME: 'Maren Oddsdal' };

it('the owner is made once, with the password of the configuration', async () => {
  const server = await testServer({ ...owner, OWNER_PASSWORD: 'a configured password' });
  await Promise.all([ensureOwner(server.platform), ensureOwner(server.platform)]);
  await ensureOwner(server.platform);
  expect(await server.platform.db.User.count({ where: { role: 'owner' } })).toBe(1);
  const answer = await request(server.app)
    .post('/api/v1/sessions')
    .send({ email: owner.OWNER_EMAIL, password: 'a configured password' })
    .expect(201);
  expect(answer.body.person.role).toBe('owner');
  await server.close();
});

it('without a password in the configuration the owner is sent the link to choose one', async () => {
  const server = await testServer(owner);
  await ensureOwner(server.platform);
  const token = await linkToken(server.platform.db, owner.OWNER_EMAIL);
  const reset = { token, password: 'chosen by the owner' };
  await request(server.app).post('/api/v1/password-resets/complete').send(reset).expect(204);
  await server.close();
});

it('somebody who signed up with the owner’s address before does not become the owner with his own password', async () => {
  const server = await testServer(owner);
  await buildUser(server.platform.db, { email: owner.OWNER_EMAIL, confirmed: false });
  await ensureOwner(server.platform);
  await request(server.app)
    .post('/api/v1/sessions')
    .send({ email: owner.OWNER_EMAIL, password: builtPassword })
    .expect(401);
  await server.close();
});
