import { request } from '@/components/api/client';
import { ApiProblem, NetworkFailure, problemWords } from '@/components/api/problem';
import { fakeServer, problem } from '@/tests/ui/support/server';

test('a query goes into the address without what is undefined, and a body goes as JSON', async () => {
  const { calls } = fakeServer({
    'GET /people': { status: 200, body: {} },
    'PATCH /people/1': { status: 200, body: {} },
  });
  await request('/people', { query: { search: 'a b&c', role: undefined, limit: 5 } });
  await request('/people/1', { method: 'PATCH', body: { role: 'moderator' }, version: 3 });
  expect(calls[0]?.path).toBe('/people?search=a+b%26c&limit=5');
  expect(calls[1]?.body).toEqual({ role: 'moderator' });
  expect(calls[1]?.headers['If-Match']).toBe('"3"');
});

test('a problem document becomes a problem with its code, words and fields', async () => {
  const fields = [{ in: 'body', pointer: '/email', code: 'invalid', message: 'Not an address.' }];
  fakeServer({ 'POST /accounts': problem('invalid-request', { detail: 'One field.', fields }) });
  const error = await request('/accounts', { method: 'POST', body: {} }).catch((caught: unknown) => caught);
  expect(error).toBeInstanceOf(ApiProblem);
  expect(error).toMatchObject({ code: 'invalid-request', status: 400, message: 'One field.', fields });
});

test('how long to wait is taken from the server', async () => {
  fakeServer({ 'POST /x': { ...problem('too-many-attempts'), headers: { 'Retry-After': '90' } } });
  await expect(request('/x', { method: 'POST' })).rejects.toMatchObject({ retryAfter: 90 });
});

test('no network, and a page that is not from the server, are failures of the network', async () => {
  fakeServer({ 'GET /gone': null, 'GET /portal': { status: 200, headers: { 'Content-Type': 'text/html' } } });
  await expect(request('/gone')).rejects.toBeInstanceOf(NetworkFailure);
  await expect(request('/portal')).rejects.toBeInstanceOf(NetworkFailure);
});

test('an answer without a body gives undefined', async () => {
  fakeServer({ 'DELETE /sessions/current': { status: 204 } });
  await expect(request('/sessions/current', { method: 'DELETE' })).resolves.toBeUndefined();
});

test('an access token that ran out is renewed once for all that wait, and each request is sent again', async () => {
  let renewed = false;
  const { calls } = fakeServer({
    'GET /a': () => (renewed ? { status: 200, body: 'a' } : problem('token-expired')),
    'GET /b': () => (renewed ? { status: 200, body: 'b' } : problem('sign-in-required')),
    'POST /sessions/refresh': () => {
      renewed = true;
      return { status: 200, body: { person: { id: '1' }, accessExpiresAt: null } };
    },
  });
  await expect(Promise.all([request('/a'), request('/b')])).resolves.toEqual(['a', 'b']);
  expect(calls.filter(({ path }) => path === '/sessions/refresh')).toHaveLength(1);
});

test('where the session has ended the first refusal stands, and nothing is sent a third time', async () => {
  const { calls } = fakeServer({
    'GET /a': problem('sign-in-required'),
    'POST /sessions/refresh': { status: 200, body: { person: null, accessExpiresAt: null } },
  });
  await expect(request('/a')).rejects.toMatchObject({ code: 'sign-in-required' });
  expect(calls).toHaveLength(2);
});

test('a refusal that no renewal can mend is not tried again', async () => {
  const { calls } = fakeServer({ 'GET /a': problem('role-required') });
  await expect(request('/a')).rejects.toMatchObject({ code: 'role-required' });
  expect(calls).toHaveLength(1);
});

test('an error of unknown kind is put in words that tell nothing of its inside', () => {
  expect(problemWords(new Error('undefined is not a function'))).toBe('Something went wrong here. Try again.');
});
