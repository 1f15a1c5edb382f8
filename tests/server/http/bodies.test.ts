import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { gzipSync } from 'node:zlib';
import request from 'supertest';
import { testServer } from '../support/platform';
import { limits } from '@/shared/limits';

let server: Awaited<ReturnType<typeof testServer>>;

beforeAll(async () => {
  server = await testServer();
});
afterAll(() => server.close());

const send = (body: string | Buffer, type = 'application/json') =>
  request(server.app).post('/api/v1/sessions').set('Content-Type', type).send(body);

describe('a body', () => {
  it('that is not JSON is told where it broke, without repeating it', async () => {
    const answer = await send('{"email":"a@rowcall.test","password":"hunter2 secret').expect(400);
    expect(answer.body.code).toBe('malformed-json');
    expect(answer.text).not.toContain('hunter2');
  });

  it('that is missing is told as a missing object', async () => {
    const answer = await request(server.app).post('/api/v1/sessions').expect(400);
    expect(answer.body.fields).toEqual([expect.objectContaining({ in: 'body', pointer: '' })]);
  });

  it('of another kind is refused', async () => {
    const answer = await send('email=a', 'text/plain').expect(415);
    expect(answer.body.code).toBe('unsupported-media-type');
  });

  it('larger than the limit is refused with the limit', async () => {
    const answer = await send(JSON.stringify({ email: 'x'.repeat(limits.bodyBytes) })).expect(413);
    expect(answer.body.detail).toContain('200,000');
  });

  it('that unpacks to more than the limit is refused', async () => {
    const packed = gzipSync(JSON.stringify({ email: 'x'.repeat(20_000_000) }));
    const answer = await request(server.app)
      .post('/api/v1/sessions')
      .set({ 'Content-Type': 'application/json', 'Content-Encoding': 'gzip' })
      .serialize(() => packed as unknown as string)
      .send({});
    expect(answer.body.code).toBe('body-too-large');
  });

  it.each(['[', '{"a":'])('of nothing but %s is refused before anything walks through it', async (piece) => {
    const answer = await send(piece.repeat(30_000)).expect(400);
    expect(answer.body.code).toBe('body-too-deep');
  });

  it('may hold brackets in its text', async () => {
    const answer = await send(JSON.stringify({ email: '['.repeat(100), password: '\\"{'.repeat(30) })).expect(400);
    expect(answer.body.code).toBe('invalid-request');
  });

  it('cannot bring fields in by the prototype', async () => {
    const answer = await send('{"email":"a@rowcall.test","password":"p","__proto__":{"bearer":true}}');
    expect(answer.body.code).not.toBe('internal');
    expect(({} as { bearer?: boolean }).bearer).toBeUndefined();
  });
});

describe('a body of 50 MB', () => {
  let listening: Server;

  beforeAll(async () => {
    listening = createServer(server.app);
    await new Promise<void>((resolve) => listening.listen(0, '127.0.0.1', resolve));
  });
  afterAll(() => new Promise((resolve) => listening.close(resolve)));

  it('is answered 413 over a real connection, and the server goes on', async () => {
    const { port } = listening.address() as AddressInfo;
    const address = `http://127.0.0.1:${port}/api/v1`;
    const answer = await fetch(`${address}/sessions`, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json' },
      body: Buffer.alloc(50_000_000, ' '),
    });
    expect(answer.status).toBe(413);
    expect(await answer.json()).toMatchObject({ code: 'body-too-large' });
    expect((await fetch(`${address}/health`)).status).toBe(200);
  });
});
