import request from 'supertest';
import { testServer } from '../support/platform';

it('one caller is stopped after so many requests a minute, with a problem document', async () => {
  const server = await testServer({ RATE_LIMIT_PER_MINUTE: '3' });
  const health = () => request(server.app).get('/api/v1/health');
  for (let sent = 0; sent < 3; sent++) await health().expect(200);
  const stopped = await health().expect(429);
  expect(stopped.body.code).toBe('too-many-requests');
  expect(Number(stopped.headers['retry-after'])).toBeGreaterThan(0);
  await server.close();
});
