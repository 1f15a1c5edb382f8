import request from 'supertest';
import { publishLayout } from '../support/layouts';
import { testServer } from '../support/platform';
import { buildLayoutIndex, diagnose } from '@/lib';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument, type RunInput } from '@/shared';
import { runs } from '@/shared/evidence';
import { limits } from '@/shared/limits';

let server: Awaited<ReturnType<typeof testServer>>;

beforeAll(async () => {
  server = await testServer();
});
afterAll(() => server.close());

const post = (body: unknown) =>
  request(server.app)
    .post('/api/v1/diagnoses')
    .send(body as object);

const [board] = demoBoards;
if (!board) throw new Error('there are no demo boards');

const lamp = (text: string): RunInput => ({ evidence: [{ kind: 'code', format: 'lamp', text }] });

describe('a diagnosis asked for by a script', () => {
  it('is the one that the engine gives, for a published board and for the same document sent whole', async () => {
    const { slug } = await publishLayout(server, board.document);
    const expected = diagnose(buildLayoutIndex(layoutDocument.parse(board.document)), runs.parse([lamp('C5')]));
    const bySlug = await post({ layout: slug, runs: [lamp('C5')] }).expect(200);
    const byDocument = await post({ layout: board.document, runs: [lamp('C5')] }).expect(200);
    expect(bySlug.body).toEqual(expected);
    expect(byDocument.body).toEqual(expected);
    expect(expected.headline).toMatch('U31');
  });

  it.each(demoBoards.map(({ slug, document }) => [slug, document] as const))(
    'names the socket of each worked example of %s',
    async (_slug, document) => {
      for (const { format, text, sockets } of document.examples ?? []) {
        const evidence = [{ kind: 'code', format, text }];
        const answer = await post({ layout: document, runs: [{ evidence }] }).expect(200);
        expect(answer.body.evidence[0]).toMatchObject({ ok: true, reason: null });
        const named = (answer.body.suspects as { socket: string | null }[]).map(({ socket }) => socket);
        for (const socket of sockets) expect(named).toContain(socket);
      }
    },
  );

  it('follows the published version when another one is published', async () => {
    const change = (id: string) => ({
      ...board.document,
      board: { ...board.document.board, name: 'Two codes' },
      reportFormats: board.document.reportFormats?.map((format) => (format.id === 'lamp' ? { ...format, id } : format)),
      examples: [],
    });
    const { slug } = await publishLayout(server, change('lamp'));
    expect((await post({ layout: slug, runs: [lamp('C5')] })).body.evidence[0].ok).toBe(true);
    await publishLayout(server, change('lamp-two'));
    expect((await post({ layout: slug, runs: [lamp('C5')] })).body.evidence[0].ok).toBe(false);
  });

  it('tells why a code cannot be read instead of failing', async () => {
    const answer = await post({ layout: board.document, runs: [lamp('Z9')] }).expect(200);
    expect(answer.body.outcome).toBe('no-evidence');
    expect(answer.body.evidence[0]).toMatchObject({ ok: false, reason: expect.stringMatching(/\w/) });
  });

  it('is not made for a board that is not there, nor for an address that is none', async () => {
    expect((await post({ layout: 'no-such-board', runs: [] }).expect(404)).body.code).toBe('not-found');
    const answer = await post({ layout: 'No Such Board', runs: [] }).expect(400);
    expect(answer.body.fields).toEqual([expect.objectContaining({ in: 'body', pointer: '/layout' })]);
  });

  it('is refused with every problem for a document that has errors', async () => {
    const sockets = board.document.sockets.slice(2);
    const answer = await post({ layout: { ...board.document, sockets }, runs: [lamp('C5')] }).expect(422);
    expect(answer.body.code).toBe('layout-invalid');
    const errors = (answer.body.problems as { severity: string }[]).filter(({ severity }) => severity === 'error');
    expect(errors.length).toBeGreaterThanOrEqual(2);
  });

  it('names the place of what is wrong in the evidence', async () => {
    const text = '1'.repeat(10_000);
    const answer = await post({ layout: 'x', runs: [lamp(text), { changes: [{ kind: 'melt' }] }] }).expect(400);
    expect(answer.body.fields.map(({ pointer }: { pointer: string }) => pointer)).toEqual([
      '/runs/0/evidence/0/text',
      '/runs/1/changes/0/kind',
    ]);
    expect(JSON.stringify(answer.body)).not.toMatch('11111');
    expect(text.length).toBeGreaterThan(limits.reportText);
  });
});
