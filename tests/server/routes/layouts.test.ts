import { QueryTypes } from 'sequelize';
import request from 'supertest';
import { buildDocument, publishLayout, sendLayout } from '../support/layouts';
import { testServer } from '../support/platform';
import { authorization } from '../support/signed-in';
import { layoutDocument } from '@/shared';
import type { LayoutCard, LayoutsPage } from '@/shared/api/layouts';

let server: Awaited<ReturnType<typeof testServer>>;

const boards = [
  { maker: 'Ålund & Søn', name: 'K-8 weaver', revision: 'A', kind: 'controller' as const, marks: ['Blue lacquer'] },
  { maker: 'Ålund & Søn', name: 'K-16 weaver', revision: 'A', kind: 'controller' as const, marks: ['Red lacquer'] },
  { maker: 'Ålund & Søn', name: 'K-16 weaver', revision: 'B', kind: 'controller' as const, marks: ['Red lacquer'] },
  { maker: 'Brisk', name: 'Organ 3', revision: '1.2', kind: 'musical instrument' as const, marks: ['Stamp 64'] },
];

beforeAll(async () => {
  server = await testServer();
  for (const board of boards) await publishLayout(server, buildDocument(board));
  await sendLayout(server, await authorization(server.platform, 'contributor'), buildDocument({ name: 'Not yet' }));
}, 60_000);
afterAll(() => server.close());

const get = (path: string) => request(server.app).get(`/api/v1${path}`);

const find = async (query: string): Promise<string[]> => {
  const answer = await get(`/layouts?${query}`).expect(200);
  return (answer.body as LayoutsPage).items.map(({ name, revision }: LayoutCard) => `${name} ${revision}`);
};

describe('the library', () => {
  it('lists published boards only, by maker, name and revision, with K-8 before K-16', async () => {
    expect(await find('')).toEqual(['K-8 weaver A', 'K-16 weaver A', 'K-16 weaver B', 'Organ 3 1.2']);
  });

  it.each([
    ['the start of a word of the name', 'q=weav', ['K-8 weaver A', 'K-16 weaver A', 'K-16 weaver B']],
    ['a word that only the marks have', 'q=stamp', ['Organ 3 1.2']],
    ['letters without their accents, in any case', 'q=ALUND', ['K-8 weaver A', 'K-16 weaver A', 'K-16 weaver B']],
    ['all words together, in any order', 'q=b%20k-16', ['K-16 weaver B']],
    ['a type number written in one piece', 'q=k16', ['K-16 weaver A', 'K-16 weaver B']],
    ['one letter', 'q=o', ['Organ 3 1.2']],
    ['not the middle of a word', 'q=eaver', []],
    ['not half of the words', 'q=weaver%20organ', []],
    [
      'a percent sign as a sign, not as anything',
      'q=%25',
      ['K-8 weaver A', 'K-16 weaver A', 'K-16 weaver B', 'Organ 3 1.2'],
    ],
  ])('finds by %s', async (_how, query, names) => {
    expect(await find(query)).toEqual(names);
  });

  it.each([
    ['maker', 'maker=brisk', ['Organ 3 1.2']],
    ['kind', 'kind=musical%20instrument', ['Organ 3 1.2']],
    ['chip family', 'family=dynamic-16k-1-three-rail&q=organ', ['Organ 3 1.2']],
    ['chip family that none has', 'family=dynamic-9k-1', []],
    ['word width', 'bits=8&q=red', ['K-16 weaver A', 'K-16 weaver B']],
    ['word width that none has', 'bits=9', []],
  ])('narrows down by %s', async (_what, query, names) => {
    expect(await find(query)).toEqual(names);
  });

  it('goes from page to page without losing or repeating a board', async () => {
    const seen: string[] = [];
    let cursor: string | null = null;
    do {
      const answer = await get(`/layouts?limit=1&q=weaver${cursor === null ? '' : `&cursor=${cursor}`}`).expect(200);
      const page = answer.body as LayoutsPage;
      seen.push(...page.items.map(({ name, revision }) => `${name} ${revision}`));
      cursor = page.nextCursor;
    } while (cursor !== null);
    expect(seen).toEqual(['K-8 weaver A', 'K-16 weaver A', 'K-16 weaver B']);
  });

  it('tells what it can be narrowed by', async () => {
    const answer = await get('/layout-filters').expect(200);
    expect(answer.body).toEqual({
      makers: ['Ålund & Søn', 'Brisk'],
      kinds: ['controller', 'musical instrument'],
      families: ['dynamic-16k-1-three-rail'],
      bits: [8],
    });
  });

  it('has an index for each query that it asks', async () => {
    const { sequelize } = server.platform.db;
    const asked = jest.spyOn(sequelize, 'query');
    await find('q=weaver&maker=brisk&kind=controller&family=dynamic-16k-1-three-rail&bits=8');
    const query = String(asked.mock.calls[0]?.[0]);
    asked.mockRestore();
    const plan = await sequelize.query<{ table: string; possible_keys: string | null }>(`EXPLAIN ${query}`, {
      type: QueryTypes.SELECT,
    });
    expect(plan.map(({ table }) => table)).toEqual(
      expect.arrayContaining(['Layout', 'layout_families', 'layout_words']),
    );
    expect(plan.filter(({ possible_keys }) => possible_keys === null)).toEqual([]);
  });

  it.each(['limit=0', 'limit=101', 'limit=x', 'bits=0', 'kind=toaster', 'cursor=W10', 'sort=name'])(
    'refuses %s and names the field',
    async (query) => {
      const answer = await get(`/layouts?${query}`).expect(400);
      expect(answer.body.fields).toEqual([
        expect.objectContaining({ in: 'query', pointer: `/${query.split('=')[0]}` }),
      ]);
    },
  );
});

