import { configure, screen, waitFor, within } from '@testing-library/react';
import { BoardScreen } from '@/components/features/boards/board-screen';
import * as store from '@/components/api/layout-store';
import { buildVersion, cardOf, demoDocument, publishedOf } from '@/tests/ui/support/boards';
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
// Whether each of a thousand nodes is hidden takes jsdom most of a test's time; nothing here is.
configure({ defaultHidden: true, asyncUtilTimeout: 5000 });

const slug = 'tarnvall-t-64-rev-b';
const other = 'tarnvall-t-64-rev-c';

const serve = (more: Parameters<typeof fakeServer>[0] = {}) =>
  fakeServer({
    [`GET /layouts/${slug}`]: publishedOf(slug),
    [`GET /layouts/${other}`]: publishedOf(other),
    'GET /layouts': { status: 200, body: { items: [cardOf(slug), cardOf(other)], nextCursor: null } },
    ...more,
  });

const show = (params: Record<string, string> = {}) => {
  address.start({ slug, ...params });
  return renderPage(<BoardScreen />);
};

const lines = (name: string) =>
  within(screen.getByRole('list', { name }))
    .getAllByRole('listitem')
    .map((line) => line.textContent);

test('the page names the board, what it is, and the way to its look-up', async () => {
  serve();
  show();
  expect(await screen.findByRole('heading', { level: 1 })).toHaveTextContent(
    'Tarnvall Textil T-64 loom controller, rev B',
  );
  expect(
    screen.getByText(
      'Controller, 1981. 4 banks of 16K words, 8 bits, 32 sockets for 16K × 1 dynamic, three supplies. Version 1, 5 Jan 2026.',
    ),
  ).toBeVisible();
  expect(screen.getByRole('link', { name: 'Look up a failure' })).toHaveAttribute('href', `/boards/${slug}/diagnose`);
  expect(screen.getAllByRole('tab').map((tab) => tab.textContent)).toEqual(['Map', 'Codes', 'Sources', 'Versions']);
});

test('the marks are there to be compared, and what differs on the other revision is said', async () => {
  serve();
  show();
  expect(await screen.findByText('Is it revision B?')).toBeVisible();
  expect(lines('Marks to compare')[0]).toContain('TT 640-2 B');
  expect(await screen.findByText('16 of 32 codes of “Lamp code” name another socket.')).toBeVisible();
  expect(screen.getByRole('link', { name: 'Revision C' })).toHaveAttribute('href', `/boards/${other}`);
});

test('a socket that is tapped tells its lane, its codes, its pins and the parts that it shares', async () => {
  serve();
  const { user } = show();
  await user.click(await screen.findByRole('option', { name: /^U31, bit 5 of bank C/ }));
  expect(address.params.at).toBe('U31');
  expect(await screen.findByRole('heading', { name: 'U31' })).toBeVisible();
  expect(screen.getByText('Bit 5 of bank C.')).toBeVisible();
  expect(lines('Codes that name it')).toEqual([
    'Lamp codeC5',
    'Monitor line8000 wrote 00 read 20for example; any address of its words',
  ]);
  expect(lines('Chip')).toEqual(expect.arrayContaining(['pin 1−5 V ± 10 %', 'pin 8+12 V ± 10 %', 'pin 9+5 V ± 5 %']));
  expect(screen.getByRole('button', { name: /^U52, data buffer/ })).toBeVisible();
  expect(screen.queryByRole('button', { name: /^U51, data buffer/ })).toBeNull();
});

test('a shared part tells what it serves, and one of its sockets leads on', async () => {
  serve();
  const { user } = show({ at: 'U52' });
  expect(await screen.findByRole('heading', { name: 'U52' })).toBeVisible();
  expect(lines('What U52 does')).toEqual(['servesBits 4 to 7 of every bank', 'can fail aloneD4, D5, D6, D7']);
  expect(screen.getByText('double line: chosen, served by U52')).toBeVisible();
  await user.click(screen.getByRole('button', { name: 'U41' }));
  expect(address.params.at).toBe('U41');
});

test('on a phone what is known of a socket comes as a sheet over the sketch, and goes again', async () => {
  setDevice({ width: 390 });
  serve();
  const { user } = show({ at: 'U31' });
  const sheet = await screen.findByRole('dialog', { name: 'U31' });
  expect(within(sheet).getByText('Bit 5 of bank C.')).toBeInTheDocument();
  await user.click(within(sheet).getByRole('button', { name: 'Close' }));
  await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
});

test('the codes list every lane once, with its socket', async () => {
  serve();
  show({ tab: 'codes' });
  const table = await screen.findByRole('table', { name: /Lamp code/ });
  const rows = within(table).getAllByRole('row').slice(1);
  expect(rows).toHaveLength(32);
  expect(rows.map((row) => row.textContent)).toContain('C5Bit 5 of bank CU31');
});

