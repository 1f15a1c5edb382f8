import { screen, waitFor, within } from '@testing-library/react';
import { LibraryScreen } from '@/components/features/boards/library-screen';
import * as store from '@/components/api/layout-store';
import { cardOf, publishedOf } from '@/tests/ui/support/boards';
import { setDevice } from '@/tests/ui/support/device';
import { renderPage } from '@/tests/ui/support/render';
import { fakeServer, problem } from '@/tests/ui/support/server';
import { address } from '../diagnose/live-router';

jest.mock('expo-router', () =>
  jest.requireActual<typeof import('../diagnose/live-router')>('../diagnose/live-router').liveRouter(),
);
jest.mock('@/components/api/layout-store', () => ({
  ...jest.requireActual<typeof store>('@/components/api/layout-store'),
  readKeptLayouts: jest.fn(async () => []),
  readKeptLayout: jest.fn(async () => undefined),
}));

const loom = cardOf('tarnvall-t-64-rev-b');
const tide = cardOf('sandvoe-tg-3-issue-2');
const list = (items: object[], nextCursor: string | null = null) => ({ status: 200, body: { items, nextCursor } });
const filters = {
  status: 200,
  body: { makers: ['Tarnvall Textil'], kinds: ['controller'], families: ['dynamic-16k-1-three-rail'], bits: [8] },
};

const show = (params: Record<string, string> = {}) => {
  address.start(params);
  return renderPage(<LibraryScreen />);
};

test('every board is a line of the table with its bits and sockets, and leads to its page', async () => {
  fakeServer({ 'GET /layouts': list([loom, tide]), 'GET /layout-filters': filters });
  show();
  const row = await screen.findByRole('row', { name: /T-64 loom controller, rev B/ });
  expect(within(row).getByRole('link')).toHaveAttribute('href', '/boards/tarnvall-t-64-rev-b');
  expect(
    within(row)
      .getAllByRole('cell')
      .map((cell) => cell.textContent),
  ).toEqual(['Tarnvall Textil', 'controller, 1981', '4', '8', '32', '16K × 1 dynamic, three rail', 'no']);
  expect(screen.getByText('2 boards.')).toBeVisible();
});

test('the search goes into the link once the hand rests, and the server is asked for it', async () => {
  const { calls } = fakeServer({ 'GET /layouts': list([loom]), 'GET /layout-filters': filters });
  const { user } = show();
  await user.type(await screen.findByLabelText('Search'), 'loom');
  await waitFor(() => expect(address.params.q).toBe('loom'));
  await waitFor(() => expect(calls.map(({ path }) => path)).toContain('/layouts?q=loom&limit=50'));
  expect(calls.map(({ path }) => path)).not.toContain('/layouts?q=lo&limit=50');
});

test('a filter of the link narrows the request, and choosing another changes the link', async () => {
  const { calls } = fakeServer({ 'GET /layouts': list([loom]), 'GET /layout-filters': filters });
  const { user } = show({ bits: '8' });
  await screen.findByText('1 board.');
  expect(calls.map(({ path }) => path)).toContain('/layouts?bits=8&limit=50');
  await screen.findByRole('option', { name: 'Tarnvall Textil' });
  await user.selectOptions(screen.getByLabelText('Maker'), 'Tarnvall Textil');
  expect(address.params).toMatchObject({ bits: '8', maker: 'Tarnvall Textil' });
  await user.click(screen.getByRole('button', { name: 'Clear filters' }));
  expect(address.params).toMatchObject({ bits: undefined, maker: undefined });
});

test('where nothing fits, it says what was searched and offers to clear it', async () => {
  fakeServer({ 'GET /layouts': list([]), 'GET /layout-filters': filters });
  const { user } = show({ q: 'piano', kind: 'terminal' });
  expect(await screen.findByText('No board fits.')).toBeVisible();
  expect(screen.getByText(/Searched: “piano”, kind terminal\./)).toBeVisible();
  await user.click(screen.getByRole('button', { name: 'Clear search and filters' }));
  expect(address.params).toMatchObject({ q: undefined, kind: undefined });
  expect(screen.getByLabelText('Search')).toHaveValue('');
});

test('more boards come page by page, and a page that fails leaves those that are there', async () => {
  let failing = true;
  fakeServer({
    'GET /layout-filters': filters,
    'GET /layouts': ({ path }) => {
      if (!path.includes('cursor')) return list([loom], 'next');
      return failing ? problem('too-many-requests') : list([tide]);
    },
  });
  const { user } = show();
  await user.click(await screen.findByRole('button', { name: 'More boards' }));
  expect(await screen.findByRole('alert')).toHaveTextContent('Too many requests.');
  expect(screen.getByRole('row', { name: /T-64/ })).toBeInTheDocument();
  failing = false;
  await user.click(screen.getByRole('button', { name: 'More boards' }));
  expect(await screen.findByRole('row', { name: /TG-3 tide recorder/ })).toBeInTheDocument();
  expect(screen.queryByRole('button', { name: 'More boards' })).toBeNull();
});

test('with no network the boards of this device are listed, narrowed by the same link', async () => {
  fakeServer({ 'GET /layouts': null, 'GET /layout-filters': null });
  jest
    .mocked(store.readKeptLayouts)
    .mockResolvedValueOnce([loom, tide].map(({ slug }) => ({ ...publishedOf(slug).body, keptAt: 0 })));
  show({ q: 'tide' });
  expect(await screen.findByText('1 board on this device.')).toBeVisible();
  expect(screen.getByText('The server cannot be reached.')).toBeVisible();
  expect(screen.getByRole('row', { name: /TG-3 tide recorder.*kept/ })).toBeInTheDocument();
});

test('an error of the server is told with a way to try again', async () => {
  let failing = true;
  fakeServer({
    'GET /layout-filters': filters,
    'GET /layouts': () =>
      failing ? problem('invalid-request', { detail: 'There is no kind “toaster”.' }) : list([loom]),
  });
  const { user } = show({ kind: 'toaster' });
  expect(await screen.findByRole('alert')).toHaveTextContent('There is no kind “toaster”.');
  failing = false;
  await user.click(screen.getByRole('button', { name: 'Try again' }));
  expect(await screen.findByRole('row', { name: /T-64/ })).toBeInTheDocument();
});

test('on a phone each board is an entry, and the filters are folded away', async () => {
  setDevice({ width: 390 });
  fakeServer({ 'GET /layouts': list([loom]), 'GET /layout-filters': filters });
  const { user } = show({ bits: '8' });
  const entry = await screen.findByRole('listitem');
  expect(entry).toHaveTextContent('controller, 1981; 4 banks of 8 bits, 32 sockets');
  expect(screen.queryByLabelText('Maker')).toBeNull();
  await user.click(screen.getByRole('button', { name: 'Filters, 1 set' }));
  expect(screen.getByLabelText('Data bits')).toHaveValue('8');
});
