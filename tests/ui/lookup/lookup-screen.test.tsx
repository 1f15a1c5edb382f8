import { screen, waitFor } from '@testing-library/react';
import { LookupScreen } from '@/components/features/lookup/lookup-screen';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument } from '@/shared';
import type { LayoutCard } from '@/shared/api/layouts';
import { keptOnDevice } from '../support/idb';
import { renderPage } from '../support/render';
import { routes } from '../support/router';
import { fakeServer } from '../support/server';

jest.mock('expo-router', () =>
  jest.requireActual<typeof import('../support/router')>('../support/router').routerDouble(),
);

jest.mock('idb-keyval', () => jest.requireActual<typeof import('../support/idb')>('../support/idb').idbDouble());

const publishedOf = (slug: string) => ({
  slug,
  number: 1,
  publishedAt: '2026-01-05T10:00:00.000Z',
  document: layoutDocument.parse(demoBoards.find((board) => board.slug === slug)?.document),
});
const cardOf = (slug: string): LayoutCard => {
  const { board, memory, sockets } = publishedOf(slug).document;
  return {
    slug,
    maker: board.maker,
    name: board.name,
    revision: board.revision,
    kind: board.kind,
    year: board.year ?? null,
    families: [],
    dataBits: memory.dataBits,
    banks: memory.banks.length,
    sockets: sockets.length,
    number: 1,
    publishedAt: '2026-01-05T10:00:00.000Z',
  };
};
const slugs = ['tarnvall-t-64-rev-b', 'tarnvall-t-64-rev-c', 'kestrup-lc-2-rev-d'];
const online = {
  'GET /layouts': ({ path }: { path: string }) => {
    const wanted = (new URL(path, 'http://x').searchParams.get('q') ?? '').toLowerCase();
    const items = slugs.map(cardOf).filter(({ name, maker }) => `${maker} ${name}`.toLowerCase().includes(wanted));
    return { status: 200, body: { items, nextCursor: null } };
  },
  ...Object.fromEntries(slugs.map((slug) => [`GET /layouts/${slug}`, { status: 200, body: publishedOf(slug) }])),
};

beforeEach(() => {
  keptOnDevice.clear();
  routes.params = {};
  routes.pushed = [];
});

describe('the look-up', () => {
  it('draws the revisions of one board together and goes straight to a board that has only one', async () => {
    fakeServer(online);
    const { user } = renderPage(<LookupScreen />);
    expect(await screen.findByText('Tarnvall Textil, revisions B, C')).toBeInTheDocument();
    await user.click(screen.getByText('LC-2 lift cabinet, card K3'));
    expect(routes.pushed).toEqual([{ pathname: '/boards/[slug]/diagnose', params: { slug: 'kestrup-lc-2-rev-d' } }]);
  });

  it('narrows the list down while it is typed', async () => {
    fakeServer(online);
    const { user } = renderPage(<LookupScreen />);
    await screen.findByText('T-64 loom controller');
    await user.type(screen.getByLabelText('Board'), 'lift');
    await waitFor(() => expect(screen.queryByText('T-64 loom controller')).toBeNull());
    expect(screen.getByText('LC-2 lift cabinet, card K3')).toBeInTheDocument();
  });

  it('asks to compare the marks before a board of several revisions is opened', async () => {
    fakeServer(online);
    routes.params = { board: 'tarnvall-t-64-rev-b' };
    renderPage(<LookupScreen />);
    expect(await screen.findByRole('heading', { name: 'Which revision?' })).toBeInTheDocument();
    expect(await screen.findByText('Copper, component side, beside U41: "TT 640-2 B"')).toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'It is revision C' })).toBeInTheDocument();
  });

  it('searches the boards of the device where there is no network', async () => {
    keptOnDevice.set('kestrup-lc-2-rev-d', { ...publishedOf('kestrup-lc-2-rev-d'), keptAt: 0 });
    fakeServer({ 'GET /layouts': null });
    const { user } = renderPage(<LookupScreen />);
    expect(await screen.findByText('✓ works without network')).toBeInTheDocument();
    expect(await screen.findByText('The server cannot be reached.')).toBeInTheDocument();
    await user.type(screen.getByLabelText('Board'), 'loom');
    expect(await screen.findByText('No board fits “loom”.')).toBeInTheDocument();
  });

  it('says what is missing where neither server nor device has a board', async () => {
    fakeServer({ 'GET /layouts': null });
    renderPage(<LookupScreen />);
    expect(await screen.findByText(/No board was opened on this device before/)).toBeInTheDocument();
  });
});
