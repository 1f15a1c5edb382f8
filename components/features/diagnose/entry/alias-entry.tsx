import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Chip } from '@/components/ui/chip';
import { Field } from '@/components/ui/field';
import { Text } from '@/components/ui/text';
import { addressMapOf, decodeAddress } from '@/lib';
import { bankWords, bitName, listWords } from '@/lib/layout/words';
import { nearestWords } from '@/lib/place/nearest-window';
import type { Bench } from '../bench';
import { readAddress } from './read-address';
import { readAlias, writeAlias, type AliasDraft } from './small-drafts';

type AliasEntryProps = { bench: Bench; text: string; onChange: (text: string) => void };

/** Two addresses that lead to the same cell, in all bits of the word or in some. */
export function AliasEntry({ bench, text, onChange }: AliasEntryProps) {
  const styles = useStyles();
  const draft = readAlias(text);
  const { memory } = bench.document;
  const set = (next: Partial<AliasDraft>) => onChange(writeAlias({ ...draft, ...next }));
  const toggle = (bit: number) => {
    const chosen = draft.bits ?? [];
    const next = chosen.includes(bit) ? chosen.filter((one) => one !== bit) : [...chosen, bit].sort((a, b) => a - b);
    set({ bits: next.length === 0 ? null : next });
  };
  return (
    <View style={styles.all}>
      <Text variant="small" tone="soft">
        What is written at one address is read at the other.
      </Text>
      <View style={styles.pair}>
        <AddressField bench={bench} label="One address" value={draft.one} onChange={(one) => set({ one })} />
        <AddressField bench={bench} label="The other" value={draft.other} onChange={(other) => set({ other })} />
      </View>
      <Apart bench={bench} draft={draft} />
      <View role="group" aria-label="In which bits" style={styles.bits}>
        <Chip label="In all bits" selected={draft.bits === null} onPress={() => set({ bits: null })} />
        {Array.from({ length: memory.dataBits }, (_, bit) => (
          <Chip
            key={bit}
            label={bitName(memory, bit)}
            aria-label={`Only in bit ${bitName(memory, bit)}`}
            selected={draft.bits?.includes(bit) ?? false}
            onPress={() => toggle(bit)}
          />
        ))}
      </View>
    </View>
  );
}

type AddressFieldProps = { bench: Bench; label: string; value: string; onChange: (text: string) => void };

function AddressField({ bench, label, value, onChange }: AddressFieldProps) {
  const styles = useStyles();
  const { index, document } = bench;
  const address = readAddress(index, value);
  const map = addressMapOf(index);
  const places = address === null ? [] : decodeAddress(map, address);
  const problem =
    value.trim() === ''
      ? undefined
      : address === null
        ? `This board writes addresses in ${document.addressMap.notation}.`
        : places.length === 0
          ? nearestWords(map, address)
          : undefined;
  const where = places[0] === undefined ? '' : bankWords(document.memory.banks[places[0].bank]?.id ?? '');
  return (
    <View style={styles.field}>
      <Field
        mono
        label={label}
        value={value}
        onChangeText={onChange}
        error={problem}
        hint={places[0] === undefined ? undefined : `${where}, word ${places[0].word}`}
      />
    </View>
  );
}

/** In which address bits the two differ: the line that is lost is among them. */
function Apart({ bench, draft }: { bench: Bench; draft: AliasDraft }) {
  const one = readAddress(bench.index, draft.one);
  const other = readAddress(bench.index, draft.other);
  if (one === null || other === null) return <View role="status" />;
  const bits = Array.from({ length: 40 }, (_, bit) => bit).filter(
    (bit) => Math.floor(one / 2 ** bit) % 2 !== Math.floor(other / 2 ** bit) % 2,
  );
  return (
    <View role="status">
      <Text variant="small" tone={bits.length === 0 ? 'pencil' : 'ink'}>
        {bits.length === 0
          ? 'That is the same address twice.'
          : `They differ in address ${bits.length === 1 ? 'bit' : 'bits'} ${listWords(bits.map(String))}.`}
      </Text>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  pair: { flexDirection: 'row', gap: t.space.md, alignItems: 'flex-start' },
  field: { flex: 1, minWidth: 0 },
  bits: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
