import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Link } from '@/components/ui/link';
import { Panel } from '@/components/ui/panel';
import { Rule } from '@/components/ui/rule';
import { Sheet } from '@/components/ui/sheet';
import { Table, type Column } from '@/components/ui/table';
import { TallyStrokes } from '@/components/ui/tally-strokes';
import { Text } from '@/components/ui/text';

const variants = [
  'display',
  'title',
  'heading',
  'subheading',
  'lead',
  'body',
  'strong',
  'small',
  'fine',
  'label',
] as const;
const bars = ['pencil', 'tick', 'mark', 'pen'] as const;
const chances = [0.02, 0.34, 0.5, 0.91, 1];

type Socket = { label: string; family: string; bit: number; note: string };

const sockets: readonly Socket[] = [
  { label: 'U10', family: '64K x1', bit: 0, note: '' },
  {
    label: 'MEM-A-LONG-LABEL-0123456',
    family: '16K x1, three rails',
    bit: 1,
    note: 'a remark that is long enough to wrap in its cell',
  },
  { label: 'U12', family: '64K x1', bit: 2, note: 'marked' },
];

const columns: readonly Column<Socket>[] = [
  { key: 'label', header: 'Socket', cell: (row) => row.label, mono: true, share: 2 },
  { key: 'family', header: 'Family', cell: (row) => row.family, share: 2 },
  { key: 'bit', header: 'Bit', cell: (row) => row.bit, mono: true, align: 'right' },
  { key: 'note', header: 'Note', cell: (row) => row.note, share: 3 },
];

/** Words, rules, sheets, tables. */
export function PaperSamples() {
  const styles = useStyles();
  return (
    <>
      <Panel title="Words" level={3} note="0 O, 1 l I, 5 S, 8 B must differ">
        {variants.map((variant) => (
          <Text key={variant} variant={variant} level={null}>
            {`${variant}: pull U31 first`}
          </Text>
        ))}
        <Text variant="codeLarge">C5 0O 1lI</Text>
        <Text variant="code">2C1A wrote 00 read 20 5S 8B</Text>
        <Text variant="mono">2C1B wrote FF read FF</Text>
        <Text>
          Running words with <Link href="/gallery">a link</Link> in them.
        </Text>
      </Panel>
      <Sheet bar="pencil" label="Answer">
        <View style={styles.answer}>
          <View style={styles.words}>
            <Text variant="subheading">Pull first</Text>
            <Text variant="answer" tone="answer">
              U31
            </Text>
          </View>
          <TallyStrokes probability={0.91} size="lg" />
        </View>
        <Text>Bit 5 of bank C alone fails. Bits 0 to 4 of bank C and banks A and B passed.</Text>
      </Sheet>
      <View style={styles.chances}>
        {chances.map((chance) => (
          <TallyStrokes key={chance} probability={chance} layout="beside" />
        ))}
      </View>
      {bars.map((bar) => (
        <Sheet key={bar} bar={bar} padding="md">
          <Text>{`A sheet with a bar: ${bar}`}</Text>
        </Sheet>
      ))}
      <Sheet kind="boxed">
        <Text variant="subheading">A boxed sheet</Text>
        <Rule />
        <Rule weight="strong" />
        <Rule weight="heavy" />
      </Sheet>
      <Table
        caption="Sockets"
        columns={columns}
        rows={sockets}
        rowKey={(row) => row.label}
        isMarked={(row) => row.note === 'marked'}
      />
    </>
  );
}

const useStyles = makeStyles((t) => ({
  answer: { flexDirection: 'row', justifyContent: 'space-between', alignItems: 'flex-start' },
  words: { flexShrink: 1 },
  chances: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.lg },
}));
