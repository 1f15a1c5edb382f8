import { useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Sheet } from '@/components/ui/sheet';
import { Text } from '@/components/ui/text';
import type { Change, Diagnosis, NextCheck } from '@/shared';
import { doneOf, type Done } from './done-of';
import { OutcomeList } from './outcome-list';
import { minutesWords, worthWords } from './worth-words';

type Outcome = NextCheck['outcomes'][number];

type NextChecksProps = {
  diagnosis: Diagnosis;
  /** The check was made. */
  onDone: (done: Done) => void;
  /** A check was made that changed this, nothing where it only looked, and this is what it showed. */
  onSaw: (changes: readonly Change[], outcome: Outcome) => void;
  /** Something else was done. */
  onOther: () => void;
};

/** The next check, what it costs, what the board will report in each case, and the way to say that it was made. */
export function NextChecks({ diagnosis, onDone, onSaw, onOther }: NextChecksProps) {
  const styles = useStyles();
  const [open, setOpen] = useState(false);
  const { nextChecks, outcome } = diagnosis;
  const shown = open ? nextChecks : nextChecks.slice(0, 1);
  if (outcome === 'no-evidence') return null;
  return (
    <View style={styles.all}>
      {shown.map((check, at) => (
        <Check
          key={`${check.action}${check.label}`}
          {...{ check, onDone, onSaw }}
          first={at === 0}
          worth={worthWords(check, nextChecks)}
        />
      ))}
      <View style={styles.row}>
        {nextChecks.length > 1 ? (
          <Button
            label={open ? 'The best check only' : `Other checks (${nextChecks.length - 1})`}
            aria-expanded={open}
            onPress={() => setOpen(!open)}
          />
        ) : null}
        <Button label="Something else was done" onPress={onOther} />
      </View>
    </View>
  );
}

type CheckProps = Pick<NextChecksProps, 'onDone' | 'onSaw'> & { check: NextCheck; first: boolean; worth: string };

function Check({ check, first, worth, onDone, onSaw }: CheckProps) {
  const done = doneOf(check);
  // The first sentence says what to do; what follows explains it.
  const [what = '', rest = ''] = check.label.split(/(?<=\.) (.*)/s);
  const changes = done !== null && 'changes' in done ? done.changes : null;
  const finds = check.outcomes.some(({ finding }) => finding !== undefined);
  return (
    <Sheet kind={first ? 'boxed' : 'paper'} gap="sm" label={first ? 'Next check' : 'Another check'}>
      <View>
        <Text variant="subheading" level={2}>
          {first ? `Next: ${what.charAt(0).toLowerCase()}${what.slice(1)}` : what}
        </Text>
        <Text variant="small" tone="soft">
          {[minutesWords(check.minutes), worth].filter((words) => words !== '').join(', ')}
        </Text>
      </View>
      {rest === '' ? null : <Text variant="small">{rest}</Text>}
      {finds || (changes !== null && check.outcomes.length > 0) ? (
        <Text variant="small" tone="soft">
          {finds ? 'Done already? Tap what was found.' : 'Done already? Tap what it reports.'}
        </Text>
      ) : null}
      <OutcomeList
        outcomes={check.outcomes}
        onSaw={finds || changes !== null ? (outcome) => onSaw(changes ?? [], outcome) : undefined}
        canSee={({ finding }) => changes !== null || finding !== undefined}
      />
      {done === null ? null : (
        <Button kind={first ? 'primary' : 'secondary'} wide label={done.label} onPress={() => onDone(done)} />
      )}
    </Sheet>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
