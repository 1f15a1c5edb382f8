import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';
import type { LayoutDocument } from '@/shared';

/** Where the facts of a layout come from, and which each source proves. */
export function SourceList({ sources }: Pick<LayoutDocument, 'sources'>) {
  const styles = useStyles();
  if (sources.length === 0) {
    return <Text tone="soft">No source is named. Compare with the board before a chip is pulled.</Text>;
  }
  return (
    <View role="list" aria-label="Sources">
      {sources.map(({ title, kind, author, year, page, proves }) => (
        <View key={`${title}${page ?? ''}`} role="listitem" style={styles.source}>
          <Text variant="strong">{title}</Text>
          <Text variant="small" tone="soft">
            {[kind === 'other' ? undefined : kind, author, year, page].filter((fact) => fact !== undefined).join(', ')}
          </Text>
          <Text variant="small">{proves === undefined ? 'It does not say what it proves.' : `Proves: ${proves}`}</Text>
        </View>
      ))}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  source: {
    paddingVertical: t.space.sm,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.rule,
  },
}));
