import request from 'supertest';
import { testServer } from '../support/platform';
import { seedDemo } from '@/server/seeders';
import { demoBoards } from '@/server/seeders/boards';
import { seedLayouts } from '@/server/seeders/layouts';
import type { LayoutsPage } from '@/shared/api/layouts';

let server: Awaited<ReturnType<typeof testServer>>;
let moderator: Record<string, string>;
const password = 'a lamp over the bench';

beforeAll(async () => {
  server = await testServer({ DEMO_DATA: '1', DEMO_PASSWORD: password });
  await seedDemo(server.platform);
  const signIn = { email: 'moderator@rowcall.example', password, bearer: true };
  const session = await request(server.app).post('/api/v1/sessions').send(signIn).expect(201);
  moderator = { Authorization: `Bearer ${session.body.accessToken}` };
}, 60_000);
afterAll(() => server.close());

const listed = async () => {
  const answer = await request(server.app).get('/api/v1/layouts?limit=100').expect(200);
  return (answer.body as LayoutsPage).items.map(({ slug }) => slug);
};

describe('the demo data of a first run', () => {
  it('has every demo board published at its address', async () => {
    expect((await listed()).sort()).toEqual(demoBoards.map(({ slug }) => slug).sort());
  });

  it('has a version that waits, which the demo moderator can publish', async () => {
    const queue = await request(server.app).get('/api/v1/reviews').set(moderator).expect(200);
    expect(queue.body.items).toEqual([expect.objectContaining({ number: 2, publishedNumber: 1, own: false })]);
    const [{ id, change, slug }] = queue.body.items;
    const publish = request(server.app).post(`/api/v1/reviews/${id}/publish`).set(moderator);
    await publish.set('If-Match', `"${change}"`).expect(200);
    const layout = await request(server.app).get(`/api/v1/layouts/${slug}`).expect(200);
    expect(layout.body.number).toBe(2);
  });

  it('sends no mail about the boards that were there from the start', async () => {
    const { OutboxMail, User } = server.platform.db;
    const contributor = await User.findOne({ where: { email: 'contributor@rowcall.example' } });
    const mails = await OutboxMail.findAll({ where: { recipient: contributor?.email ?? '' } });
    expect(mails.map(({ subject }) => subject).filter((subject) => subject.startsWith('Published'))).toHaveLength(1);
  });

  it('is not filled in a second time, and finishes what was broken off', async () => {
    const { db } = server.platform;
    await seedDemo(server.platform);
    await seedLayouts(server.platform);
    expect(await db.Layout.count()).toBe(demoBoards.length);
    expect(await db.LayoutVersion.count()).toBe(demoBoards.length + 1);
  }, 30_000);
});
