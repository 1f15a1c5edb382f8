import { Pressable, View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';
import { useRovingFocus } from '@/components/ui/use-roving-focus';

/** One of several things to choose, with what is meant by it. */
export interface ChoiceLine<Value extends string> {
  readonly value: Value;
  readonly label: string;
  readonly help: string;
}

type ChoiceListProps<Value extends string> = {
  /** What is being chosen, for a screen reader. */
  label: string;
  lines: readonly ChoiceLine<Value>[];
  value: Value | null;
  onChange: (value: Value) => void;
};

/** One choice of several that need a sentence each, one under the other: a radio group of whole lines. */
export function ChoiceList<Value extends string>({ label, lines, value, onChange }: ChoiceListProps<Value>) {
  const styles = useStyles();
  const index = lines.findIndex((line) => line.value === value);
  const choose = (at: number) => {
    const line = lines[at];
    if (line) onChange(line.value);
  };
  const roving = useRovingFocus({ count: lines.length, index, move: choose });
  return (
    <View role="radiogroup" aria-label={label} style={styles.list} onKeyDown={roving.onKeyDown}>
      {lines.map((line, at) => {
        const selected = at === index;
        return (
          <Pressable
            key={line.value}
            ref={roving.itemRef(at)}
            role="radio"
            aria-checked={selected}
            aria-label={`${line.label}. ${line.help}`}
            tabIndex={selected || (index < 0 && at === 0) ? 0 : -1}
            onPress={() => choose(at)}
            style={(state) => [styles.line, (state.hovered || state.pressed) && styles.held]}
          >
            <View style={[styles.mark, selected && styles.marked]} />
            <LineWords line={line} strong={selected} />
          </Pressable>
        );
      })}
    </View>
  );
}

type ActionListProps<Value extends string> = {
  label: string;
  lines: readonly ChoiceLine<Value>[];
  onPress: (value: Value) => void;
};

/** Ways on, one under the other, each with what it is for. */
export function ActionList<Value extends string>({ label, lines, onPress }: ActionListProps<Value>) {
  const styles = useStyles();
  return (
    <View role="group" aria-label={label} style={styles.list}>
      {lines.map((line) => (
        <Pressable
          key={line.value}
          role="button"
          aria-label={`${line.label}. ${line.help}`}
          onPress={() => onPress(line.value)}
          style={(state) => [styles.line, (state.hovered || state.pressed) && styles.held]}
        >
          <LineWords line={line} strong />
        </Pressable>
      ))}
    </View>
  );
}

function LineWords({ line: { label, help }, strong }: { line: ChoiceLine<string>; strong: boolean }) {
  const styles = useStyles();
  return (
    <View style={styles.words}>
      <Text variant={strong ? 'strong' : 'body'}>{label}</Text>
      {help === '' ? null : (
        <Text variant="small" tone="soft">
          {help}
        </Text>
      )}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  list: { borderTopWidth: t.line.thin, borderTopColor: t.colours.ruleStrong },
  line: {
    minHeight: t.target,
    flexDirection: 'row',
    alignItems: 'center',
    gap: t.space.md,
    paddingVertical: t.space.sm,
    paddingHorizontal: t.space.sm,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.ruleStrong,
  },
  held: { backgroundColor: t.colours.faded },
  mark: {
    width: t.space.lg,
    height: t.space.lg,
    borderWidth: t.line.ink,
    borderColor: t.colours.ink,
    borderRadius: t.radius.round,
  },
  marked: { borderWidth: t.line.bar, borderColor: t.colours.pen },
  words: { flex: 1, minWidth: 0 },
}));
