import request from 'supertest';
import { publishLayout } from '../support/layouts';
import { testServer } from '../support/platform';
import { routes } from '@/server/routes';
import { demoBoards } from '@/server/seeders/boards';

interface OpenapiDocument {
  openapi: string;
  paths: Record<string, Record<string, { summary: string; responses: Record<string, unknown> }>>;
  components: { schemas: Record<string, unknown> };
}

let server: Awaited<ReturnType<typeof testServer>>;
let document: OpenapiDocument;

beforeAll(async () => {
  server = await testServer();
  document = (await request(server.app).get('/api/v1/openapi.json').expect(200)).body as OpenapiDocument;
});
afterAll(() => server.close());

const nameOf = ({ method, path }: { method: string; path: string }) => `${method.toUpperCase()} ${path}`;
const declared = routes.map((route) => [nameOf(route), route] as const);

describe('the description of the API', () => {
  it('is OpenAPI 3.1 and has every declared route and no other', () => {
    expect(document.openapi).toBe('3.1.0');
    const described = Object.entries(document.paths).flatMap(([path, methods]) =>
      Object.keys(methods).map((method) => nameOf({ method, path })),
    );
    expect(described.sort()).toEqual(declared.map(([name]) => name.replace(/:(\w+)/g, '{$1}')).sort());
  });

  it('refers only to schemas that it has', () => {
    const references = [...JSON.stringify(document).matchAll(/"\$ref":"#\/components\/schemas\/(\w+)"/g)];
    const missing = references.map(([, name]) => name ?? '').filter((name) => !(name in document.components.schemas));
    expect(references.length).toBeGreaterThan(20);
    expect(missing).toEqual([]);
    expect(JSON.stringify(document)).not.toMatch('#/$defs');
  });

  it.each(declared)('tells the status of success and the problems of %s', (_name, route) => {
    const path = route.path.replace(/:(\w+)/g, '{$1}');
    const { responses } = document.paths[path]?.[route.method] ?? { responses: {} };
    expect(responses).toHaveProperty(String(route.answer.status));
    for (const code of route.problems ?? []) expect(JSON.stringify(responses)).toMatch(`\`${code}\``);
  });

  it('shows a document as it is sent, where defaults may be left out, and as it is answered, where they are filled in', () => {
    const { LayoutDocument, LayoutDocumentInput } = document.components.schemas as Record<
      string,
      { required: string[] }
    >;
    expect(LayoutDocumentInput?.required).not.toContain('sharedParts');
    expect(LayoutDocument?.required).toContain('sharedParts');
  });
});

describe('the worked examples', () => {
  const withExample = declared.filter(([, { example }]) => example);

  it('are there for the routes that a script meets first', () => {
    expect(withExample.map(([name]) => name)).toEqual(
      expect.arrayContaining([
        'POST /diagnoses',
        'GET /layouts',
        'POST /layout-checks',
        'POST /layouts',
        'POST /sessions',
      ]),
    );
  });

  it.each(withExample)('of %s fit its schemas', (_name, { params, query, body, answer, example }) => {
    if (example?.params) params?.parse(example.params);
    if (example?.query) query?.parse(example.query);
    if (example?.body) body?.parse(example.body);
    if (example?.answer) answer.schema?.parse(example.answer());
  });

  it('come out as they are shown', async () => {
    const [board] = demoBoards;
    if (!board) throw new Error('there are no demo boards');
    await publishLayout(server, board.document);
    await server.platform.db.Layout.update({ slug: board.slug }, { where: {} });
    for (const name of ['POST /diagnoses', 'POST /layout-checks']) {
      const example = routes.find((route) => nameOf(route) === name)?.example;
      const answer = await request(server.app)
        .post(`/api/v1${name.slice(5)}`)
        .send(example?.body as object)
        .expect(200);
      expect(answer.body).toEqual(example?.answer?.());
    }
  });
});

describe('the page of the description', () => {
  it('takes its scripts and styles from this server only', async () => {
    const page = await request(server.app).get('/api/v1/docs/').expect(200);
    const sources = [...page.text.matchAll(/<(?:script|link)[^>]*(?:src|href)="([^"]+)"/g)].map(([, source]) => source);
    expect(sources.length).toBeGreaterThan(2);
    expect(sources.filter((source) => /^(https?:)?\/\//.test(source ?? ''))).toEqual([]);
    expect(page.text).not.toMatch(/<script>[^<]/);
  });
});
