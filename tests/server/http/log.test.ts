import { Writable } from 'node:stream';
import express from 'express';
import request from 'supertest';
import { buildConfig } from '../support/config';
import { AppError } from '@/server/errors';
import { errorHandler } from '@/server/http/error-handler';
import { createLogger, loggableUrl, requestLog } from '@/server/http/log';

const lines: string[] = [];
const stream = new Writable({
  write: (chunk: Buffer, _encoding, done) => {
    lines.push(chunk.toString());
    done();
  },
});
const logger = createLogger({ ...buildConfig(), logLevel: 'info' }, stream);

const app = express();
app.use(requestLog(logger));
app.get('/fails', () => {
  throw new Error('the password of the database is hunter2');
});
app.get('/refuses', () => {
  throw new AppError('conflict');
});
app.use(errorHandler(logger));

beforeEach(() => {
  lines.length = 0;
});

describe('the log', () => {
  it('has no cookie, no bearer token and no token of a link', async () => {
    await request(app)
      .get('/refuses?token=secret-of-a-link&page=2')
      .set({ Cookie: 'rowcall_access=secret-cookie', Authorization: 'Bearer secret-bearer' });
    expect(lines.join()).toContain('/refuses?token=[redacted]&page=2');
    expect(lines.join()).not.toMatch(/secret-/);
  });

  it('has no password of an object that is logged', () => {
    logger.info({ body: { email: 'a@rowcall.test', password: 'hunter2' }, token: 'hunter3' }, 'noted');
    expect(lines.join()).toContain('a@rowcall.test');
    expect(lines.join()).not.toMatch(/hunter/);
  });

  it('has the cause of an unknown error, which the answer has not', async () => {
    const answer = await request(app).get('/fails').expect(500);
    expect(answer.body).toMatchObject({ code: 'internal', requestId: answer.headers['x-request-id'] });
    expect(answer.text).not.toContain('hunter2');
    const noted = lines.find((line) => line.includes('request failed')) ?? '';
    expect(noted).toContain('the password of the database');
    expect(noted).toContain(answer.body.requestId);
  });

  it('keeps the request id of a proxy, and not one that is made to break the log', async () => {
    const id = 'abcdef-0123456789';
    const kept = await request(app).get('/refuses').set('X-Request-Id', id);
    expect(kept.body.requestId).toBe(id);
    const other = await request(app).get('/refuses').set('X-Request-Id', 'a b{"level":60}');
    expect(other.body.requestId).not.toContain('level');
  });
});

describe('loggableUrl', () => {
  it('hides tokens wherever they stand in the query', () => {
    expect(loggableUrl('/confirm?token=abc')).toBe('/confirm?token=[redacted]');
    expect(loggableUrl('/reset?a=1&TOKEN=abc&b=2')).toBe('/reset?a=1&TOKEN=[redacted]&b=2');
    expect(loggableUrl('/boards?q=token')).toBe('/boards?q=token');
  });
});
