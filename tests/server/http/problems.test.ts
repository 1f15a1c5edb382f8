import request from 'supertest';
import { testServer } from '../support/platform';

let server: Awaited<ReturnType<typeof testServer>>;

beforeAll(async () => {
  server = await testServer();
});
afterAll(() => server.close());

describe('every error is a problem document', () => {
  it('says that nothing is at an unknown address, with the request id', async () => {
    const answer = await request(server.app).get('/api/v1/nowhere').expect(404);
    expect(answer.headers['content-type']).toMatch('application/problem+json');
    expect(answer.body).toMatchObject({ status: 404, code: 'not-found', requestId: answer.headers['x-request-id'] });
  });

  it('names what a known address takes when the method is another', async () => {
    const answer = await request(server.app).post('/api/v1/health').expect(405);
    expect(answer.headers.allow).toBe('GET, HEAD');
    expect(answer.body.code).toBe('method-not-allowed');
  });

  it('lists the field that is wrong', async () => {
    const answer = await request(server.app).get('/api/v1/problems/no-such-code').expect(400);
    expect(answer.body.fields).toEqual([expect.objectContaining({ in: 'params', pointer: '/code' })]);
  });

  it('reads an address with broken percent signs as malformed', async () => {
    const answer = await request(server.app).get('/api/v1/problems/%E0%A4%A').expect(400);
    expect(answer.body.code).toBe('malformed-address');
  });
});

describe('health', () => {
  it('is ready while the database answers', async () => {
    await request(server.app).get('/api/v1/health').expect(200, { status: 'ready' });
  });
});
