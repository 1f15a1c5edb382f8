import { screen, waitFor } from '@testing-library/react';
import { SignInScreen } from '@/components/features/account/sign-in-screen';
import { sessionQuery } from '@/components/api/session';
import { buildPerson } from '@/tests/ui/support/person';
import { renderPage } from '@/tests/ui/support/render';
import { routes } from '@/tests/ui/support/router';
import { fakeServer, problem } from '@/tests/ui/support/server';

jest.mock('expo-router', () => jest.requireActual('@/tests/ui/support/router').routerDouble());

beforeEach(() => {
  Object.assign(routes, { params: {}, replaced: [] });
});

const email = () => screen.getByRole('textbox', { name: 'E-mail address' });
const password = () => screen.getByLabelText('Password');
const button = () => screen.getByRole('button', { name: 'Sign in' });

const answer = { status: 201, body: { person: buildPerson(), accessExpiresAt: '2025-03-04T10:15:00.000Z' } };

test('an empty form says what is missing under each field and goes to the first', async () => {
  const { calls } = fakeServer({});
  const { user } = renderPage(<SignInScreen />);
  await user.click(button());
  await waitFor(() => expect(email()).toHaveFocus());
  expect(email()).toHaveAccessibleDescription('Write your e-mail address.');
  expect(password()).toHaveAccessibleDescription('Write your password.');
  expect(calls).toEqual([]);
});

test('signing in with Enter leads to the page that was asked for', async () => {
  fakeServer({ 'POST /sessions': answer });
  routes.params = { next: '/boards/tarnvall-t64' };
  const { user, queryClient } = renderPage(<SignInScreen />);
  await user.type(email(), 'marit@bench.example');
  await user.type(password(), 'a long sentence{Enter}');
  await waitFor(() => expect(routes.replaced).toEqual(['/boards/tarnvall-t64']));
  expect(queryClient.getQueryData(sessionQuery.queryKey)).toMatchObject({ name: 'Marit Osei' });
});

test.each(['//elsewhere.example', 'https://elsewhere.example', '/\\elsewhere.example'])(
  'a link that asks to go on to %s leads to the look-up instead',
  async (next) => {
    fakeServer({ 'POST /sessions': answer });
    routes.params = { next };
    const { user } = renderPage(<SignInScreen />);
    await user.type(email(), 'marit@bench.example');
    await user.type(password(), 'a long sentence{Enter}');
    await waitFor(() => expect(routes.replaced).toEqual(['/']));
  },
);

test('a refusal is read out, does not say which of the two is wrong, and keeps what was typed', async () => {
  fakeServer({ 'POST /sessions': problem('sign-in-failed') });
  const { user } = renderPage(<SignInScreen />);
  await user.type(email(), 'marit@bench.example');
  await user.type(password(), 'not the sentence');
  await user.click(button());
  expect(await screen.findByRole('alert')).toHaveTextContent('Address and password do not match an account.');
  expect(email()).toHaveValue('marit@bench.example');
  expect(password()).toHaveValue('not the sentence');
});

test('too many attempts say how long to wait', async () => {
  fakeServer({ 'POST /sessions': { ...problem('too-many-attempts'), headers: { 'Retry-After': '300' } } });
  const { user } = renderPage(<SignInScreen />);
  await user.type(email(), 'marit@bench.example');
  await user.type(password(), 'x{Enter}');
  expect(await screen.findByRole('alert')).toHaveTextContent('Try again in 5 minutes.');
});

test('an address that is not confirmed yet gets the offer of another link', async () => {
  const { calls } = fakeServer({
    'POST /sessions': problem('email-not-confirmed'),
    'POST /accounts/resend-confirmation': { status: 202, body: { status: 'mail-sent' } },
  });
  const { user } = renderPage(<SignInScreen />);
  await user.type(email(), 'marit@bench.example');
  await user.type(password(), 'a long sentence{Enter}');
  await user.click(await screen.findByRole('button', { name: 'Send the link again' }));
  expect(await screen.findByText(/A new link is on its way/)).toBeVisible();
  expect(calls.at(-1)?.body).toEqual({ email: 'marit@bench.example' });
});

test('without a network the form says so and can be sent again', async () => {
  fakeServer({ 'POST /sessions': null });
  const { user } = renderPage(<SignInScreen />);
  await user.type(email(), 'marit@bench.example');
  await user.type(password(), 'a long sentence{Enter}');
  expect(await screen.findByRole('alert')).toHaveTextContent('The server cannot be reached.');
  fakeServer({ 'POST /sessions': answer });
  await user.click(button());
  await waitFor(() => expect(routes.replaced).toEqual(['/']));
});

test('a password can be shown and hidden again', async () => {
  fakeServer({});
  const { user } = renderPage(<SignInScreen />);
  expect(password()).toHaveAttribute('type', 'password');
  await user.click(screen.getByRole('button', { name: 'Show password' }));
  expect(password()).not.toHaveAttribute('type', 'password');
});
