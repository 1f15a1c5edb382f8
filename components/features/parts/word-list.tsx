import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';

type WordListProps = {
  /** Name of the list for a screen reader. */
  label: string;
  items: readonly string[];
  /** Counted, where the order is that of the work. */
  numbered?: boolean;
};

/** Sentences one under the other. */
export function WordList({ label, items, numbered = false }: WordListProps) {
  const styles = useStyles();
  return (
    <View role="list" aria-label={label} style={styles.list}>
      {items.map((words, at) => (
        <View key={words} role="listitem" style={styles.item}>
          <View aria-hidden style={styles.mark}>
            <Text variant="small" tone="soft">
              {numbered ? `${at + 1}.` : '·'}
            </Text>
          </View>
          <View style={styles.words}>
            <Text variant="small">{words}</Text>
          </View>
        </View>
      ))}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  list: { gap: t.space.xs, margin: t.space.none, padding: t.space.none },
  item: { flexDirection: 'row', gap: t.space.sm },
  mark: { width: t.space.lg },
  words: { flex: 1, minWidth: 0 },
}));
