import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Chip } from '@/components/ui/chip';
import { SelectField } from '@/components/ui/select-field';
import { Text } from '@/components/ui/text';
import { wordsOfLine, type Column, type LayoutIndex } from '@/lib';
import { columnFields, type ColumnDraft, type ColumnField } from './column-draft';

type ColumnChoiceProps = {
  index: LayoutIndex;
  /** The line whose words are offered. */
  line: string;
  draft: ColumnDraft;
  onChange: (draft: ColumnDraft) => void;
};

const labels: Readonly<Record<ColumnField, string>> = {
  address: 'The address is',
  written: 'What was written is',
  read: 'What was read is',
  mask: 'The failing bits are',
};

const notations = [
  { value: 'hexadecimal', label: 'hexadecimal' },
  { value: 'octal', label: 'octal' },
  { value: 'decimal', label: 'decimal' },
] as const;

const write = (column: Column | null) =>
  column === null ? '' : typeof column === 'number' ? `#${column}` : `=${column}`;
const read = (text: string): Column | null =>
  text === '' ? null : text.startsWith('#') ? Number(text.slice(1)) : text.slice(1);

/** Points at the columns of a line: which of its words is which field, and how the numbers are written. */
export function ColumnChoice({ index, line, draft, onChange }: ColumnChoiceProps) {
  const styles = useStyles();
  const words = wordsOfLine(line);
  const after = (field: ColumnField) => (typeof draft[field] === 'string' ? [draft[field]] : []);
  const options = (field: ColumnField) => [
    { value: '', label: 'not in the line' },
    ...after(field).map((word) => ({ value: write(word), label: `after ${word}` })),
    ...words.map(({ text }, at) => ({ value: `#${at + 1}`, label: `word ${at + 1}: ${text}` })),
  ];
  const wide = index.document.addressMap.windows.some(({ lanes }) => (lanes?.length ?? 1) > 1);
  return (
    <View role="group" aria-label="Which words of the line are what" style={styles.all}>
      <Text variant="mono">{line}</Text>
      <View style={styles.grid}>
        {columnFields.map((field) => (
          <View key={field} style={styles.field}>
            <SelectField
              label={labels[field]}
              options={options(field)}
              value={write(draft[field])}
              onChange={(value) => onChange({ ...draft, [field]: read(value) })}
            />
          </View>
        ))}
        <View style={styles.field}>
          <SelectField
            label="Addresses are"
            options={notations}
            value={draft.notation}
            onChange={(value) => onChange({ ...draft, notation: value as ColumnDraft['notation'] })}
          />
        </View>
        <View style={styles.field}>
          <SelectField
            label="Values are"
            options={[...notations, { value: 'binary', label: 'binary' }]}
            value={draft.values}
            onChange={(value) => onChange({ ...draft, values: value as ColumnDraft['values'] })}
          />
        </View>
      </View>
      {wide ? <Width draft={draft} onChange={onChange} /> : null}
    </View>
  );
}

/** What the numbers count and hold, where one address carries only a part of a word. */
function Width({ draft, onChange }: Pick<ColumnChoiceProps, 'draft' | 'onChange'>) {
  const styles = useStyles();
  const words = draft.unit === 'word';
  return (
    <View style={styles.row}>
      <Chip
        label="Addresses count words"
        selected={words}
        onPress={() => onChange({ ...draft, unit: words ? 'address' : 'word', shows: 'word' })}
      />
      <Chip
        label="Values show the whole word"
        selected={words || draft.shows === 'word'}
        disabled={words}
        onPress={() => onChange({ ...draft, shows: draft.shows === 'word' ? 'address' : 'word' })}
      />
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  grid: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.md },
  field: { flexGrow: 1, flexBasis: t.measure.beside },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
