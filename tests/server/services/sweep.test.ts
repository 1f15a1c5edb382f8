import { buildUser } from '../../factories/build-user';
import { testServer } from '../support/platform';
import { authorizationOf } from '../support/signed-in';
import { sweep } from '@/server/services/sweep';

it('what has had its time is removed, and nothing else', async () => {
  const server = await testServer();
  const { db } = server.platform;
  await buildUser(db, { confirmed: false });
  const kept = await buildUser(db);
  await authorizationOf(server.platform, kept);
  await sweep(server.platform);
  expect([await db.User.count(), await db.Session.count()]).toEqual([2, 1]);
  server.wait(8 * 86_400_000);
  await sweep(server.platform);
  expect((await db.User.findAll()).map((user) => user.id)).toEqual([kept.id]);
  expect(await db.Session.count()).toBe(0);
  await server.close();
});
