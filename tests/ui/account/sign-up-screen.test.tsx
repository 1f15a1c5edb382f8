import { screen, waitFor } from '@testing-library/react';
import { SignUpScreen } from '@/components/features/account/sign-up-screen';
import { renderPage } from '@/tests/ui/support/render';
import { fakeServer, problem } from '@/tests/ui/support/server';

jest.mock('expo-router', () => jest.requireActual('@/tests/ui/support/router').routerDouble());

const mailSent = { status: 202, body: { status: 'mail-sent' } };
const field = (name: string) => screen.getByLabelText(name);

async function fillIn(user: ReturnType<typeof renderPage>['user'], password = 'nine lives of a cat') {
  await user.type(field('Name'), 'Marit Osei');
  await user.type(field('E-mail address'), ' marit@bench.example ');
  await user.type(field('Password'), password);
  await user.click(screen.getByRole('button', { name: 'Make the account' }));
}

test('after sign-up the page asks to look in the mail, in words that fit a known address too', async () => {
  const { calls } = fakeServer({ 'POST /accounts': mailSent });
  const { user } = renderPage(<SignUpScreen />);
  await fillIn(user);
  expect(await screen.findByText(/If/)).toHaveTextContent(
    'If marit@bench.example can be used, a mail is on its way to it.',
  );
  expect(calls[0]?.body).toEqual({ name: 'Marit Osei', email: 'marit@bench.example', password: 'nine lives of a cat' });
});

test('changing the address leads back to the form with everything still in it', async () => {
  fakeServer({ 'POST /accounts': mailSent });
  const { user } = renderPage(<SignUpScreen />);
  await fillIn(user);
  await user.click(await screen.findByRole('button', { name: 'Change the address' }));
  expect(field('Name')).toHaveValue('Marit Osei');
});

test('a password that is too short is refused under its field before anything is sent', async () => {
  const { calls } = fakeServer({});
  const { user } = renderPage(<SignUpScreen />);
  await fillIn(user, 'short');
  await waitFor(() => expect(field('Password')).toHaveFocus());
  expect(field('Password')).toHaveAccessibleDescription(/^At least 10 characters\. /);
  expect(calls).toEqual([]);
});

test('a complaint goes away as soon as it is mended', async () => {
  fakeServer({});
  const { user } = renderPage(<SignUpScreen />);
  await fillIn(user, 'short');
  await waitFor(() => expect(field('Password')).toBeInvalid());
  await user.type(field('Password'), ' but long enough now');
  await waitFor(() => expect(field('Password')).toBeValid());
});

test('a field that the server refuses shows the words of the server under it', async () => {
  const fields = [{ in: 'body', pointer: '/name', code: 'custom', message: 'This name cannot be used.' }];
  fakeServer({ 'POST /accounts': problem('invalid-request', { fields }) });
  const { user } = renderPage(<SignUpScreen />);
  await fillIn(user);
  await waitFor(() => expect(field('Name')).toHaveFocus());
  expect(field('Name')).toHaveAccessibleDescription(/^This name cannot be used\./);
});