test('codes of a large board come in pages', async () => {
  const large = 'ferrow-hy-128-mod-6';
  fakeServer({ [`GET /layouts/${large}`]: publishedOf(large) });
  const { user } = show({ slug: large, tab: 'codes' });
  const body = () =>
    within(screen.getByRole('table', { name: /codes \d+ to \d+ of 72/ }))
      .getAllByRole('row')
      .slice(1);
  await screen.findByText('1 of 2');
  expect(body()).toHaveLength(64);
  await user.click(screen.getByRole('button', { name: 'Later codes' }));
  expect(body()).toHaveLength(8);
  expect(screen.getByRole('button', { name: 'Later codes' })).toBeDisabled();
});

test('a code that is typed is read, or refused with the reason', async () => {
  serve();
  const { user } = show({ tab: 'codes' });
  const field = await screen.findByLabelText('What does this code mean?');
  await user.type(field, 'c5');
  expect(screen.getAllByRole('status').map((one) => one.textContent)).toEqual(
    expect.arrayContaining([expect.stringContaining('U31Bit 5 of bank C')]),
  );
  expect(screen.getByRole('link', { name: 'Look up a failure with this code' })).toHaveAttribute(
    'href',
    `/boards/${slug}/diagnose?f=lamp&d=c5`,
  );
  await user.clear(field);
  await user.type(field, 'E5');
  expect(screen.getByText(/bank E: this board has banks A to D/i)).toBeVisible();
  expect(screen.queryByRole('link', { name: 'Look up a failure with this code' })).toBeNull();
});

test('worked examples are run on the layout that is shown', async () => {
  const document = demoDocument(slug);
  const spoiled = { ...document, examples: [...document.examples, { format: 'lamp', text: 'C4', sockets: ['U31'] }] };
  serve({ [`GET /layouts/${slug}`]: publishedOf(slug, spoiled) });
  show({ tab: 'sources' });
  expect(await screen.findByText('1 of 4 do not come out as the source says.')).toBeVisible();
  const examples = lines('Worked examples');
  expect(examples[0]).toMatch(/^C5Lamp code\. Names U31, as its source says\..*✓ passes$/);
  expect(examples[3]).toBe('C4Lamp code. Names U30, not U31.! fails');
  expect(lines('Sources')[2]).toContain('Proves: Which row is which bank');
});

test('the versions are listed with their words, and an older one says that the look-up uses another', async () => {
  const before = buildVersion(slug, { number: 1, state: 'published', remarks: 'Bank D was wrong.' });
  const current = buildVersion(slug, { id: 'x', number: 2, state: 'published', current: true });
  serve({
    [`GET /layouts/${slug}/versions`]: { status: 200, body: { items: [current, before] } },
    [`GET /layouts/${slug}/versions/1`]: { status: 200, body: { ...before, document: demoDocument(slug) } },
  });
  const { unmount } = show({ tab: 'versions' });
  expect(await screen.findByRole('row', { name: /Version 2 in use/ })).toBeInTheDocument();
  expect(screen.getByRole('row', { name: /Version 1 published before .* Bank D was wrong\./ })).toBeInTheDocument();
  expect(screen.getByRole('link', { name: 'Version 1' })).toHaveAttribute('href', `/boards/${slug}?version=1`);
  unmount();
  show({ version: '1' });
  expect(await screen.findByText('This is version 1, not the one that the look-up uses.')).toBeVisible();
});

test('a board that was opened before is whole without the server, and says that it is the device’s copy', async () => {
  fakeServer({ [`GET /layouts/${slug}`]: null, 'GET /layouts': null });
  jest.mocked(store.readKeptLayout).mockResolvedValueOnce({ ...publishedOf(slug).body, keptAt: 0 });
  show();
  expect(await screen.findByText(/Version 1, 5 Jan 2026, kept on this device\.$/)).toBeVisible();
  expect(screen.getByRole('option', { name: /^U31/ })).toBeInTheDocument();
});

test('a board that is not there, one that was withdrawn, and a server out of reach are told apart', async () => {
  fakeServer({ 'GET /layouts/none': problem('not-found') });
  const first = show({ slug: 'none' });
  expect(await screen.findByText('There is no board at this address.')).toBeVisible();
  first.unmount();
  fakeServer({ 'GET /layouts/gone': problem('layout-retired') });
  const second = show({ slug: 'gone' });
  expect(await screen.findByText('This layout was withdrawn.')).toBeVisible();
  second.unmount();
  fakeServer({ 'GET /layouts/far': null });
  show({ slug: 'far' });
  expect(await screen.findByRole('alert')).toHaveTextContent('The server cannot be reached.');
});
