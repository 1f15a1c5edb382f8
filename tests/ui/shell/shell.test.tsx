import { act, screen, within } from '@testing-library/react';
import { useState } from 'react';
import { rememberSignedIn } from '@/components/api/session';
import { useShowBoardInHeader } from '@/components/features/shell/current-board';
import { Shell } from '@/components/features/shell/shell';
import { Button } from '@/components/ui/button';
import { Page } from '@/components/ui/page';
import { Text } from '@/components/ui/text';
import { setDevice } from '@/tests/ui/support/device';
import { buildPerson } from '@/tests/ui/support/person';
import { renderPage } from '@/tests/ui/support/render';
import { routes } from '@/tests/ui/support/router';
import { fakeServer } from '@/tests/ui/support/server';

jest.mock('expo-router', () => jest.requireActual('@/tests/ui/support/router').routerDouble());

beforeEach(() => {
  window.scrollTo = jest.fn();
  routes.pathname = '/boards';
  fakeServer({});
});

const page = (
  <Shell>
    <Page title="Boards">
      <Text>the list</Text>
    </Page>
  </Shell>
);

const placeNames = () =>
  within(screen.getByRole('navigation'))
    .getAllByRole('link')
    .map((link) => link.textContent);

test('the page names itself in the tab', () => {
  renderPage(page);
  expect(document.title).toBe('Boards · Rowcall');
});

test('the first Tab stop leads past the head to the page', async () => {
  const { user } = renderPage(page);
  await user.tab();
  expect(screen.getByRole('button', { name: 'Skip to the page' })).toHaveFocus();
  await user.keyboard('{Enter}');
  expect(screen.getByRole('main')).toHaveFocus();
});

test('the current place is marked, and only that one', () => {
  routes.pathname = '/boards/tarnvall-t64';
  renderPage(page);
  const current = within(screen.getByRole('navigation'))
    .getAllByRole('link')
    .filter((link) => link.hasAttribute('aria-current'));
  expect(current.map((link) => link.textContent)).toEqual(['Boards']);
});

test('a guest sees the look-up, the boards, and the way to sign in', () => {
  setDevice({ width: 390 });
  renderPage(page);
  expect(placeNames()).toEqual(['Look up', 'Boards', 'Sign in']);
});

test('a moderator sees the reviews', async () => {
  rememberSignedIn(true);
  setDevice({ width: 390 });
  fakeServer({ 'GET /me': { status: 200, body: { person: buildPerson({ role: 'moderator' }) } } });
  renderPage(page);
  expect(await screen.findByRole('link', { name: 'Review' })).toBeVisible();
  expect(placeNames()).toEqual(['Look up', 'Boards', 'Contribute', 'Review', 'Account']);
});

test('losing the network is said, and taken back when it returns', () => {
  renderPage(page);
  const network = (online: boolean) =>
    act(() => {
      jest.spyOn(navigator, 'onLine', 'get').mockReturnValue(online);
      window.dispatchEvent(new Event(online ? 'online' : 'offline'));
    });
  expect(screen.queryByText('Offline')).not.toBeInTheDocument();
  network(false);
  expect(screen.getByText('Offline').closest('[role="status"]')).not.toBeNull();
  network(true);
  expect(screen.queryByText('Offline')).not.toBeInTheDocument();
});

test('the board of the page is in the head for as long as the page is there', async () => {
  function Board() {
    useShowBoardInHeader('Tarnvall T-64, rev B', 'tarnvall-t64-b');
    return null;
  }
  function Leaving() {
    const [there, setThere] = useState(true);
    return (
      <Shell>
        {there ? <Board /> : null}
        <Button label="Leave" onPress={() => setThere(false)} />
      </Shell>
    );
  }
  const { user } = renderPage(<Leaving />);
  expect(screen.getByRole('link', { name: 'Tarnvall T-64, rev B' })).toHaveAttribute('href', '/boards/tarnvall-t64-b');
  await user.click(screen.getByRole('button', { name: 'Leave' }));
  expect(screen.queryByRole('link', { name: 'Tarnvall T-64, rev B' })).not.toBeInTheDocument();
});

test('the theme can be changed from every page', async () => {
  const { user } = renderPage(page);
  await user.click(screen.getByRole('radio', { name: 'Night' }));
  expect(window.localStorage.getItem('rowcall.theme')).toBe('night');
});
