import { configure, screen, waitFor, within } from '@testing-library/react';
import { rememberSignedIn } from '@/components/api/session';
import { ReviewListScreen } from '@/components/features/review/review-list-screen';
import { ReviewScreen } from '@/components/features/review/review-screen';
import type { LayoutDocument } from '@/shared';
import { buildReview, buildVersion, demoDocument } from '@/tests/ui/support/boards';
import { buildPerson } from '@/tests/ui/support/person';
import { renderPage } from '@/tests/ui/support/render';
import { fakeServer, problem } from '@/tests/ui/support/server';
import { address } from '../diagnose/live-router';

jest.mock('expo-router', () =>
  jest.requireActual<typeof import('../diagnose/live-router')>('../diagnose/live-router').liveRouter(),
);
// Whether each of a thousand nodes is hidden takes jsdom most of a test's time; nothing here is.
configure({ defaultHidden: true, asyncUtilTimeout: 5000 });

const slug = 'tarnvall-t-64-rev-b';
const published = demoDocument(slug);
const me = (role: 'technician' | 'moderator') => ({
  status: 200,
  body: { person: buildPerson({ id: 'me', name: 'Nerys', role }) },
});

/** The published board with the chips of two sockets the other way round. */
function exchanged(a: string, b: string): LayoutDocument {
  const holdsOf = (label: string) => published.sockets.find((socket) => socket.label === label)!.holds;
  const sockets = published.sockets.map((socket) =>
    socket.label === a || socket.label === b ? { ...socket, holds: holdsOf(socket.label === a ? b : a) } : socket,
  );
  return { ...published, sockets };
}

const review = buildReview(slug, { document: exchanged('U36', 'U37') });
const id = review.id;

const open = (answers: Parameters<typeof fakeServer>[0] = {}) => {
  rememberSignedIn(true);
  address.start({ id });
  const server = fakeServer({
    'GET /me': me('moderator'),
    [`GET /reviews/${id}`]: { status: 200, body: review },
    [`GET /layouts/${slug}/versions/1`]: {
      status: 200,
      body: { ...buildVersion(slug, { number: 1, state: 'published', current: true }), document: published },
    },
    ...answers,
  });
  return { ...renderPage(<ReviewScreen />), ...server };
};

const lines = (name: string) =>
  within(screen.getByRole('list', { name }))
    .getAllByRole('listitem')
    .map((line) => line.textContent);

describe('the list', () => {
  const list = (...items: object[]) => ({ status: 200, body: { items, nextCursor: null } });
  const show = (answers: Parameters<typeof fakeServer>[0]) => {
    rememberSignedIn(true);
    fakeServer({ 'GET /me': me('moderator'), ...answers });
    return renderPage(<ReviewListScreen />);
  };

  test('says for whom it is', async () => {
    show({ 'GET /me': me('technician') });
    expect(await screen.findByText('This page is for moderators.')).toBeVisible();
  });

  test('has what waits, with what it would take the place of', async () => {
    const { document: _, problemList: __, ...row } = review;
    show({ 'GET /reviews': list(row, { ...row, id: 'n', own: true, publishedNumber: null, problems: 3 }) });
    const link = await screen.findAllByRole('link', { name: 'T-64 loom controller, rev B, version 2' });
    expect(link[0]).toHaveAttribute('href', `/review/${id}`);
    const rows = screen
      .getAllByRole('row')
      .slice(1)
      .map((one) => one.textContent);
    expect(rows[0]).toContain('version 1Ivo Marschak');
    expect(rows[1]).toMatch(/new boardyou.*3$/);
  });

  test('says that nothing waits', async () => {
    show({ 'GET /reviews': list() });
    expect(await screen.findByText('Nothing waits.')).toBeVisible();
  });
});

test('the codes that name another socket come first, in words', async () => {
  open();
  expect(
    await screen.findByRole('heading', { level: 1, name: 'T-64 loom controller, rev B, version 2 beside 1' }),
  ).toBeVisible();
  await screen.findByText('What a code means now');
  expect(lines('Codes that name another socket')).toEqual([
    'D2Lamp code: named U36, now names U37',
    'D3Lamp code: named U37, now names U36',
    'C000 wrote 00 read 04Monitor line: named U36, now names U37',
    'C000 wrote 00 read 08Monitor line: named U37, now names U36',
  ]);
  expect(lines('Lanes that other sockets hold')).toHaveLength(2);
  expect(lines('The same')[0]).toBe('30 lanesIn the same sockets in version 2');
  expect(screen.getByRole('option', { name: /^U36, bit 3 of bank D, was bit 2/ })).toBeInTheDocument();
});