describe('a published layout', () => {
  const path = '/layouts/alund-son-k-8-weaver-a';

  it('comes whole, as a document that fits the schema', async () => {
    const answer = await get(path).expect(200);
    expect(answer.body).toMatchObject({ slug: 'alund-son-k-8-weaver-a', number: 1 });
    expect(layoutDocument.parse(answer.body.document)).toEqual(answer.body.document);
  });

  it('is not sent again to who has it', async () => {
    const first = await get(path).expect(200);
    const again = await get(path)
      .set('If-None-Match', first.headers.etag ?? '')
      .expect(304);
    expect(again.text).toBe('');
    await get(path).set('If-None-Match', 'W/"0-other"').expect(200);
  });

  it.each(['gzip', 'br', 'identity'])('is the same when it is packed as %s', async (encoding) => {
    const plain = await get(path).set('Accept-Encoding', 'identity');
    const packed = await get(path).set('Accept-Encoding', encoding).expect(200);
    expect(packed.headers['content-encoding']).toBe(encoding === 'identity' ? undefined : encoding);
    expect(packed.headers.vary).toMatch('Accept-Encoding');
    expect(packed.headers.etag).toBe(plain.headers.etag);
    if (encoding !== 'br') expect(packed.body).toEqual(plain.body);
  });

  it('answers HEAD with the length and no body', async () => {
    const answer = await request(server.app).head(`/api/v1${path}`).set('Accept-Encoding', 'identity').expect(200);
    expect(Number(answer.headers['content-length'])).toBeGreaterThan(1000);
    expect(answer.text).toBeUndefined();
  });

  it('is not there under another address', async () => {
    await get('/layouts/alund-son-k-8-weaver-z').expect(404);
    await get('/layouts/tarnvall-textil-not-yet-b').expect(404);
    const answer = await get("/layouts/'%20OR%201=1").expect(400);
    expect(answer.body.fields).toEqual([expect.objectContaining({ pointer: '/slug' })]);
  });
});

describe('the schema of layout documents', () => {
  it('lets defaults be left out, as documents are sent', async () => {
    const answer = await get('/layout-schema').expect(200);
    expect(answer.headers['content-type']).toMatch('application/schema+json');
    const schema = JSON.parse(answer.text ?? String(answer.body)) as { $schema: string; required: string[] };
    expect(schema.$schema).toMatch('2020-12');
    expect(schema.required).toEqual(['format', 'board', 'memory', 'sockets']);
  });
});
