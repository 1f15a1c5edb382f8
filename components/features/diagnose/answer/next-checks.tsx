import { useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Sheet } from '@/components/ui/sheet';
import { Text } from '@/components/ui/text';
import type { Change, Diagnosis, NextCheck } from '@/shared';
import { doneOf } from './done-of';
import { OutcomeList } from './outcome-list';

type NextChecksProps = {
  diagnosis: Diagnosis;
  /** The check was made: begins a run with what it changed. */
  onDone: (changes: readonly Change[]) => void;
  /** Something else was done. */
  onOther: () => void;
};

/** The next check, what it costs, what the board will report in each case, and the way to say that it was made. */
export function NextChecks({ diagnosis, onDone, onOther }: NextChecksProps) {
  const styles = useStyles();
  const [open, setOpen] = useState(false);
  const { nextChecks, outcome } = diagnosis;
  const shown = open ? nextChecks : nextChecks.slice(0, 1);
  if (outcome === 'no-evidence') return null;
  return (
    <View style={styles.all}>
      {shown.map((check) => (
        <Check key={`${check.action}${check.label}`} check={check} onDone={onDone} />
      ))}
      <View style={styles.row}>
        {nextChecks.length > 1 ? (
          <Button
            label={open ? 'The best check only' : `Other checks (${nextChecks.length - 1})`}
            onPress={() => setOpen(!open)}
          />
        ) : null}
        <Button label="Something else was done" onPress={onOther} />
      </View>
    </View>
  );
}

function Check({ check, onDone }: { check: NextCheck; onDone: (changes: readonly Change[]) => void }) {
  const styles = useStyles();
  const done = doneOf(check);
  // The first sentence says what to do; what follows explains it.
  const [first = '', rest = ''] = check.label.split(/(?<=\.) (.*)/s);
  return (
    <Sheet kind="boxed" gap="sm" label="Next check">
      <View style={styles.head}>
        <Text variant="subheading" level={2} style={styles.label}>
          {`Next: ${first.charAt(0).toLowerCase()}${first.slice(1)}`}
        </Text>
        <Text variant="small" tone="soft" style={styles.fixed}>
          {minutesWords(check.minutes)}
        </Text>
      </View>
      {rest === '' ? null : <Text variant="small">{rest}</Text>}
      <OutcomeList outcomes={check.outcomes} />
      {done === null ? null : <Button kind="primary" wide label={done.label} onPress={() => onDone(done.changes)} />}
    </Sheet>
  );
}

function minutesWords(minutes: number): string {
  return minutes < 120 ? `${Math.round(minutes)}\u00a0min` : `${Math.round(minutes / 60)}\u00a0h`;
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
  head: { flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', gap: t.space.md },
  label: { flexShrink: 1 },
  fixed: { flexShrink: 0 },
}));
