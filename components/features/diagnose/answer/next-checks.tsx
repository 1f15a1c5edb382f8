import { useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { percentWords } from '@/components/ui/percent';
import { Sheet } from '@/components/ui/sheet';
import { Text } from '@/components/ui/text';
import type { Change, Diagnosis, NextCheck } from '@/shared';

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
      {check.outcomes.length === 0 ? null : (
        <View role="list" aria-label="What the board may report" style={styles.outcomes}>
          {check.outcomes.map(({ sees, means, probability }) => (
            <View key={`${sees}${means}`} role="listitem" style={styles.outcome}>
              <View style={styles.sees}>
                <Text variant={isWords(sees) ? 'smallStrong' : 'codeSmall'}>{sees}</Text>
              </View>
              <View style={styles.means}>
                <Text variant="small">{means}</Text>
              </View>
              <Text variant="small" tone="soft" style={styles.fixed}>
                {percentWords(probability)}
              </Text>
            </View>
          ))}
        </View>
      )}
      {done === null ? null : <Button kind="primary" wide label={done.label} onPress={() => onDone(done.changes)} />}
    </Sheet>
  );
}

/** The button that says the check was made, and what that changed. Null where it ends in no run. */
export function doneOf({ action, sockets }: NextCheck): { label: string; changes: Change[] } | null {
  const [one, other] = sockets;
  switch (action) {
    case 'swap':
      if (one === undefined || other === undefined) return null;
      return { label: 'I swapped them', changes: [{ kind: 'swap', sockets: [one, other] }] };
    case 'replace':
      if (one === undefined) return null;
      return { label: 'I fitted a good chip', changes: [{ kind: 'replace', socket: one, with: 'known-good' }] };
    case 'reseat':
      if (one === undefined) return null;
      return { label: 'I reseated it', changes: [{ kind: 'reseat', socket: one }] };
    case 'read-again':
      return { label: 'I have another report', changes: [] };
    case 'soak':
      return { label: 'It has run', changes: sockets.map((socket): Change => ({ kind: 'reseat', socket })) };
    case 'measure':
    case 'probe':
    case 'pull-in-turn':
      return null;
  }
}

/** What is seen may be a code, or words such as "no failure". */
const isWords = (sees: string) => /^[a-z]{2,}( |$)/.test(sees);

function minutesWords(minutes: number): string {
  return minutes < 120 ? `${Math.round(minutes)}\u00a0min` : `${Math.round(minutes / 60)}\u00a0h`;
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
  head: { flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', gap: t.space.md },
  label: { flexShrink: 1 },
  outcomes: { gap: t.space.xs },
  outcome: { flexDirection: 'row', gap: t.space.md, alignItems: 'baseline' },
  fixed: { flexShrink: 0 },
  sees: { flexBasis: 0, flexGrow: 2, minWidth: 0 },
  means: { flexBasis: 0, flexGrow: 5, minWidth: 0 },
}));
