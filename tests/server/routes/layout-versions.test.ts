import { once } from 'node:events';
import { createServer } from 'node:http';
import { connect, type AddressInfo } from 'node:net';
import { gzipSync } from 'node:zlib';
import request from 'supertest';
import { act, buildDocument, sendLayout } from '../support/layouts';
import { testServer } from '../support/platform';
import { authorization } from '../support/signed-in';
import { limits } from '@/shared/limits';

let server: Awaited<ReturnType<typeof testServer>>;
let contributor: Record<string, string>;

beforeAll(async () => {
  server = await testServer();
  contributor = await authorization(server.platform, 'contributor');
});
afterAll(() => server.close());

const post = (path: string, body: unknown, headers: Record<string, string> = contributor) =>
  request(server.app)
    .post(`/api/v1${path}`)
    .set({ 'Content-Type': 'application/json', ...headers })
    .send(typeof body === 'string' ? body : JSON.stringify(body));

type Problems = { pointer: string; severity: string; code: string; message: string }[];

describe('a contributor who sends a layout', () => {
  it('makes a board with an address of its name, and a version that waits', async () => {
    const answer = await post('/layouts', buildDocument({ maker: 'Ødegård', name: 'X/9 — "Öre"', revision: 'ß' }));
    expect(answer.status).toBe(201);
    expect(answer.body.version).toMatchObject({ slug: 'odegard-x-9-ore-ss', number: 1, state: 'submitted' });
    expect(answer.headers.location).toBe('/api/v1/layouts/odegard-x-9-ore-ss/versions/1');
    expect(answer.headers.etag).toBe('"1"');
    await request(server.app)
      .get(answer.headers.location ?? '')
      .set(contributor)
      .expect(200);
  });

  it('makes a new version of the board whose name differs in capitals and signs only', async () => {
    const first = await sendLayout(server, contributor, buildDocument({ name: 'Same-Board 1' }));
    const second = await sendLayout(server, contributor, buildDocument({ name: 'same board 1', notes: 'again' }));
    expect([second.slug, second.number]).toEqual([first.slug, 2]);
  });

  it('gets different addresses for different boards whose names look alike in an address', async () => {
    const first = await sendLayout(server, contributor, buildDocument({ maker: 'A B', name: 'C', revision: '1' }));
    const second = await sendLayout(server, contributor, buildDocument({ maker: 'A', name: 'B C', revision: '1' }));
    expect([first.slug, second.slug]).toEqual(['a-b-c-1', 'a-b-c-1-2']);
  });

  it('gets an address for a name without a Latin letter', async () => {
    const version = await sendLayout(server, contributor, buildDocument({ maker: '東', name: '京', revision: '甲' }));
    expect(version.slug).toBe('board');
  });

  it('makes one board of two documents at the same moment', async () => {
    const name = 'At once';
    const sent = [1, 2, 3].map((number) =>
      sendLayout(server, contributor, buildDocument({ name, notes: `${number}` })),
    );
    const versions = await Promise.all(sent);
    expect(new Set(versions.map(({ slug }) => slug)).size).toBe(1);
    expect(versions.map(({ number }) => number).sort()).toEqual([1, 2, 3]);
  });

  it('sees what he has sent, the last change first, and nothing of others', async () => {
    const own = await authorization(server.platform, 'contributor');
    const first = await sendLayout(server, own, buildDocument({ name: 'Own one' }));
    const second = await sendLayout(server, own, buildDocument({ name: 'Own two' }));
    const moderator = await authorization(server.platform, 'moderator');
    await act(server, moderator, { version: first, name: 'return', remarks: 'Which edge?' }).expect(200);
    const answer = await request(server.app).get('/api/v1/me/layout-versions').set(own).expect(200);
    expect(answer.body.items.map(({ id }: { id: string }) => id)).toEqual([first.id, second.id]);
    const page = await request(server.app).get('/api/v1/me/layout-versions?limit=1').set(own);
    const rest = await request(server.app).get(`/api/v1/me/layout-versions?cursor=${page.body.nextCursor}`).set(own);
    expect(rest.body.items.map(({ id }: { id: string }) => id)).toEqual([second.id]);
  });
});

