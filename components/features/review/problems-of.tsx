import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';
import type { LayoutProblem } from '@/shared';

/** What the check says of a version, each problem with its place in the document. */
export function ProblemsOf({ problems }: { problems: readonly LayoutProblem[] }) {
  const styles = useStyles();
  if (problems.length === 0) {
    return <Text tone="tick">✓ No problem: every lane has a socket, every example comes out.</Text>;
  }
  return (
    <View role="list" aria-label="Problems">
      {problems.map(({ pointer, severity, code, message }) => (
        <View key={`${pointer}${code}${message}`} role="listitem" style={styles.problem}>
          <Text variant="small">
            <Text variant="smallStrong" tone={severity === 'error' ? 'pencil' : 'mark'}>
              {severity === 'error' ? 'Error: ' : 'Look again: '}
            </Text>
            {message}
          </Text>
          <Text variant="fine" tone="soft">
            {pointer === '' ? 'the whole document' : pointer}
          </Text>
        </View>
      ))}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  problem: { paddingVertical: t.space.sm, borderBottomWidth: t.line.thin, borderBottomColor: t.colours.rule },
}));
