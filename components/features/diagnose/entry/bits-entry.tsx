import { Pressable, View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Text } from '@/components/ui/text';
import { bitName } from '@/lib/layout/words';
import type { LayoutDocument } from '@/shared';
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
        Mark every bit that fails.
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
            {(bank.bits ?? Array.from({ length: memory.dataBits }, (_, bit) => bit)).map((bit) => {
              const lane = { bank: bank.id, bit };
              const marked = isMarked(bits, lane);
              return (
                <Pressable
                  key={bit}
                  role="checkbox"
                  aria-checked={marked}
                  aria-label={`Bit ${bitName(memory, bit)} of bank ${bank.id} fails`}
                  onPress={() => onChange(toggleBit(bits, lane))}
                  style={[styles.bit, marked && styles.marked]}
                >
                  <Text variant="codeSmall" tone={marked ? 'onPencil' : 'ink'}>
                    {bitName(memory, bit)}
                  </Text>
                </Pressable>
              );
            })}
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

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  bank: { flexDirection: 'row', gap: t.space.md, alignItems: 'flex-start' },
  name: { width: t.target, paddingTop: t.space.xs },
  bits: { flex: 1, flexDirection: 'row', flexWrap: 'wrap', gap: t.space.xs },
  bit: {
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
