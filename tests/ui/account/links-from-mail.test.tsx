import { screen } from '@testing-library/react';
import { ConfirmScreen } from '@/components/features/account/confirm-screen';
import { ResetScreen } from '@/components/features/account/reset-screen';
import { renderPage } from '@/tests/ui/support/render';
import { routes } from '@/tests/ui/support/router';
import { fakeServer, problem } from '@/tests/ui/support/server';

jest.mock('expo-router', () => jest.requireActual('@/tests/ui/support/router').routerDouble());

const token = 'a-token-that-is-long-enough-to-be-one';

beforeEach(() => {
  routes.params = { token };
});

test('opening the link does not confirm yet: mail filters open links too', () => {
  const { calls } = fakeServer({});
  renderPage(<ConfirmScreen />);
  expect(screen.getByRole('button', { name: 'Confirm the address' })).toBeVisible();
  expect(calls).toEqual([]);
});

test('one press confirms the address', async () => {
  const { calls } = fakeServer({ 'POST /accounts/confirm': { status: 204 } });
  const { user } = renderPage(<ConfirmScreen />);
  await user.click(screen.getByRole('button', { name: 'Confirm the address' }));
  expect(await screen.findByText('Your address is confirmed.')).toBeVisible();
  expect(calls[0]?.body).toEqual({ token });
});

test('a link that was used or has expired offers a new one', async () => {
  fakeServer({ 'POST /accounts/confirm': problem('link-invalid') });
  const { user } = renderPage(<ConfirmScreen />);
  await user.click(screen.getByRole('button', { name: 'Confirm the address' }));
  expect(await screen.findByRole('alert')).toHaveTextContent('This link does not work.');
  expect(screen.getByRole('button', { name: 'Send a new link' })).toBeVisible();
});

test('a link whose token was cut off offers a new one at once', () => {
  routes.params = {};
  renderPage(<ConfirmScreen />);
  expect(screen.getByRole('button', { name: 'Send a new link' })).toBeVisible();
});

test('asking for a reset says the same for every address', async () => {
  routes.params = {};
  fakeServer({ 'POST /password-resets': { status: 202, body: { status: 'mail-sent' } } });
  const { user } = renderPage(<ResetScreen />);
  await user.type(screen.getByLabelText('E-mail address'), 'nobody@bench.example{Enter}');
  expect(await screen.findByText(/can be used, a mail is on its way/)).toBeVisible();
});

test('the link of a reset lets a new password be chosen', async () => {
  const { calls } = fakeServer({ 'POST /password-resets/complete': { status: 204 } });
  const { user } = renderPage(<ResetScreen />);
  await user.type(screen.getByLabelText('New password', { selector: 'input' }), 'a sentence to keep{Enter}');
  expect(await screen.findByText('The new password holds from now on.')).toBeVisible();
  expect(calls[0]?.body).toEqual({ token, password: 'a sentence to keep' });
});

test('a reset link that no longer works offers a new one', async () => {
  fakeServer({ 'POST /password-resets/complete': problem('link-invalid') });
  const { user } = renderPage(<ResetScreen />);
  await user.type(screen.getByLabelText('New password', { selector: 'input' }), 'a sentence to keep{Enter}');
  expect(await screen.findByRole('button', { name: 'Send the link' })).toBeVisible();
});
