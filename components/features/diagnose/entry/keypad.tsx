import { Pressable, View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';
import type { ReportKey } from '@/lib';

type KeypadProps = {
  keys: readonly ReportKey[];
  onKey: (text: string) => void;
};

type KeyKind = 'word' | 'letter' | 'sign';

function kindOf({ label }: ReportKey): KeyKind {
  if (label.length > 2) return 'word';
  return /^\p{L}/u.test(label) ? 'letter' : 'sign';
}

/** The signs 0 to F of one number belong together, whatever else the code has. */
const isHexadecimal = (keys: readonly ReportKey[]) =>
  keys
    .slice(0, 16)
    .map(({ text }) => text)
    .join('')
    .endsWith('0123456789ABCDEF');

/** Keys of a row: so that ten digits make two rows, and a whole alphabet still fits under a thumb. */
function columnsFor(kind: KeyKind, count: number): number {
  if (kind === 'word') return 2;
  if (count > 20) return 6;
  return count === 10 || count === 5 ? 5 : 4;
}

/** The rows of a keypad: words two to a row, then letters, then digits and signs, each kind in rows of its own. */
export function rowsOf(keys: readonly ReportKey[]): { columns: number; keys: readonly ReportKey[] }[] {
  const groups = new Map<KeyKind, ReportKey[]>();
  for (const key of keys) {
    const kind = kindOf(key) === 'letter' && isHexadecimal(keys) ? 'sign' : kindOf(key);
    groups.set(kind, [...(groups.get(kind) ?? []), key]);
  }
  return [...groups].flatMap(([kind, group]) => {
    const columns = columnsFor(kind, group.length);
    return Array.from({ length: Math.ceil(group.length / columns) }, (_, row) => ({
      columns,
      keys: group.slice(row * columns, (row + 1) * columns),
    }));
  });
}

/** The keys that the format can take, each always at its place; those that cannot come next are faded. */
export function Keypad({ keys, onKey }: KeypadProps) {
  const styles = useStyles();
  return (
    <View role="group" aria-label="Keys of this code" style={styles.pad}>
      {rowsOf(keys).map((row) => (
        <View key={row.keys[0]?.text} style={styles.row}>
          {row.keys.map((key) => (
            <Key key={key.text} of={key} onKey={onKey} />
          ))}
          {/* Keeps the keys of a short row as wide as those above them. */}
          {Array.from({ length: row.columns - row.keys.length }, (_, at) => (
            <View key={at} style={styles.blank} />
          ))}
        </View>
      ))}
    </View>
  );
}

function Key({ of: { text, label, enabled }, onKey }: { of: ReportKey; onKey: (text: string) => void }) {
  const styles = useStyles();
  return (
    <Pressable
      role="button"
      aria-label={label === text ? undefined : label}
      aria-disabled={!enabled || undefined}
      disabled={!enabled}
      onPress={() => onKey(text)}
      style={(state) => [
        styles.key,
        (state.pressed || state.hovered) && enabled && styles.held,
        !enabled && styles.faded,
      ]}
    >
      <Text
        variant={label.length > 6 ? 'codeSmall' : label.length > 2 ? 'code' : 'key'}
        tone={enabled ? 'ink' : 'soft'}
        style={!enabled && styles.fadedWords}
      >
        {label}
      </Text>
    </Pressable>
  );
}

const useStyles = makeStyles((t) => ({
  pad: { gap: t.space.sm },
  row: { flexDirection: 'row', gap: t.space.sm },
  blank: { flex: 1 },
  key: {
    flex: 1,
    minWidth: 0,
    minHeight: t.target + t.space.xs,
    alignItems: 'center',
    justifyContent: 'center',
    backgroundColor: t.colours.sheet,
    borderWidth: t.line.thin,
    borderColor: t.colours.ink,
    borderRadius: t.radius.md,
    userSelect: 'none',
  },
  held: { backgroundColor: t.colours.faded },
  faded: { backgroundColor: 'transparent', borderColor: t.colours.ruleStrong },
  fadedWords: { opacity: 0.6 },
}));
