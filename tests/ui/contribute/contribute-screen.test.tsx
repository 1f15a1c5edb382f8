import { configure, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { rememberSignedIn } from '@/components/api/session';
import { ContributeScreen } from '@/components/features/contribute/contribute-screen';
import { buildVersion, cardOf, demoDocument, publishedOf } from '@/tests/ui/support/boards';
import { buildPerson } from '@/tests/ui/support/person';
import { renderPage } from '@/tests/ui/support/render';
import { fakeServer, problem } from '@/tests/ui/support/server';
import type { Role } from '@/shared/standing';
import { address } from '../diagnose/live-router';

jest.mock('expo-router', () =>
  jest.requireActual<typeof import('../diagnose/live-router')>('../diagnose/live-router').liveRouter(),
);
// Whether each of a thousand nodes is hidden takes jsdom most of a test's time; nothing here is.
configure({ defaultHidden: true, asyncUtilTimeout: 5000 });

const slug = 'tarnvall-t-64-rev-b';
const loom = demoDocument(slug);
const text = JSON.stringify(loom, null, 2);
const me = (role: Role) => ({ status: 200, body: { person: buildPerson({ role }) } });
const list = (...items: object[]) => ({ status: 200, body: { items, nextCursor: null } });

const show = (answers: Parameters<typeof fakeServer>[0] = {}, params = {}) => {
  rememberSignedIn(true);
  address.start(params);
  const server = fakeServer({
    'GET /me': me('contributor'),
    'GET /layouts': list(cardOf(slug)),
    [`GET /layouts/${slug}`]: publishedOf(slug),
    'GET /me/layout-versions': list(),
    ...answers,
  });
  return { ...renderPage(<ContributeScreen />), ...server };
};

const field = () => screen.findByLabelText<HTMLTextAreaElement>('Layout document, JSON');
const paste = async (value: string) => fireEvent.change(await field(), { target: { value } });
const send = () => screen.getByRole('button', { name: 'Send to the moderators' });

test('a guest is told what it is for, and asked to sign in', async () => {
  rememberSignedIn(false);
  address.start({});
  fakeServer({});
  renderPage(<ContributeScreen />);
  expect(await screen.findByRole('heading', { name: 'Add a board' })).toBeVisible();
  expect(screen.getByRole('link', { name: 'Sign in' })).toHaveAttribute('href', '/sign-in?next=%2Fcontribute');
  expect(screen.getByRole('link', { name: 'JSON Schema' })).toHaveAttribute('href', '/api/v1/layout-schema');
});

test('a technician is shown how to become contributor', async () => {
  show({ 'GET /me': me('technician'), 'GET /me/role-request': { status: 200, body: { request: null } } });
  expect(await screen.findByRole('button', { name: 'Ask to become contributor' })).toBeVisible();
  expect(screen.queryByLabelText('Layout document, JSON')).toBeNull();
});

test('a sound document is drawn, can be tried, and is sent as it was written', async () => {
  const { user, calls } = show({
    'POST /layouts': { status: 201, body: { version: buildVersion(slug), problems: [] } },
  });
  await paste(text);
  expect(await screen.findByText('No problem found.')).toBeVisible();
  await user.type(screen.getByLabelText('What does this code mean?'), 'C5');
  expect(screen.getByText('double line: named by the code')).toBeVisible();
  await user.click(send());
  expect(await screen.findByText('Version 2 is with the moderators.')).toBeVisible();
  expect(calls.find(({ method }) => method === 'POST')?.body).toEqual(loom);
  expect(await field()).toHaveValue('');
});

test('every problem is told in words with its line, and the way there selects it', async () => {
  const { user } = show();
  const wrong = JSON.stringify({ ...loom, examples: [{ format: 'lamp', text: 'Z9', sockets: ['U99'] }] }, null, 2);
  await paste(wrong);
  const problems = within(await screen.findByRole('list', { name: 'Problems' })).getAllByRole('listitem');
  expect(problems).toHaveLength(1);
  expect(problems[0]).toHaveTextContent('Error: There is no socket U99.');
  expect(send()).toBeDisabled();
  const area = await field();
  area.scrollIntoView = jest.fn();
  await user.click(screen.getByRole('button', { name: /^Line \d+, show it: There is no socket U99\./ }));
  expect(area).toHaveFocus();
  expect(area.value.slice(area.selectionStart, area.selectionEnd)).toBe('"U99"');
});

test('a text that is no JSON is told so, with its line', async () => {
  show();
  await paste('{\n  "format": "rowcall.layout/1",,\n}');
  expect(await screen.findByRole('button', { name: /^Line 2, show it/ })).toBeVisible();
  expect(screen.getByText('There is no sketch yet.')).toBeVisible();
});

test('a file of fifty megabytes is refused without being read, and one that fits fills the field', async () => {
  const { user } = show();
  await field();
  const picker = screen.getByLabelText('Layout document as a file');
  const huge = new File(['{}'], 'huge.json', { type: 'application/json' });
  Object.defineProperty(huge, 'size', { value: 50_000_000 });
  await user.upload(picker, huge);
  expect(await screen.findByRole('alert')).toHaveTextContent('This is 50.0 MB; a layout document has at most 2.0 MB.');
  expect(await field()).toHaveValue('');
  const sound = new File([`\uFEFF${text}`], 'loom.json', { type: 'application/json' });
  Object.defineProperty(sound, 'text', { value: async () => `\uFEFF${text}` });
  await user.upload(picker, sound);
  await waitFor(async () => expect(await field()).toHaveValue(text));
  expect(screen.queryByRole('alert')).toBeNull();
});

test('a link that names a board begins with its layout', async () => {
  show({}, { from: slug });
  await waitFor(async () => expect((await field()).value).toContain('"T-64 loom controller"'));
});

test('another board in the field can be taken back', async () => {
  const { user } = show();
  await paste('{ "mine": true }');
  await screen.findByRole('option', { name: 'Tarnvall Textil T-64 loom controller, rev B' });
  await user.selectOptions(screen.getByLabelText('Start from a published board'), slug);
  await waitFor(async () => expect((await field()).value).toContain('"T-64 loom controller"'));
  await user.click(screen.getByRole('button', { name: 'Put the old text back' }));
  expect(await field()).toHaveValue('{ "mine": true }');
});

test('a returned version shows the moderator’s words, and is put right in its place', async () => {
  const returned = buildVersion(slug, {
    state: 'returned',
    remarks: 'Bank D has no pull test.',
    moderator: { id: 'm', name: 'Nerys' },
    change: 7,
  });
  const { user, calls } = show({
    'GET /me/layout-versions': list(returned),
    [`GET /layouts/${slug}/versions/2`]: { status: 200, body: { ...returned, document: loom } },
    [`PUT /layouts/${slug}/versions/2`]: { status: 200, body: { version: buildVersion(slug), problems: [] } },
  });
  expect(await screen.findByText('Bank D has no pull test.', { exact: false })).toBeVisible();
  await user.click(screen.getByRole('button', { name: /^Put it right/ }));
  expect(await screen.findByText('It takes the place of version 2, which was sent before.')).toBeVisible();
  await screen.findByText('No problem found.');
  await user.click(screen.getByRole('button', { name: 'Send version 2 again' }));
  await screen.findByText('Version 2 is with the moderators.');
  expect(calls.find(({ method }) => method === 'PUT')?.headers['If-Match']).toBe('"7"');
});

test('what the server refuses is said, and the text stays', async () => {
  const { user } = show({
    'POST /layouts': problem('layout-invalid', {
      problems: [{ pointer: '/board/name', severity: 'error', code: 'x', message: 'This name is taken.' }],
    }),
  });
  await paste(text);
  await screen.findByText('No problem found.');
  await user.click(send());
  expect(await screen.findByRole('alert')).toHaveTextContent('/board/name: This name is taken.');
  expect(await field()).toHaveValue(text);
});
