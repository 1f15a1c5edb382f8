import request from 'supertest';
import { authorization } from './signed-in';
import type { testServer } from './platform';
import { demoBoards } from '@/server/seeders/boards';
import type { LayoutDocumentInput } from '@/shared';
import type { ImportAnswer, VersionRow } from '@/shared/api/layouts';

type TestServer = Awaited<ReturnType<typeof testServer>>;
type Headers = Record<string, string>;

/** A sound document of an invented board; `board` replaces some of what names it. */
export const buildDocument = (board: Partial<LayoutDocumentInput['board']> = {}): LayoutDocumentInput => {
  const [first] = demoBoards;
  if (!first) throw new Error('there are no demo boards');
  return { ...first.document, board: { ...first.document.board, ...board } };
};

/** Sends a document as `author` and gives the version; fails the test if it is not taken. */
export const sendLayout = async (
  { app }: TestServer,
  author: Headers,
  document: LayoutDocumentInput = buildDocument(),
): Promise<VersionRow> => {
  const answer = await request(app).post('/api/v1/layouts').set(author).send(document).expect(201);
  return (answer.body as ImportAnswer).version;
};

/** An act of a moderator on a version as he has seen it. */
export const act = (
  { app }: TestServer,
  moderator: Headers,
  { version, name, remarks }: { version: VersionRow; name: 'publish' | 'return' | 'reject'; remarks?: string },
) =>
  request(app)
    .post(`/api/v1/reviews/${version.id}/${name}`)
    .set({ ...moderator, 'If-Match': `"${version.change}"` })
    .send(remarks === undefined ? undefined : { remarks });

/** Sends a document and has a moderator publish it. */
export const publishLayout = async (server: TestServer, document: LayoutDocumentInput): Promise<VersionRow> => {
  const version = await sendLayout(server, await authorization(server.platform, 'contributor'), document);
  const moderator = await authorization(server.platform, 'moderator');
  const answer = await act(server, moderator, { version, name: 'publish' }).expect(200);
  return answer.body as VersionRow;
};
