import { useMemo, useState } from 'react';
import { View } from 'react-native';
import type { Bench, BenchFormat } from '@/components/features/diagnose/bench';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Table } from '@/components/ui/table';
import { Text } from '@/components/ui/text';
import { listWords } from '@/lib/layout/words';
import { codeRows } from './code-rows';
import { showsAddress } from './socket-codes';

type CodeTableProps = { bench: Bench; format: BenchFormat };

/** Lines of one page of the table: a large board has thousands. */
const pageSize = 64;

/** Every lane with its code and its socket, page by page. */
export function CodeTable({ bench, format }: CodeTableProps) {
  const styles = useStyles();
  const [page, setPage] = useState(0);
  const rows = useMemo(() => codeRows(bench, format), [bench, format]);
  const spoken = rows.filter(({ text }) => text !== null);
  const shown = spoken.slice(page * pageSize, (page + 1) * pageSize);
  const first = page * pageSize + 1;
  const { name } = format.definition;
  return (
    <View style={styles.all}>
      <View style={styles.head}>
        <Text variant="heading">{`${name}: codes and their sockets`}</Text>
        <Text variant="small" tone="soft">
          {noteOf(format, rows.length - spoken.length)}
        </Text>
      </View>
      <Table
        caption={`${name}, codes ${first} to ${first + shown.length - 1} of ${spoken.length}`}
        hideCaption={spoken.length <= pageSize}
        columns={[
          { key: 'code', header: 'Code', mono: true, share: 2, cell: ({ text }) => text ?? '' },
          { key: 'lane', header: 'Bit', share: 2, cell: ({ lane }) => <Text variant="small">{lane}</Text> },
          {
            key: 'socket',
            header: 'Socket',
            share: 1.2,
            cell: ({ sockets }) => <Text variant="code">{listWords(sockets, 8) || 'none'}</Text>,
          },
        ]}
        dense
        rows={shown}
        rowKey={({ key }) => key}
        empty={<Text tone="soft">This format names no single bit of the board.</Text>}
      />
      {spoken.length > pageSize ? <Pages page={page} count={spoken.length} onPage={setPage} /> : null}
    </View>
  );
}

function noteOf(format: BenchFormat, unspoken: number): string {
  const kinds = new Set(format.definition.parts.flatMap((part) => ('field' in part ? [part.field] : [])));
  return [
    showsAddress(format) && 'Each line is an example: every address of the bank has such a code.',
    (kinds.has('mask') || kinds.has('read')) && 'Each line is one bit; a code can hold several at once.',
    format.open.length > 0 && 'Written in the first of the ways in which this machine may count.',
    unspoken > 0 && `${unspoken} ${unspoken === 1 ? 'bit' : 'bits'} of the board cannot be said in this format.`,
  ]
    .filter(Boolean)
    .join(' ');
}

type PagesProps = { page: number; count: number; onPage: (page: number) => void };

function Pages({ page, count, onPage }: PagesProps) {
  const styles = useStyles();
  const last = Math.ceil(count / pageSize) - 1;
  return (
    <View role="group" aria-label="Pages of the table" style={styles.pages}>
      <Button label="Earlier codes" disabled={page === 0} onPress={() => onPage(page - 1)} />
      <Text variant="small" role="status">{`${page + 1} of ${last + 1}`}</Text>
      <Button label="Later codes" disabled={page === last} onPress={() => onPage(page + 1)} />
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  head: { gap: t.space.hair },
  pages: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: t.space.md },
}));
