import { useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Chip } from '@/components/ui/chip';
import { Field } from '@/components/ui/field';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Text } from '@/components/ui/text';
import { addressWords, sentenceCase } from '@/lib/layout/words';
import type { PlainEvidence } from '@/shared';
import type { Bench } from '../bench';
import { readReadingsDraft, writeReadingsDraft, type ReadingsDraft, type TypedReadings } from './readings-draft';
import { readingPlaces } from './reading-places';

type ReadingsEntryProps = {
  bench: Bench;
  /** The draft as text. */
  text: string;
  typed: TypedReadings;
  onChange: (text: string) => void;
};

/** Lines that stand at once; the rest is told as a number. */
const mostShown = 8;
const mostUnread = 4;

/** Readings, typed or pasted: what each line means while it is typed, and what is said of all of them. */
export function ReadingsEntry({ bench, text, typed, onChange }: ReadingsEntryProps) {
  const styles = useStyles();
  const draft = readReadingsDraft(text);
  const set = (next: Partial<ReadingsDraft>) => onChange(writeReadingsDraft({ ...draft, ...next }));
  const shown = typed.ways[draft.way ?? 0]?.evidence ?? null;
  return (
    <View style={styles.all}>
      <Field
        mono
        multiline
        numberOfLines={3}
        label="Address, what was written, what was read"
        hint={`One reading a line, such as ${example(bench)}. The lines of a test can be pasted as they are.`}
        value={draft.text}
        onChangeText={(next) => set({ text: next, way: null })}
      />
      <Said typed={typed} />
      {typed.ways.length > 1 ? <Ways typed={typed} way={draft.way} onWay={(way) => set({ way })} /> : null}
      {shown === null ? null : <Places bench={bench} shown={shown} />}
      <Unread typed={typed} />
      <OfAll draft={draft} typed={typed} set={set} />
    </View>
  );
}

/** A line as this board writes it. */
function example({ document: { addressMap, memory } }: Bench): string {
  const at = addressMap.windows[0]?.range.from ?? 0;
  const radix = addressMap.notation === 'octal' ? 8 : addressMap.notation === 'decimal' ? 10 : 16;
  const bits = Math.min(8, memory.dataBits);
  const value = (each: number) => each.toString(radix).toUpperCase();
  return `${addressWords(addressMap, at + 26)} ${value(2 ** bits - 1)} ${value(2 ** bits - 1 - 2 ** (bits >> 1))}`;
}

/** How many lines were read, and what was taken for granted. */
function Said({ typed: { parsed, ways, cut } }: { typed: TypedReadings }) {
  const styles = useStyles();
  if (parsed.lines === 0) return <View role="status" />;
  const [first] = ways;
  const count = first?.evidence.kind === 'readings' ? first.evidence.lines.length : 0;
  return (
    <View role="status" style={styles.notes}>
      <Text variant="smallStrong" tone={first === undefined ? 'pencil' : 'ink'}>
        {first === undefined
          ? 'No line can be read yet.'
          : count === 0
            ? 'Everything passed.'
            : `${count} ${count === 1 ? 'reading' : 'readings'}.`}
      </Text>
      {cut ? (
        <Text variant="smallStrong" tone="pencil">
          This is more than is read here: take it in as a log, under “Something else”.
        </Text>
      ) : null}
      {parsed.notes.map((note) => (
        <Text key={note} variant="small" tone="soft">
          {note}
        </Text>
      ))}
    </View>
  );
}

/** The ways in which the lines can be meant, to be chosen or left open. */
function Ways({
  typed,
  way,
  onWay,
}: {
  typed: TypedReadings;
  way: number | null;
  onWay: (way: number | null) => void;
}) {
  const options = [
    { value: 'open', label: 'Not known' },
    ...typed.ways.map(({ takes }, at) => ({ value: String(at), label: sentenceCase(takes) })),
  ];
  return (
    <SegmentedControl
      label="How the lines are meant"
      options={options}
      value={way === null ? 'open' : String(way)}
      onChange={(value) => onWay(value === 'open' ? null : Number(value))}
    />
  );
}

function Places({ bench, shown }: { bench: Bench; shown: PlainEvidence }) {
  const styles = useStyles();
  if (shown.kind !== 'readings') return null;
  const more = shown.lines.length - mostShown;
  return (
    <View role="list" aria-label="What each line means" style={styles.lines}>
      {readingPlaces(bench.index, shown, mostShown).map(({ text, means, wrong }, at) => (
        <View key={at} role="listitem" style={styles.line}>
          <Text variant="codeSmall" style={styles.reading}>
            {text}
          </Text>
          <Text variant={wrong ? 'smallStrong' : 'small'} tone={wrong ? 'pencil' : 'ink'} style={styles.means}>
            {means}
          </Text>
        </View>
      ))}
      {more > 0 ? (
        <View role="listitem">
          <Text variant="small" tone="soft">{`and ${more} more`}</Text>
        </View>
      ) : null}
    </View>
  );
}

/** Lines that were not read, by number, and why. */
function Unread({ typed: { parsed } }: { typed: TypedReadings }) {
  const styles = useStyles();
  if (parsed.unread.length === 0) return null;
  return (
    <View role="list" aria-label="Lines that were not read" style={styles.notes}>
      {parsed.unread.slice(0, mostUnread).map(({ line, reason }) => (
        <View key={line} role="listitem">
          <Text variant="small">
            <Text variant="smallStrong" tone="pencil">{`Line ${line} not read: `}</Text>
            {reason}
          </Text>
        </View>
      ))}
      {parsed.unread.length > mostUnread ? (
        <View role="listitem">
          <Text variant="small" tone="soft">{`and ${parsed.unread.length - mostUnread} more lines`}</Text>
        </View>
      ) : null}
    </View>
  );
}

type OfAllProps = { draft: ReadingsDraft; typed: TypedReadings; set: (next: Partial<ReadingsDraft>) => void };

/** What is said of all lines together. */
function OfAll({ draft, typed, set }: OfAllProps) {
  const styles = useStyles();
  const [asks, setAsks] = useState(false);
  const waits = asks || draft.waited !== '';
  const passed = typed.rest === 'passed';
  const words = typed.unit === 'word';
  return (
    <View style={styles.notes}>
      <View role="group" aria-label="Said of all lines" style={styles.row}>
        <Chip
          label="All else was tested and passed"
          selected={passed}
          onPress={() => set({ rest: passed ? 'unknown' : 'passed' })}
        />
        <Chip
          label="Addresses count words"
          selected={words}
          onPress={() => set({ unit: words ? 'address' : 'word', way: null })}
        />
        <Chip
          label="It waited before reading"
          selected={waits}
          onPress={() => {
            setAsks(!waits);
            if (waits) set({ waited: '' });
          }}
        />
      </View>
      {waits ? (
        <Field
          label="Seconds between writing and reading"
          inputMode="decimal"
          value={draft.waited}
          onChangeText={(waited) => set({ waited })}
          error={
            draft.waited.trim() !== '' && typed.waited === null ? 'Write a number of seconds, up to a day.' : undefined
          }
        />
      ) : null}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  notes: { gap: t.space.xs },
  lines: { gap: t.space.xs },
  line: { flexDirection: 'row', flexWrap: 'wrap', columnGap: t.space.md, alignItems: 'baseline' },
  reading: { flexShrink: 0 },
  means: { flexGrow: 1, flexShrink: 1, flexBasis: t.measure.beside, minWidth: 0 },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
