import { useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Text } from '@/components/ui/text';
import type { CheckedText, PlacedProblem } from './check-text';
import type { TextPlace } from './json-text';

type ProblemListProps = { checked: CheckedText; onShow: (place: TextPlace) => void };

/** Problems that are listed before one asks for more: a field too many in every socket makes two thousand. */
const firstShown = 20;

const many = (count: number, one: string) => `${count} ${one}${count === 1 ? '' : 's'}`;

/** How many problems there are, in words. */
export function problemCount({ problems, errors, document }: CheckedText): string {
  if (problems.length === 0) return document === null ? '' : 'No problem found.';
  const warnings = problems.length - errors;
  return [errors > 0 && many(errors, 'error'), warnings > 0 && `${many(warnings, 'place')} to look at again`]
    .filter(Boolean)
    .join(', ');
}

/** Everything that is wrong or doubtful, in words, each with the way to its line. */
export function ProblemList({ checked, onShow }: ProblemListProps) {
  const styles = useStyles();
  const [all, setAll] = useState(false);
  const { problems } = checked;
  const shown = all ? problems : problems.slice(0, firstShown);
  return (
    <View style={styles.all}>
      {problems.length === 0 ? null : (
        <View role="list" aria-label="Problems">
          {shown.map((problem, at) => (
            <Problem key={`${problem.pointer}${problem.code}${at}`} problem={problem} onShow={onShow} />
          ))}
        </View>
      )}
      {problems.length > shown.length ? (
        <Button label={`Show all ${problems.length}`} onPress={() => setAll(true)} />
      ) : null}
    </View>
  );
}

function Problem({ problem, onShow }: { problem: PlacedProblem; onShow: (place: TextPlace) => void }) {
  const styles = useStyles();
  const { severity, message, pointer, place } = problem;
  const error = severity === 'error';
  return (
    <View role="listitem" style={[styles.problem, error ? styles.error : styles.warning]}>
      <View style={styles.words}>
        <Text variant="small">
          <Text variant="smallStrong" tone={error ? 'pencil' : 'mark'}>
            {error ? 'Error: ' : 'Look again: '}
          </Text>
          {message}
        </Text>
        {pointer === '' ? null : (
          <Text variant="fine" tone="soft">
            {pointer}
          </Text>
        )}
      </View>
      <Button
        kind="quiet"
        label={`Line ${place.line}`}
        aria-label={`Line ${place.line}, show it: ${message}`}
        onPress={() => onShow(place)}
      />
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.sm },
  problem: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: t.space.sm,
    paddingLeft: t.space.md,
    borderLeftWidth: t.line.underline,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.rule,
  },
  error: { borderLeftColor: t.colours.pencil },
  warning: { borderLeftColor: t.colours.mark },
  words: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0, paddingVertical: t.space.sm },
}));
