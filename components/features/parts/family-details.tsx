import { View } from 'react-native';
import { DetailLines } from '@/components/features/boards/detail-lines';
import { makeStyles } from '@/components/theme';
import { Table, type Column } from '@/components/ui/table';
import { Text } from '@/components/ui/text';
import type { ChipFamily } from '@/shared';
import { gradeWords, organisationWords, packageOf, refreshWords, supplyWords } from './family-words';

/** Two pins that face each other, as the chip lies with its notch at the top. */
type PinRow = { left: number; leftName: string; right: number; rightName: string };

const columns: readonly Column<PinRow>[] = [
  { key: 'left', header: 'Pin', cell: ({ left }) => String(left), mono: true },
  { key: 'leftName', header: 'Left side', cell: ({ leftName }) => leftName, mono: true, share: 2 },
  { key: 'rightName', header: 'Right side', cell: ({ rightName }) => rightName, mono: true, share: 2, align: 'right' },
  { key: 'right', header: 'Pin', cell: ({ right }) => String(right), mono: true, align: 'right' },
];

function rowsOf(family: ChipFamily): PinRow[] {
  const count = packageOf(family);
  const names = new Map(family.pins.map(({ pin, name }) => [pin, name]));
  const nameOf = (pin: number) => names.get(pin) ?? 'not described';
  return Array.from({ length: Math.ceil(count / 2) }, (_, at) => {
    const [left, right] = [at + 1, count - at];
    return { left, leftName: nameOf(left), right, rightName: nameOf(right) };
  });
}

/** One family: its facts, its pins as they lie, and where that is from. */
export function FamilyDetails({ family }: { family: ChipFamily }) {
  const styles = useStyles();
  const line = (name: string, value: string) => ({ key: name, name, value });
  return (
    <View style={styles.all}>
      <DetailLines
        label={family.name}
        lines={[
          line('type numbers', family.alsoCalled.join(', ') || 'none known'),
          line('organisation', organisationWords(family)),
          line('supplies', supplyWords(family)),
          line('refresh', refreshWords(family)),
          line('usual speeds', gradeWords(family)),
          line('laid on top', family.stackable ? 'a good chip may lie on it for a test' : 'not for a test'),
          line('source', family.source ?? 'none given'),
        ]}
      />
      {family.pins.length === 0 ? (
        <Text tone="soft">Its pins are not described.</Text>
      ) : (
        <Table
          caption="Pins from above, notch at the top"
          columns={columns}
          rows={rowsOf(family)}
          rowKey={({ left }) => String(left)}
          dense
        />
      )}
    </View>
  );
}

const useStyles = makeStyles((t) => ({ all: { gap: t.space.lg } }));
