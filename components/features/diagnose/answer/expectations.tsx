import { useMemo } from 'react';
import { Sheet } from '@/components/ui/sheet';
import { Text } from '@/components/ui/text';
import { diagnose } from '@/lib';
import type { NextCheck, Run } from '@/shared';
import type { Bench } from '../bench';
import { doneOf } from './done-of';
import { OutcomeList } from './outcome-list';

type ExpectationsProps = {
  bench: Bench;
  runs: readonly Run[];
  onSaw: (outcome: NextCheck['outcomes'][number]) => void;
};

/** While a run waits for its report: what the board may show, and what each case means. */
export function Expectations({ bench, runs, onSaw }: ExpectationsProps) {
  const check = useMemo(() => checkBefore(bench, runs), [bench, runs]);
  return (
    <Sheet kind="boxed" gap="sm" label="What to expect">
      <Text variant="subheading" level={2}>
        Run the test, and type what it reports
      </Text>
      {check === null ? (
        <Text variant="small" tone="soft">
          Nothing reported is a report too: choose “All passed”.
        </Text>
      ) : (
        <OutcomeList outcomes={check.outcomes} onSaw={onSaw} />
      )}
    </Sheet>
  );
}

/** The check whose making began the run that waits; null where something else was done. */
function checkBefore({ index }: Bench, runs: readonly Run[]): NextCheck | null {
  const changes = JSON.stringify(runs.at(-1)?.changes);
  const checks = diagnose(index, runs.slice(0, -1)).nextChecks;
  const began = (check: NextCheck) => {
    const done = doneOf(check);
    return done !== null && 'changes' in done && JSON.stringify(done.changes) === changes;
  };
  return checks.find((check) => check.outcomes.length > 0 && began(check)) ?? null;
}
