import { configure, screen, within } from '@testing-library/react';
import { PartsScreen } from '@/components/features/parts/parts-screen';
import { builtInFamilies } from '@/lib';
import { setDevice } from '@/tests/ui/support/device';
import { renderPage } from '@/tests/ui/support/render';
import { address } from '../diagnose/live-router';

jest.mock('expo-router', () =>
  jest.requireActual<typeof import('../diagnose/live-router')>('../diagnose/live-router').liveRouter(),
);

// Whether each of a thousand nodes is hidden takes jsdom most of a test's time; nothing here is.
configure({ defaultHidden: true });

const show = (params: Record<string, string> = {}) => {
  address.start(params);
  return renderPage(<PartsScreen />);
};
const fit = () => within(screen.getByRole('region', { name: 'Will this fit?' }));
// Working out the name of every row would take jsdom longer than all the rest.
const rowWith = (table: HTMLElement, text: string) =>
  within(table)
    .getAllByRole('row')
    .find((row) => row.textContent?.includes(text))!;
const items = (name: string) =>
  within(fit().getByRole('list', { name }))
    .getAllByRole('listitem')
    .map((item) => item.textContent?.replace(/^(\d+\.|·)/, ''));

test('every family is a line with its supplies, refresh and speeds', () => {
  show();
  const table = screen.getByRole('table', { name: 'RAM chip families' });
  expect(within(table).getAllByRole('row')).toHaveLength(builtInFamilies.length + 1);
  const row = rowWith(table, '16K × 1 dynamic, three supplies');
  expect(
    within(row)
      .getAllByRole('cell')
      .map((cell) => cell.textContent),
  ).toEqual([
    '16K × 1',
    '16',
    '−5 V at pin 1, +12 V at pin 8, +5 V at pin 9, 0 V at pin 16',
    '128 rows in 2 ms',
    '150, 200, 250, 300 ns',
    'Show',
  ]);
});

test('a single-supply chip in a three-supply socket would be destroyed, with why and what to change', async () => {
  const { user } = show();
  await user.selectOptions(screen.getByLabelText('The socket is wired for'), 'dynamic-16k-1-three-rail');
  expect(fit().getByText(/Choose what the socket is wired for/)).toBeVisible();
  await user.selectOptions(screen.getByLabelText('The chip at hand'), 'dynamic-64k-1');
  expect(address.params).toMatchObject({ socket: 'dynamic-16k-1-three-rail', chip: 'dynamic-64k-1' });
  expect(within(fit().getByRole('alert')).getByText('It would be destroyed.')).toBeVisible();
  expect(items('Why')[0]).toBe('Pin 8 has +12 V; the chip wants +5 V there.');
  expect(items('Only after these changes')).toEqual([
    'Pin 8: isolate it from +12 V and join it to pin 9, which has +5 V.',
    'Pin 1: isolate it from −5 V.',
  ]);
  const pins = fit().getByRole('table', { name: 'Pin by pin' });
  const cells = (at: number) => within(pins).getAllByRole('row')[at]!.textContent;
  expect(cells(8)).toBe('8+12 V+5 Vdestroys it');
  expect(cells(2)).toBe('2DDsame');
});

test('turned round, the socket and the chip change places', async () => {
  const { user } = show({ socket: 'dynamic-64k-1', chip: 'dynamic-256k-1' });
  expect(within(fit().getByRole('status')).getByText('It fits after changes.')).toBeVisible();
  expect(items('What to change')).toEqual(['Pin 1: tie A8 to 0 V (pin 16).']);
  await user.click(screen.getByRole('button', { name: /Turn round/ }));
  expect(address.params).toMatchObject({ socket: 'dynamic-256k-1', chip: 'dynamic-64k-1' });
  expect(fit().getByText('It does not fit.')).toBeVisible();
});

test('a chip of the family of the socket fits, and nothing is to be changed', () => {
  show({ socket: 'static-1k-4', chip: 'static-1k-4' });
  expect(within(fit().getByRole('status')).getByText('It fits as it is.')).toBeVisible();
  expect(fit().queryByText('What to change')).not.toBeInTheDocument();
});

test('packages that differ are not compared pin by pin', () => {
  show({ socket: 'static-8k-8', chip: 'static-2k-8' });
  expect(items('Why')).toContain('The chip has 24 pins, the socket 28.');
  expect(fit().queryByRole('table')).not.toBeInTheDocument();
});

test('the pins of a family lie as on the chip, and its source is named', async () => {
  const { user } = show();
  await user.click(screen.getByRole('button', { name: 'Show the pins of 1K × 4 static' }));
  expect(address.params.family).toBe('static-1k-4');
  expect(screen.getByRole('region', { name: 'One family' }).parentElement).toHaveFocus();
  const one = within(screen.getByRole('region', { name: 'One family' }));
  const rows = within(one.getByRole('table', { name: 'Pins from above, notch at the top' })).getAllByRole('row');
  expect(rows).toHaveLength(10);
  expect(rows[1]).toHaveTextContent(/^1A6\+5 V18$/);
  expect(rows[9]).toHaveTextContent(/^90 V\/W10$/);
  expect(one.getByText(/c64-wiki\.com/)).toBeVisible();
});

test('a link that names no family asks for one', () => {
  show({ socket: 'nonsense', chip: '' });
  expect(screen.getByLabelText('The socket is wired for')).toHaveValue('');
});

test('on a phone the families are stacked, and a verdict keeps its columns', () => {
  setDevice({ width: 390 });
  show({ socket: 'dynamic-16k-1-three-rail', chip: 'dynamic-64k-1' });
  expect(screen.getByRole('list', { name: 'RAM chip families' })).toBeVisible();
  expect(fit().getByRole('table', { name: 'Pin by pin' })).toBeVisible();
});

test('everything is reached by the keyboard in the order of the page', async () => {
  const { user } = show();
  await user.tab();
  expect(screen.getByLabelText('The socket is wired for')).toHaveFocus();
  await user.tab();
  expect(screen.getByLabelText('The chip at hand')).toHaveFocus();
});
