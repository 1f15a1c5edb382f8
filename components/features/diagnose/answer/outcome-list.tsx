import { Pressable, View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { percentWords } from '@/components/ui/percent';
import { Text } from '@/components/ui/text';
import type { NextCheck } from '@/shared';

type Outcome = NextCheck['outcomes'][number];

type OutcomeListProps = {
  outcomes: readonly Outcome[];
  /** This is what happened. Left out: the list is only to be read. */
  onSaw?: (outcome: Outcome) => void;
  /** Whether there is a way to enter this one; the others are only to be read. Left out: all can be entered. */
  canSee?: (outcome: Outcome) => boolean;
};

/** What the board may report after a check, or what may be found in it, what each case means, and how likely it is. */
export function OutcomeList({ outcomes, onSaw, canSee = () => true }: OutcomeListProps) {
  const styles = useStyles();
  if (outcomes.length === 0) return null;
  return (
    <View
      role="list"
      aria-label={outcomes.some(({ finding }) => finding) ? 'What may be found' : 'What the board may report'}
      style={onSaw === undefined && styles.outcomes}
    >
      {outcomes.map((outcome) => (
        <View key={`${outcome.sees}${outcome.means}`} role="listitem">
          {onSaw === undefined || !canSee(outcome) ? (
            <View style={styles.outcome}>
              <Words outcome={outcome} />
            </View>
          ) : (
            <Pressable
              role="button"
              aria-label={`I saw ${outcome.sees}: ${outcome.means}`}
              onPress={() => onSaw(outcome)}
              style={(state) => [styles.outcome, styles.pressable, (state.hovered || state.pressed) && styles.held]}
            >
              <Words outcome={outcome} />
            </Pressable>
          )}
        </View>
      ))}
    </View>
  );
}

function Words({ outcome: { sees, means, probability } }: { outcome: Outcome }) {
  const styles = useStyles();
  return (
    <>
      <View style={[styles.sees, sees.length > longestBeside && styles.above]}>
        <Text variant={isWords(sees) ? 'smallStrong' : 'codeSmall'}>{sees}</Text>
      </View>
      <View style={styles.means}>
        <Text variant="small">{means}</Text>
      </View>
      <Text variant="small" tone="soft" align="right" style={styles.percent}>
        {percentWords(probability)}
      </Text>
    </>
  );
}

/** What is seen may be a code, or words such as "no failure" and "bit 2 of bank B (mask 04)". */
const isWords = (sees: string) => (sees.match(/(?<=^|\s)[a-z]{2,}(?=\s|$)/g) ?? []).length > 1;

/** Longest text, in characters, that stands beside what it means and not over it. */
const longestBeside = 16;

const useStyles = makeStyles((t) => ({
  outcomes: { gap: t.space.xs },
  outcome: { flexDirection: 'row', flexWrap: 'wrap', columnGap: t.space.md, alignItems: 'baseline' },
  pressable: {
    minHeight: t.target,
    paddingVertical: t.space.md,
    borderTopWidth: t.line.thin,
    borderTopColor: t.colours.ruleStrong,
  },
  held: { backgroundColor: t.colours.faded },
  sees: { flexBasis: 0, flexGrow: 2, minWidth: 0 },
  above: { flexBasis: '100%' },
  means: { flexBasis: 0, flexGrow: 5, minWidth: 0 },
  percent: { flexShrink: 0, minWidth: t.target },
}));
