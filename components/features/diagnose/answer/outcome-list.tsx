import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { percentWords } from '@/components/ui/percent';
import { Text } from '@/components/ui/text';
import type { NextCheck } from '@/shared';

/** What the board may report after a check, what each case means, and how likely it is. */
export function OutcomeList({ outcomes }: Pick<NextCheck, 'outcomes'>) {
  const styles = useStyles();
  if (outcomes.length === 0) return null;
  return (
    <View role="list" aria-label="What the board may report" style={styles.outcomes}>
      {outcomes.map(({ sees, means, probability }) => (
        <View key={`${sees}${means}`} role="listitem" style={styles.outcome}>
          <View style={styles.sees}>
            <Text variant={isWords(sees) ? 'smallStrong' : 'codeSmall'}>{sees}</Text>
          </View>
          <View style={styles.means}>
            <Text variant="small">{means}</Text>
          </View>
          <Text variant="small" tone="soft" align="right" style={styles.percent}>
            {percentWords(probability)}
          </Text>
        </View>
      ))}
    </View>
  );
}

/** What is seen may be a code, or words such as "no failure". */
const isWords = (sees: string) => /^[a-z]{2,}( |$)/.test(sees);

const useStyles = makeStyles((t) => ({
  outcomes: { gap: t.space.xs },
  outcome: { flexDirection: 'row', gap: t.space.md, alignItems: 'baseline' },
  sees: { flexBasis: 0, flexGrow: 2, minWidth: 0 },
  means: { flexBasis: 0, flexGrow: 5, minWidth: 0 },
  percent: { flexShrink: 0, minWidth: t.target },
}));
