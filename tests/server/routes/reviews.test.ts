import { randomUUID } from 'node:crypto';
import request from 'supertest';
import { buildUser } from '../../factories/build-user';
import { act, buildDocument, publishLayout, sendLayout } from '../support/layouts';
import { waitingMail } from '../support/mail';
import { testServer } from '../support/platform';
import { authorization, authorizationOf } from '../support/signed-in';
import type { VersionRow } from '@/shared/api/layouts';

let server: Awaited<ReturnType<typeof testServer>>;
let contributor: Record<string, string>;
let moderator: Record<string, string>;

beforeAll(async () => {
  server = await testServer();
  contributor = await authorization(server.platform, 'contributor');
  moderator = await authorization(server.platform, 'moderator');
});
afterAll(() => server.close());

const get = (path: string, headers: Record<string, string> = {}) =>
  request(server.app).get(`/api/v1${path}`).set(headers);

/** Sends a version of a board of its own. */
const sendNew = (author = contributor) =>
  sendLayout(server, author, buildDocument({ revision: randomUUID().slice(0, 20) }));

describe('a moderator who publishes', () => {
  it('puts the board into the look-up and the library at once', async () => {
    const version = await sendNew();
    await get(`/layouts/${version.slug}`).expect(404);
    const answer = await act(server, moderator, { version, name: 'publish' }).expect(200);
    expect(answer.body).toMatchObject({ state: 'published', current: true });
    const layout = await get(`/layouts/${version.slug}`).expect(200);
    expect(layout.body.number).toBe(1);
    const found = await get(`/layouts?q=${version.revision}`);
    expect(found.body.items.map(({ slug }: { slug: string }) => slug)).toEqual([version.slug]);
  });

  it('never decides on a version of his own, not even the owner', async () => {
    for (const role of ['moderator', 'owner'] as const) {
      const own = await authorization(server.platform, role);
      const version = await sendNew(own);
      const queue = await get('/reviews?limit=100', own);
      expect(queue.body.items.find(({ id }: VersionRow) => id === version.id).own).toBe(true);
      for (const name of ['publish', 'return', 'reject'] as const) {
        const remarks = name === 'publish' ? undefined : 'no';
        const answer = await act(server, own, { version, name, remarks }).expect(403);
        expect(answer.body.code).toBe('own-version');
      }
    }
  });

  it('is one of two at the same moment, and the other is told', async () => {
    const version = await sendNew();
    const other = await authorization(server.platform, 'moderator');
    const answers = await Promise.all([moderator, other].map((who) => act(server, who, { version, name: 'publish' })));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 412]);
    const entries = await server.platform.db.AuditEntry.count({ where: { subjectId: version.id } });
    expect(entries).toBe(1);
  });

  it('says which change of the version he has seen', async () => {
    const version = await sendNew();
    await request(server.app).post(`/api/v1/reviews/${version.id}/publish`).set(moderator).expect(428);
    const stale = { ...version, change: version.change + 1 };
    const answer = await act(server, moderator, { version: stale, name: 'publish' }).expect(412);
    expect(answer.body.code).toBe('version-conflict');
  });

  it('replaces the version before, whose document stays as it was', async () => {
    const first = await publishLayout(server, buildDocument({ name: 'Twice', notes: 'one' }));
    const second = await publishLayout(server, buildDocument({ name: 'Twice', notes: 'two' }));
    expect([second.slug, second.number]).toEqual([first.slug, 2]);
    expect((await get(`/layouts/${first.slug}`)).body.document.board.notes).toBe('two');
    const old = await get(`/layouts/${first.slug}/versions/1`).expect(200);
    expect(old.body).toMatchObject({ state: 'published', current: false, checksum: first.checksum });
    expect(old.body.document.board.notes).toBe('one');
  });

  it('finds nothing to publish twice', async () => {
    const version = await publishLayout(server, buildDocument({ name: 'Once' }));
    const answer = await act(server, moderator, { version, name: 'publish' }).expect(409);
    expect(answer.body.detail).toMatch('published');
  });
});

describe('a document that was published', () => {
  it('cannot be changed through its model, alone or among others', async () => {
    const { LayoutVersion } = server.platform.db;
    const { id } = await publishLayout(server, buildDocument({ name: 'Fixed' }));
    const version = await LayoutVersion.findByPk(id);
    await expect(version?.update({ document: '{}' })).rejects.toThrow(RangeError);
    await expect(LayoutVersion.update({ document: '{}' }, { where: { id } })).rejects.toThrow(RangeError);
    await version?.reload();
    await expect(version?.update({ checksum: '0'.repeat(64) })).rejects.toThrow(RangeError);
  });

  it('is not changed by its author either', async () => {
    const version = await sendNew();
    const published = await act(server, moderator, { version, name: 'publish' }).expect(200);
    const answer = await request(server.app)
      .put(`/api/v1/layouts/${version.slug}/versions/1`)
      .set({ ...contributor, 'If-Match': `"${published.body.change}"` })
      .send(buildDocument({ revision: version.revision, notes: 'other' }));
    expect([answer.status, answer.body.code]).toEqual([409, 'conflict']);
  });
});

