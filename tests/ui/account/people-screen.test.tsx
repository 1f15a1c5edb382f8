import { screen, waitFor, within } from '@testing-library/react';
import { rememberSignedIn } from '@/components/api/session';
import { PeopleScreen } from '@/components/features/admin/people-screen';
import { buildPerson } from '@/tests/ui/support/person';
import { renderPage } from '@/tests/ui/support/render';
import { fakeServer, problem } from '@/tests/ui/support/server';

jest.mock('expo-router', () => jest.requireActual('@/tests/ui/support/router').routerDouble());

const row = (over = {}) => ({ ...buildPerson(), confirmed: true, version: 4, ...over });
const me = (role: string) => ({
  status: 200,
  body: { person: buildPerson({ id: 'me', name: 'Ada', role: role as 'owner' }) },
});
const list = (...items: object[]) => ({ status: 200, body: { items, nextCursor: null } });

beforeEach(() => rememberSignedIn(true));

test('a technician is told for whom the page is', async () => {
  const { calls } = fakeServer({ 'GET /me': me('technician') });
  renderPage(<PeopleScreen />);
  expect(await screen.findByText('This page is for moderators.')).toBeVisible();
  expect(calls.map(({ path }) => path)).toEqual(['/me']);
});

test('a moderator may not touch a moderator, nor his own role', async () => {
  fakeServer({
    'GET /me': me('moderator'),
    'GET /role-requests': list(),
    'GET /people': list(
      row({ id: 'me', name: 'Ada', role: 'moderator' }),
      row({ id: '2', name: 'Bo', role: 'moderator' }),
      row({ id: '3', name: 'Cy', role: 'technician' }),
    ),
  });
  renderPage(<PeopleScreen />);
  expect(await screen.findByRole('button', { name: 'Change the role of Cy' })).toBeVisible();
  expect(screen.getAllByRole('button', { name: /^Change the role/ })).toHaveLength(1);
});

test('a role is changed with the version that was seen, and the list shows the answer', async () => {
  const { calls } = fakeServer({
    'GET /me': me('owner'),
    'GET /role-requests': list(),
    'GET /people': list(row({ id: '3', name: 'Cy', role: 'technician' })),
    'PATCH /people/3': { status: 200, body: row({ id: '3', name: 'Cy', role: 'moderator', version: 5 }) },
  });
  const { user } = renderPage(<PeopleScreen />);
  await user.click(await screen.findByRole('button', { name: /^Change the role of Cy/ }));
  const dialog = await screen.findByRole('dialog', { name: 'Role of Cy' });
  expect(within(dialog).getByRole('button', { name: 'Set the role' })).toBeDisabled();
  await user.click(within(dialog).getByRole('radio', { name: 'moderator' }));
  await user.click(within(dialog).getByRole('button', { name: 'Set the role' }));
  expect(await screen.findByRole('row', { name: /^Cy .* moderator/ })).toBeInTheDocument();
  const change = calls.find(({ method }) => method === 'PATCH');
  expect(change?.body).toEqual({ role: 'moderator' });
  expect(change?.headers['If-Match']).toBe('"4"');
});

test('a change that somebody else overtook is refused in the dialog', async () => {
  fakeServer({
    'GET /me': me('owner'),
    'GET /role-requests': list(),
    'GET /people': list(row({ id: '3', name: 'Cy', role: 'technician' })),
    'PATCH /people/3': problem('version-conflict'),
  });
  const { user } = renderPage(<PeopleScreen />);
  await user.click(await screen.findByRole('button', { name: /^Change the role of Cy/ }));
  await user.click(await screen.findByRole('radio', { name: 'contributor' }));
  await user.click(screen.getByRole('button', { name: 'Set the role' }));
  expect(await screen.findByRole('alert')).toHaveTextContent('Somebody else changed this in the meantime.');
});

test('a request is granted, which is said, and the queue is asked again', async () => {
  let open = [
    {
      id: 'r1',
      person: { id: '3', name: 'Cy', role: 'technician' },
      reason: 'Lifts.',
      state: 'open',
      createdAt: '2025-03-04T10:00:00Z',
      decidedAt: null,
    },
  ];
  const { calls } = fakeServer({
    'GET /me': me('moderator'),
    'GET /people': list(),
    'GET /role-requests': () => list(...open),
    'PATCH /role-requests/r1': () => {
      const [request] = open;
      open = [];
      return { status: 200, body: { ...request, state: 'granted' } };
    },
  });
  const { user } = renderPage(<PeopleScreen />);
  await user.click(await screen.findByRole('button', { name: 'Grant, Cy' }));
  expect(await screen.findByText('Cy is a contributor now.')).toBeVisible();
  expect(await screen.findByText('Nobody is waiting.')).toBeVisible();
  expect(calls.find(({ method }) => method === 'PATCH')?.body).toEqual({ decision: 'granted' });
});

test('a search that finds nobody says so', async () => {
  fakeServer({ 'GET /me': me('moderator'), 'GET /role-requests': list(), 'GET /people': list() });
  renderPage(<PeopleScreen />);
  await waitFor(() => expect(screen.getByText('Nobody answers to that.')).toBeVisible());
});
