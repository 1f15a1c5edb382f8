import type { ReactNode } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';

type DetailLinesProps = {
  /** What they are lines of. */
  label: string;
  lines: readonly { key: string; name: string; value: ReactNode }[];
};

/** Named lines under one another, ruled: what a thing is called at the left, what it is at the right. */
export function DetailLines({ label, lines }: DetailLinesProps) {
  const styles = useStyles();
  return (
    <View role="list" aria-label={label} style={styles.list}>
      {lines.map(({ key, name, value }) => (
        <View key={key} role="listitem" style={styles.line}>
          <View style={styles.name}>
            <Text variant="small" tone="soft">
              {name}
            </Text>
          </View>
          <View style={styles.value}>{typeof value === 'string' ? <Text variant="small">{value}</Text> : value}</View>
        </View>
      ))}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  list: { borderTopWidth: t.line.thin, borderTopColor: t.colours.rule },
  line: {
    flexDirection: 'row',
    alignItems: 'baseline',
    gap: t.space.md,
    paddingVertical: t.space.sm,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.rule,
  },
  name: { flexBasis: 0, flexGrow: 3, minWidth: 0 },
  value: { flexBasis: 0, flexGrow: 7, minWidth: 0, gap: t.space.hair },
}));
