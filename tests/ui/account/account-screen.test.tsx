import { screen, waitFor } from '@testing-library/react';
import { rememberSignedIn } from '@/components/api/session';
import { AccountScreen } from '@/components/features/account/account-screen';
import { buildPerson } from '@/tests/ui/support/person';
import { renderPage } from '@/tests/ui/support/render';
import { fakeServer, problem } from '@/tests/ui/support/server';

jest.mock('expo-router', () => jest.requireActual('@/tests/ui/support/router').routerDouble());

const me = (over = {}) => ({ status: 200, body: { person: buildPerson(over) } });
const noRequest = { status: 200, body: { request: null } };

test('a guest is shown the way to sign in and back', async () => {
  fakeServer({});
  renderPage(<AccountScreen />);
  expect(await screen.findByRole('link', { name: 'Sign in' })).toHaveAttribute('href', '/sign-in?next=%2Faccount');
});

test('without a network the page says where the account is and can be tried again', async () => {
  rememberSignedIn(true);
  fakeServer({ 'GET /me': null });
  const { user } = renderPage(<AccountScreen />);
  const retry = await screen.findByRole('button', { name: 'Try again' });
  fakeServer({ 'GET /me': me(), 'GET /me/role-request': noRequest });
  await user.click(retry);
  expect(await screen.findByText('Marit Osei')).toBeVisible();
});

test('a wrong present password is refused under its field', async () => {
  rememberSignedIn(true);
  fakeServer({ 'GET /me': me({ role: 'contributor' }), 'PUT /me/password': problem('password-wrong') });
  const { user } = renderPage(<AccountScreen />);
  await user.type(await screen.findByLabelText('Present password'), 'not it');
  await user.type(screen.getByLabelText('New password'), 'a sentence to keep{Enter}');
  await waitFor(() => expect(screen.getByLabelText('Present password')).toHaveFocus());
  expect(screen.getByLabelText('Present password')).toHaveAccessibleDescription('The present password is not right.');
  expect(screen.getByLabelText('New password')).toHaveValue('a sentence to keep');
});

test('a changed password empties the form and says so', async () => {
  rememberSignedIn(true);
  fakeServer({ 'GET /me': me({ role: 'contributor' }), 'PUT /me/password': { status: 204 } });
  const { user } = renderPage(<AccountScreen />);
  await user.type(await screen.findByLabelText('Present password'), 'the old one');
  await user.type(screen.getByLabelText('New password'), 'a sentence to keep{Enter}');
  expect(await screen.findByText(/The new password holds from now on/)).toBeVisible();
  expect(screen.getByLabelText('New password')).toHaveValue('');
});

test('a technician asks to become contributor and then sees that the request waits', async () => {
  rememberSignedIn(true);
  const row = { id: '1', person: { id: '1', name: 'Marit Osei', role: 'technician' }, state: 'open' };
  const { calls } = fakeServer({
    'GET /me': me(),
    'GET /me/role-request': noRequest,
    'POST /role-requests': { status: 201, body: row },
  });
  const { user } = renderPage(<AccountScreen />);
  await user.click(await screen.findByRole('button', { name: 'Ask to become contributor' }));
  await user.type(screen.getByLabelText('Which boards do you know?'), 'Loom controllers.');
  await user.click(screen.getByRole('button', { name: 'Send the request' }));
  expect(await screen.findByText('Your request is with the moderators.')).toBeVisible();
  expect(calls.at(-1)?.body).toEqual({ reason: 'Loom controllers.' });
});

test('a contributor is not asked to become one', async () => {
  rememberSignedIn(true);
  fakeServer({ 'GET /me': me({ role: 'contributor' }) });
  renderPage(<AccountScreen />);
  expect(await screen.findByText('contributor')).toBeVisible();
  expect(screen.queryByRole('button', { name: /become contributor/ })).not.toBeInTheDocument();
});

test('signing out forgets the person here', async () => {
  rememberSignedIn(true);
  fakeServer({ 'GET /me': me({ role: 'contributor' }), 'DELETE /sessions/current': { status: 204 } });
  const { user } = renderPage(<AccountScreen />);
  await user.click(await screen.findByRole('button', { name: 'Sign out' }));
  expect(await screen.findByText('Sign in to see this page.')).toBeVisible();
  expect(screen.queryByText('Marit Osei')).not.toBeInTheDocument();
});
