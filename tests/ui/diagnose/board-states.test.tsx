import { screen } from '@testing-library/react';
import { DiagnoseScreen } from '@/components/features/diagnose/diagnose-screen';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument } from '@/shared';
import { setDevice } from '../support/device';
import { keptOnDevice } from '../support/idb';
import { renderPage } from '../support/render';
import { fakeServer, problem } from '../support/server';
import { address } from './live-router';

jest.mock('expo-router', () => jest.requireActual<typeof import('./live-router')>('./live-router').liveRouter());

jest.mock('idb-keyval', () => jest.requireActual<typeof import('../support/idb')>('../support/idb').idbDouble());

const loom = demoBoards.find(({ slug }) => slug === 'tarnvall-t-64-rev-b');
const published = {
  slug: 'loom',
  number: 3,
  publishedAt: '2026-01-05T10:00:00.000Z',
  document: layoutDocument.parse(loom?.document),
};

beforeEach(() => {
  keptOnDevice.clear();
  window.scrollTo = jest.fn();
  setDevice({ width: 390 });
  address.start({ slug: 'loom', r: '1~c.lamp.C5' });
});

describe('the board of a workspace', () => {
  it('comes from the server and is kept on the device', async () => {
    fakeServer({ 'GET /layouts/loom': { status: 200, body: published } });
    renderPage(<DiagnoseScreen />);
    expect(await screen.findByLabelText('Pull U31 first.')).toBeInTheDocument();
    expect(keptOnDevice.has('loom')).toBe(true);
  });

  it('answers from the device where there is no network', async () => {
    keptOnDevice.set('loom', { ...published, keptAt: 0 });
    fakeServer({ 'GET /layouts/loom': null });
    renderPage(<DiagnoseScreen />);
    expect(await screen.findByLabelText('Pull U31 first.')).toBeInTheDocument();
  });

  it('says that it is kept only, where it is no longer published', async () => {
    keptOnDevice.set('loom', { ...published, keptAt: 0 });
    fakeServer({ 'GET /layouts/loom': problem('not-found') });
    renderPage(<DiagnoseScreen />);
    expect(await screen.findByText('This board is no longer published.')).toBeInTheDocument();
    expect(screen.getByLabelText('Pull U31 first.')).toBeInTheDocument();
  });

  it('is said to be unknown where the server does not know it', async () => {
    fakeServer({ 'GET /layouts/loom': problem('not-found') });
    renderPage(<DiagnoseScreen />);
    expect(await screen.findByText('There is no board at this address.')).toBeInTheDocument();
  });

  it('can be asked for again where the server was out of reach', async () => {
    const handlers: Parameters<typeof fakeServer>[0] = { 'GET /layouts/loom': null };
    fakeServer(handlers);
    const { user } = renderPage(<DiagnoseScreen />);
    expect(await screen.findByText(/The server cannot be reached/)).toBeInTheDocument();
    handlers['GET /layouts/loom'] = { status: 200, body: published };
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByLabelText('Pull U31 first.')).toBeInTheDocument();
  });

  it('is refused in words where what arrived is no layout', async () => {
    fakeServer({ 'GET /layouts/loom': { status: 200, body: { ...published, document: { format: 'other' } } } });
    renderPage(<DiagnoseScreen />);
    expect(await screen.findByText('The board that arrived cannot be read.')).toBeInTheDocument();
  });
});