describe('a document with errors', () => {
  const spoilt = () => {
    const document = buildDocument({ name: 'Spoilt' });
    return { ...document, sockets: document.sockets.slice(1).map((socket) => ({ ...socket, label: 'U1' })) };
  };

  it('is refused with all of them, and leaves nothing behind', async () => {
    const before = await server.platform.db.Layout.count();
    const answer = await post('/layouts', spoilt());
    expect([answer.status, answer.body.code]).toEqual([422, 'layout-invalid']);
    const codes = new Set((answer.body.problems as Problems).map(({ code }) => code));
    expect(codes.size).toBeGreaterThanOrEqual(2);
    expect(await server.platform.db.Layout.count()).toBe(before);
  });

  it('gets the same list from the check, for guests too', async () => {
    const refused = await post('/layouts', spoilt());
    const checked = await post('/layout-checks', spoilt(), {});
    expect(checked.status).toBe(200);
    expect(checked.body).toMatchObject({ publishable: false, problems: refused.body.problems });
  });

  it('gets problems of form and of content in one list', async () => {
    const document = { ...spoilt(), sources: [{ title: '', kind: 'rumour' }], colour: 'red' };
    const { colour: _, ...withoutColour } = document;
    const problems = (await post('/layout-checks', withoutColour, {})).body.problems as Problems;
    expect(problems).toEqual(
      expect.arrayContaining([
        expect.objectContaining({ pointer: '/sources/0/title', code: 'schema-too-small' }),
        expect.objectContaining({ pointer: '/sources/0/kind', code: 'schema-invalid-value' }),
        expect.objectContaining({ pointer: expect.stringMatching(/^\/sockets/), severity: 'error' }),
      ]),
    );
    const strange = (await post('/layout-checks', document, {})).body.problems as Problems;
    expect(strange).toContainEqual(expect.objectContaining({ pointer: '/colour', message: 'There is no such field.' }));
  });

  it('is told how a number may be written', async () => {
    const document = buildDocument();
    const memory = { ...document.memory, banks: [{ id: 'A', words: '16K' }] };
    const problems = (await post('/layout-checks', { ...document, memory }, {})).body.problems as Problems;
    expect(problems).toContainEqual(
      expect.objectContaining({ pointer: '/memory/banks/0/words', message: 'Write 16384, "0x4000" or "0o40000".' }),
    );
  });

  it.each([[null], [[]], ['text'], [17], [{}]])(
    'is %j at its worst, which has a list of problems too',
    async (body) => {
      const answer = await post('/layout-checks', JSON.stringify(body), {});
      expect(answer.status).toBe(200);
      expect(answer.body.publishable).toBe(false);
      expect(answer.body.problems.length).toBeGreaterThan(0);
    },
  );
});

describe('a body that is too much', () => {
  it('is refused at its first bytes, when it says that it has 50 MB', async () => {
    const http = createServer(server.app).listen(0, '127.0.0.1');
    await once(http, 'listening');
    const socket = connect((http.address() as AddressInfo).port, '127.0.0.1');
    const head = { ...contributor, Host: 'rowcall.test', 'Content-Type': 'application/json' };
    const lines = Object.entries({ ...head, 'Content-Length': '50000000' }).map(([name, value]) => `${name}: ${value}`);
    socket.write(`POST /api/v1/layouts HTTP/1.1\r\n${lines.join('\r\n')}\r\n\r\n{"format":`);
    const [first] = (await once(socket, 'data')) as [Buffer];
    expect(String(first)).toMatch(/^HTTP\/1\.1 413 /);
    expect(String(first)).toMatch('"code":"body-too-large"');
    socket.destroy();
    http.close();
  });

  it('is refused after unpacking as well', async () => {
    const bomb = gzipSync(JSON.stringify({ format: ' '.repeat(limits.layoutBytes) }));
    const answer = await request(server.app)
      .post('/api/v1/layouts')
      .set({ ...contributor, 'Content-Type': 'application/json', 'Content-Encoding': 'gzip' })
      .serialize((body: unknown) => body as string)
      .send(bomb);
    expect([answer.status, answer.body.code]).toEqual([413, 'body-too-large']);
  });

  it('is refused when it is nested without end', async () => {
    const answer = await post('/layouts', `${'['.repeat(200_000)}${']'.repeat(200_000)}`);
    expect([answer.status, answer.body.code]).toEqual([400, 'body-too-deep']);
  });

  it('has a layout of the largest size looked through without harm', async () => {
    const document = buildDocument();
    const [socket] = document.sockets;
    const sockets = Array.from({ length: limits.sockets + 1 }, (_, at) => ({ ...socket, label: `U${at}` }));
    const answer = await post('/layout-checks', { ...document, sockets }, {});
    expect(answer.status).toBe(200);
    expect(answer.body.problems[0]).toMatchObject({ pointer: '/sockets', code: 'schema-too-big' });
  });
});
