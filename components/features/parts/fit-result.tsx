import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Notice } from '@/components/ui/notice';
import { Table, type Column } from '@/components/ui/table';
import { Text } from '@/components/ui/text';
import { fitCheck, type FitPin } from '@/lib';
import type { ChipFamily } from '@/shared';
import { changesTitle, pinWords, verdictKind, verdictWords } from './fit-words';
import { WordList } from './word-list';

const columns: readonly Column<FitPin>[] = [
  { key: 'pin', header: 'Pin', cell: ({ pin }) => String(pin), mono: true, share: 1 },
  { key: 'socket', header: 'Socket', cell: ({ socket }) => socket, mono: true, share: 2 },
  { key: 'chip', header: 'Chip', cell: ({ chip }) => chip, mono: true, share: 2 },
  {
    key: 'severity',
    header: 'Comes out',
    share: 2,
    cell: ({ severity }) => (
      <Text variant={severity === 'same' ? 'small' : 'smallStrong'} tone={severity === 'same' ? 'soft' : 'ink'}>
        {pinWords[severity]}
      </Text>
    ),
  },
];

/** The whole fit check: the verdict, why, what to change, and pin by pin. */
export function FitResult({ socket, chip }: { socket: ChipFamily; chip: ChipFamily }) {
  const styles = useStyles();
  const check = fitCheck(socket, chip);
  const changes = changesTitle(check);
  return (
    <View style={styles.all}>
      <Notice kind={verdictKind[check.verdict]} title={verdictWords[check.verdict]} live>
        <Text variant="small">{`${chip.name}, in a socket for ${socket.name}.`}</Text>
        {check.reasons.length === 0 ? null : <WordList label="Why" items={check.reasons.map(({ words }) => words)} />}
      </Notice>
      {changes === null ? null : (
        <View style={styles.part}>
          <Text variant="subheading">{changes}</Text>
          <WordList label={changes} items={check.changes} numbered />
        </View>
      )}
      <View style={styles.part}>
        <Text variant="subheading">Also</Text>
        <WordList label="Also" items={check.notes.map(({ words }) => words)} />
      </View>
      {check.pins.length === 0 ? null : (
        <Table
          caption="Pin by pin"
          columns={columns}
          rows={check.pins}
          rowKey={({ pin }) => String(pin)}
          isMarked={({ severity }) => severity === 'destroys'}
          dense
        />
      )}
    </View>
  );
}

const useStyles = makeStyles((t) => ({ all: { gap: t.space.lg }, part: { gap: t.space.sm } }));