describe('a version that is returned', () => {
  it('goes back with words, is changed by its author and waits again', async () => {
    const author = await buildUser(server.platform.db, { role: 'contributor' });
    const own = await authorizationOf(server.platform, author);
    const version = await sendNew(own);
    const returned = await act(server, moderator, { version, name: 'return', remarks: 'Bank B runs the other way.' });
    expect(returned.body).toMatchObject({ state: 'returned', remarks: 'Bank B runs the other way.' });
    const [mail] = await waitingMail(server.platform.db, author.email);
    expect(mail?.body).toMatch('Bank B runs the other way.');

    const mine = await get('/me/layout-versions?state=returned', own).expect(200);
    expect(mine.body.items).toEqual([expect.objectContaining({ id: version.id })]);
    const again = await request(server.app)
      .put(`/api/v1/layouts/${version.slug}/versions/1`)
      .set({ ...own, 'If-Match': `"${returned.body.change}"` })
      .send(buildDocument({ revision: version.revision, notes: 'Bank B turned.' }))
      .expect(200);
    expect(again.body.version).toMatchObject({ state: 'submitted', number: 1 });
    const publish = await act(server, moderator, { version: again.body.version, name: 'publish' });
    expect(publish.status).toBe(200);
    expect((await get(`/layouts/${version.slug}`)).body.document.board.notes).toBe('Bank B turned.');
  });

  it('is not changed by another contributor, nor into another board', async () => {
    const version = await sendNew();
    const change = (headers: Record<string, string>, document: object) =>
      request(server.app)
        .put(`/api/v1/layouts/${version.slug}/versions/1`)
        .set({ 'If-Match': `"${version.change}"`, ...headers })
        .send(document);
    const other = await authorization(server.platform, 'contributor');
    expect((await change(other, buildDocument({ revision: version.revision }))).body.code).toBe('role-required');
    expect((await change(contributor, buildDocument({ revision: 'other' }))).body.code).toBe('conflict');
  });
});

describe('a version that is rejected', () => {
  it('stays out of the look-up, and the very same document is not taken again', async () => {
    const version = await sendNew();
    await act(server, moderator, { version, name: 'reject', remarks: 'No source.' }).expect(200);
    await get(`/layouts/${version.slug}`).expect(404);
    const again = await request(server.app)
      .post('/api/v1/layouts')
      .set(contributor)
      .send(buildDocument({ revision: version.revision }));
    expect([again.status, again.body.code]).toEqual([409, 'conflict']);
  });

  it('is not rejected without words', async () => {
    const version = await sendNew();
    const answer = await act(server, moderator, { version, name: 'reject', remarks: '  ' }).expect(400);
    expect(answer.body.fields).toEqual([expect.objectContaining({ in: 'body', pointer: '/remarks' })]);
  });
});

describe('a version that is retired', () => {
  it('leaves the look-up and the library, and its address tells why', async () => {
    const version = await publishLayout(server, buildDocument({ name: 'Gone', revision: 'gone' }));
    await request(server.app)
      .post(`/api/v1/layouts/${version.slug}/versions/1/retire`)
      .set({ ...moderator, 'If-Match': `"${version.change}"` })
      .send({ remarks: 'U14 and U15 are exchanged.' })
      .expect(200);
    const answer = await get(`/layouts/${version.slug}`).expect(410);
    expect(answer.body).toMatchObject({ code: 'layout-retired', detail: 'U14 and U15 are exchanged.' });
    expect((await get('/layouts?q=gone')).body.items).toEqual([]);
    const versions = await get(`/layouts/${version.slug}/versions`).expect(200);
    expect(versions.body.items).toEqual([expect.objectContaining({ state: 'retired', current: false })]);
  });
});

describe('the queue', () => {
  it('shows each waiting version once, the longest waiting first, page by page', async () => {
    await Promise.all([1, 2, 3].map(() => sendNew()));
    const seen: VersionRow[] = [];
    for (let cursor: string | null = ''; cursor !== null;) {
      const query: string = cursor === '' ? '' : `&cursor=${cursor}`;
      const answer = await get(`/reviews?limit=2${query}`, moderator).expect(200);
      seen.push(...(answer.body.items as VersionRow[]));
      cursor = answer.body.nextCursor as string | null;
    }
    const times = seen.map(({ submittedAt }) => submittedAt ?? '');
    expect(times).toEqual([...times].sort());
    expect(new Set(seen.map(({ id }) => id)).size).toBe(seen.length);
    expect(await server.platform.db.LayoutVersion.count({ where: { state: 'submitted' } })).toBe(seen.length);
  });

  it('opens a version with its document', async () => {
    const version = await sendNew();
    const answer = await get(`/reviews/${version.id}`, moderator).expect(200);
    expect(answer.body.document.board.revision).toBe(version.revision);
    expect(answer.headers.etag).toBe(`"${version.change}"`);
    await get(`/reviews/${randomUUID()}`, moderator).expect(404);
    await get('/reviews/not-an-id', moderator).expect(400);
  });
});

describe('a version that waits', () => {
  it('is seen by its author and by moderators, not by guests and other people', async () => {
    const version = await sendNew();
    const path = `/layouts/${version.slug}/versions/1`;
    const other = await authorization(server.platform, 'contributor');
    await get(path, contributor).expect(200);
    await get(path, moderator).expect(200);
    await get(path, other).expect(404);
    await get(path).expect(404);
    await get(`/layouts/${version.slug}/versions`).expect(404);
  });
});