test('an example that does not come out and a problem of the check are in sight', async () => {
  open({
    [`GET /reviews/${id}`]: {
      status: 200,
      body: {
        ...review,
        document: { ...review.document, examples: [{ format: 'lamp', text: 'D2', sockets: ['U36'] }] },
        problemList: [{ pointer: '/sockets/3', severity: 'warning', code: 'x', message: 'U13 lies under U14.' }],
      },
    },
  });
  expect(await screen.findByText('Names U37, not U36.', { exact: false })).toBeVisible();
  expect(lines('Problems')).toEqual(['Look again: U13 lies under U14./sockets/3']);
});

test('publishing asks once more, and sends the version that was seen', async () => {
  const { user, calls } = open({
    [`POST /reviews/${id}/publish`]: { status: 200, body: buildVersion(slug, { state: 'published', current: true }) },
  });
  await user.click(await screen.findByRole('button', { name: 'Publish version 2' }));
  const dialog = await screen.findByRole('dialog', { name: 'Publish version 2?' });
  expect(within(dialog).getByText(/in place of version 1/)).toBeInTheDocument();
  await user.click(within(dialog).getByRole('button', { name: 'Publish' }));
  await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
  const sent = calls.find(({ method }) => method === 'POST');
  expect(sent?.headers['If-Match']).toBe('"4"');
  expect(sent?.body).toBeUndefined();
});

test('nothing is returned without words', async () => {
  const { user, calls } = open({
    [`POST /reviews/${id}/return`]: { status: 200, body: buildVersion(slug, { state: 'returned' }) },
  });
  await user.click(await screen.findByRole('button', { name: 'Return with words' }));
  await user.click(await screen.findByRole('button', { name: 'Return it' }));
  expect(screen.getByText('Say in words what the author should know.')).toBeVisible();
  expect(calls.some(({ method }) => method === 'POST')).toBe(false);
  await user.type(screen.getByLabelText('What the author should know'), 'Bank D has no pull test. ');
  await user.click(screen.getByRole('button', { name: 'Return it' }));
  await waitFor(() =>
    expect(calls.find(({ method }) => method === 'POST')).toMatchObject({
      path: `/reviews/${id}/return`,
      body: { remarks: 'Bank D has no pull test.' },
    }),
  );
});

test('nobody decides on a version of his own, and is told why', async () => {
  open({ [`GET /reviews/${id}`]: { status: 200, body: { ...review, own: true } } });
  for (const name of ['Reject', 'Return with words', 'Publish version 2']) {
    expect(await screen.findByRole('button', { name })).toBeDisabled();
  }
  expect(screen.getByText('You wrote this version, so another moderator must decide.')).toBeVisible();
});

test('who comes second is told what the first one decided', async () => {
  let decided = false;
  const { user } = open({
    [`GET /reviews/${id}`]: () => ({
      status: 200,
      body: decided
        ? { ...review, state: 'rejected', moderator: { id: 'o', name: 'Maren' }, remarks: 'Wrong card.', change: 5 }
        : review,
    }),
    [`POST /reviews/${id}/publish`]: () => {
      decided = true;
      return problem('version-conflict');
    },
  });
  await user.click(await screen.findByRole('button', { name: 'Publish version 2' }));
  await user.click(await screen.findByRole('button', { name: 'Publish' }));
  expect(await screen.findByText('Somebody else decided first.')).toBeVisible();
  expect(screen.getByText(/It is rejected by Maren.*“Wrong card\.”/)).toBeVisible();
  expect(screen.queryByRole('button', { name: 'Reject' })).toBeNull();
});

test('a version that its author changed meanwhile is shown as it is now, to be looked at again', async () => {
  let change = 4;
  const { user, calls } = open({
    [`GET /reviews/${id}`]: () => ({ status: 200, body: { ...review, change } }),
    [`POST /reviews/${id}/publish`]: () => {
      change = 5;
      return problem('version-conflict');
    },
  });
  await user.click(await screen.findByRole('button', { name: 'Publish version 2' }));
  await user.click(await screen.findByRole('button', { name: 'Publish' }));
  expect(await screen.findByText('The author has changed it meanwhile.')).toBeVisible();
  await waitFor(() => expect(calls.filter(({ path }) => path === `/reviews/${id}`).length).toBeGreaterThan(1));
  expect(screen.getByRole('button', { name: 'Publish version 2' })).toBeEnabled();
});

test('what was written stays in the dialog when the server cannot be reached', async () => {
  const { user } = open({ [`POST /reviews/${id}/reject`]: null });
  await user.click(await screen.findByRole('button', { name: 'Reject' }));
  await user.type(await screen.findByLabelText('What the author should know'), 'Another board.');
  await user.click(screen.getByRole('button', { name: 'Reject it' }));
  expect(await screen.findByRole('alert')).toHaveTextContent('The server cannot be reached.');
  expect(screen.getByLabelText('What the author should know')).toHaveValue('Another board.');
});
