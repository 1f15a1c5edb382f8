import { Pressable, View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Text } from '@/components/ui/text';
import { bitName } from '@/lib/layout/words';
import type { LaneName, LayoutDocument } from '@/shared';
import { isMarked, toggleBit, type LanesEvidence } from './failing-bits';

type BitsEntryProps = {
  document: LayoutDocument;
  bits: LanesEvidence;
  onChange: (bits: LanesEvidence) => void;
};

const rests = [
  { value: 'rest', label: 'The rest passed' },
  { value: 'none', label: 'The rest was not tested' },
] as const;

/** Failing bits marked one by one, bank by bank: for a mask on a scope, or a code that nobody can read. */
export function BitsEntry({ document, bits, onChange }: BitsEntryProps) {
  const styles = useStyles();
  const { memory } = document;
  return (
    <View style={styles.all}>
      <Text variant="small" tone="soft">
        Mark every bit that fails, here or by a tap on its chip.
      </Text>
      {memory.banks.map((bank) => (
        <View key={bank.id} role="group" aria-label={`Bank ${bank.id}`} style={styles.bank}>
          <View style={styles.name}>
            <Text variant="fine" tone="soft">
              bank
            </Text>
            <Text variant="codeSmall">{bank.id}</Text>
          </View>
          <View style={styles.bits}>
            {inFours(bank.bits ?? Array.from({ length: memory.dataBits }, (_, bit) => bit)).map((four) => (
              <View key={four[0]} style={styles.four}>
                {four.map((bit) => (
                  <Bit key={bit} {...{ memory, bits, onChange }} lane={{ bank: bank.id, bit }} />
                ))}
                {Array.from({ length: 4 - four.length }, (_, at) => (
                  <View key={at} style={styles.blank} />
                ))}
              </View>
            ))}
          </View>
        </View>
      ))}
      {typeof bits.passed === 'string' ? (
        <SegmentedControl
          label="What of the other bits"
          options={rests}
          value={bits.passed}
          onChange={(passed) => onChange({ ...bits, passed })}
        />
      ) : null}
    </View>
  );
}

/** Bits in fours, as they are counted on paper. */
function inFours(bits: readonly number[]): number[][] {
  return Array.from({ length: Math.ceil(bits.length / 4) }, (_, at) => bits.slice(at * 4, at * 4 + 4));
}

type BitProps = Omit<BitsEntryProps, 'document'> & { memory: LayoutDocument['memory']; lane: LaneName };

function Bit({ memory, bits, onChange, lane }: BitProps) {
  const styles = useStyles();
  const marked = isMarked(bits, lane);
  const name = bitName(memory, lane.bit);
  return (
    <Pressable
      role="checkbox"
      aria-checked={marked}
      aria-label={`Bit ${name} of bank ${lane.bank} fails`}
      onPress={() => onChange(toggleBit(bits, lane))}
      style={[styles.bit, marked && styles.marked]}
    >
      <Text variant="codeSmall" tone={marked ? 'onPencil' : 'ink'}>
        {marked ? `× ${name}` : name}
      </Text>
    </Pressable>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  bank: { flexDirection: 'row', gap: t.space.md, alignItems: 'flex-start' },
  name: { width: t.target, paddingTop: t.space.xs },
  bits: { flex: 1, gap: t.space.xs },
  four: { flexDirection: 'row', gap: t.space.xs },
  blank: { flex: 1 },
  bit: {
    flex: 1,
    minWidth: t.target,
    minHeight: t.target,
    paddingHorizontal: t.space.xs,
    alignItems: 'center',
    justifyContent: 'center',
    backgroundColor: t.colours.sheet,
    borderWidth: t.line.thin,
    borderColor: t.colours.ruleStrong,
    borderRadius: t.radius.md,
  },
  marked: { backgroundColor: t.colours.pencil, borderColor: t.colours.pencil },
}));
