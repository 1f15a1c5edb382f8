import { screen, within } from '@testing-library/react';
import { Text } from 'react-native';
import { Table, type Column } from '@/components/ui/table';
import { setDevice } from '@/tests/ui/support/device';
import { renderPage } from '@/tests/ui/support/render';

type Row = { label: string; bit: number };

const columns: readonly Column<Row>[] = [
  { key: 'label', header: 'Socket', cell: (row) => row.label, mono: true },
  { key: 'bit', header: 'Bit', cell: (row) => row.bit },
];
const rows = [
  { label: 'U10', bit: 0 },
  { label: 'U11', bit: 1 },
];

const table = (list: readonly Row[]) => (
  <Table caption="Sockets" columns={columns} rows={list} rowKey={(row) => row.label} empty={<Text>None yet</Text>} />
);

test('a wide table has a name, column heads and row heads', () => {
  renderPage(table(rows));
  const shown = screen.getByRole('table', { name: 'Sockets' });
  expect(
    within(shown)
      .getAllByRole('columnheader')
      .map((cell) => cell.textContent),
  ).toEqual(['Socket', 'Bit']);
  expect(within(shown).getByRole('row', { name: 'U11 1' })).toBeInTheDocument();
  expect(within(shown).getAllByRole('rowheader')).toHaveLength(2);
});

test('on a phone every value stands beside the name of its column', () => {
  setDevice({ width: 390 });
  renderPage(table(rows));
  expect(screen.queryByRole('table')).not.toBeInTheDocument();
  const entries = within(screen.getByRole('list', { name: 'Sockets' })).getAllByRole('listitem');
  expect(entries.map((entry) => entry.textContent)).toEqual(['U10Bit0', 'U11Bit1']);
});

test('an empty table shows what was given for it', () => {
  renderPage(table([]));
  expect(screen.getByText('None yet')).toBeInTheDocument();
  expect(screen.queryByRole('table')).not.toBeInTheDocument();
});
