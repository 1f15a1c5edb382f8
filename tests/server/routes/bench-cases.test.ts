import request from 'supertest';
import { benchCases, entriesOf } from '../../lib/cases/bench-cases';
import { readingProblems } from '../../lib/cases/expect-reading';
import { testServer } from '../support/platform';
import { diagnosis } from '@/shared';

let server: Awaited<ReturnType<typeof testServer>>;

beforeAll(async () => {
  server = await testServer();
});
afterAll(() => server.close());

describe('the reading of a bench case, asked for by a script with the whole layout', () => {
  it.each(entriesOf(benchCases))('$title', async ({ of, runs }) => {
    const answer = await request(server.app).post('/api/v1/diagnoses').send({ layout: of.board, runs }).expect(200);
    expect(readingProblems(diagnosis.parse(answer.body), of.expect)).toEqual([]);
  });
});
