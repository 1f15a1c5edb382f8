import { QueryClientProvider } from '@tanstack/react-query';
import { renderHook, waitFor } from '@testing-library/react';
import type { ReactNode } from 'react';
import { createQueryClient } from '@/components/api/query-client';
import { rememberSignedIn, useSession } from '@/components/api/session';
import { buildPerson } from '@/tests/ui/support/person';
import { fakeServer, problem } from '@/tests/ui/support/server';

function showSession() {
  const client = createQueryClient();
  const wrapper = ({ children }: { children: ReactNode }) => (
    <QueryClientProvider client={client}>{children}</QueryClientProvider>
  );
  return { client, ...renderHook(useSession, { wrapper }) };
}

test('a guest who never signed in here is a guest without asking the server', async () => {
  const { calls } = fakeServer({});
  const { result } = showSession();
  await waitFor(() => expect(result.current.state).toBe('guest'));
  expect(calls).toEqual([]);
});

test.each([
  ['technician', { mayContribute: false, mayReview: false }],
  ['contributor', { mayContribute: true, mayReview: false }],
  ['moderator', { mayContribute: true, mayReview: true }],
  ['owner', { mayContribute: true, mayReview: true }],
] as const)('a %s may do what the role includes', async (role, may) => {
  rememberSignedIn(true);
  fakeServer({ 'GET /me': { status: 200, body: { person: buildPerson({ role }) } } });
  const { result } = showSession();
  await waitFor(() => expect(result.current.state).toBe('signed-in'));
  expect(result.current).toMatchObject({ standing: role, ...may });
});

test('a session whose access token ran out while the page was closed is taken up again', async () => {
  rememberSignedIn(true);
  fakeServer({
    'GET /me': { status: 200, body: { person: null } },
    'POST /sessions/refresh': { status: 200, body: { person: buildPerson(), accessExpiresAt: null } },
  });
  const { result } = showSession();
  await waitFor(() => expect(result.current.state).toBe('signed-in'));
});

test('a session that has ended is forgotten, so that the next visit does not ask', async () => {
  rememberSignedIn(true);
  fakeServer({
    'GET /me': { status: 200, body: { person: null } },
    'POST /sessions/refresh': problem('session-ended'),
  });
  const { result } = showSession();
  await waitFor(() => expect(result.current.state).toBe('guest'));
  expect(window.localStorage).toHaveLength(0);
});

test('without a network somebody who signed in before is treated as a guest, and is not forgotten', async () => {
  rememberSignedIn(true);
  fakeServer({ 'GET /me': null });
  const { result } = showSession();
  await waitFor(() => expect(result.current.state).toBe('unreachable'));
  expect(result.current).toMatchObject({ standing: 'guest', signedIn: false });
  expect(window.localStorage).toHaveLength(1);
});
