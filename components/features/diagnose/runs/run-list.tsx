import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Text } from '@/components/ui/text';
import type { Diagnosis, Run } from '@/shared';
import { evidenceWords, runTitle } from '../evidence-words';
import type { Bench } from '../bench';
import type { EvidencePlace } from '../workspace-runs';
import { WordPlaces } from './word-places';

type RunListProps = {
  bench: Bench;
  runs: readonly Run[];
  diagnosis: Diagnosis;
  onEdit: (place: EvidencePlace) => void;
  /** Takes out what cannot be changed. */
  onTakeOut: (place: EvidencePlace) => void;
  onRemoveRun: (run: number) => void;
  onComplete: (run: number, complete: boolean) => void;
};

/** Every run with what was done before it and what it reported. */
export function RunList(props: RunListProps) {
  const styles = useStyles();
  return (
    <View role="list" aria-label="Runs" style={styles.list}>
      {props.runs.map((run, at) => (
        <OneRun key={at} {...props} run={run} at={at} />
      ))}
    </View>
  );
}

const wholes = [
  { value: 'whole', label: 'The whole list' },
  { value: 'more', label: 'There was more' },
] as const;

function OneRun({ run, at, bench, runs, diagnosis, ...act }: RunListProps & { run: Run; at: number }) {
  const styles = useStyles();
  const waits = run.evidence.length === 0;
  const last = at === runs.length - 1;
  return (
    <View role="listitem" style={[styles.run, waits && styles.waits]}>
      <View style={styles.head}>
        <Text variant="strong" style={styles.title}>
          {runTitle(run, at)}
        </Text>
        {last && at > 0 ? (
          <Button
            kind="quiet"
            label="Take back"
            aria-label={`Take back run ${at + 1}`}
            onPress={() => act.onRemoveRun(at)}
          />
        ) : null}
      </View>
      {waits ? <Text tone="soft">{last ? 'What does it report now?' : 'Nobody reported anything.'}</Text> : null}
      {run.evidence.map((seen, index) => {
        const { text, note, code } = evidenceWords(seen, bench, runs.slice(0, at + 1));
        const read = diagnosis.evidence.find((one) => one.run === at && one.index === index);
        const refused = read !== undefined && !read.ok ? read.reason : null;
        return (
          <View key={index} style={styles.seen}>
            <View style={styles.words}>
              <Text variant={code ? (text.length > 12 ? 'codeSmall' : 'codeMedium') : 'strong'}>{text}</Text>
              <Text variant="small" tone="soft">
                {[note, ...(read?.notes ?? [])].join('; ')}
              </Text>
              <WordPlaces index={bench.index} words={read?.words ?? []} />
              {refused === null ? null : (
                <Text variant="smallStrong" tone="pencil">
                  {`Not used: ${refused}`}
                </Text>
              )}
            </View>
            {seen.kind === 'finding' ? (
              <Button
                kind="plain"
                label="Take out"
                aria-label={`Take out ${text}`}
                onPress={() => act.onTakeOut({ run: at, index })}
              />
            ) : (
              <Button
                kind="plain"
                label="Change"
                aria-label={`Change ${text}`}
                onPress={() => act.onEdit({ run: at, index })}
              />
            )}
          </View>
        );
      })}
      {asksForWhole(bench, run) ? (
        <SegmentedControl
          label={`Was that the whole list of run ${at + 1}?`}
          options={wholes}
          value={run.complete ? 'whole' : 'more'}
          onChange={(value) => act.onComplete(at, value === 'whole')}
        />
      ) : null}
    </View>
  );
}

/** Only a machine that lists its failures leaves it open whether the list was typed to its end. */
function asksForWhole(bench: Bench, run: Run): boolean {
  return run.evidence.some(
    (seen) =>
      seen.kind === 'code' &&
      bench.formats.some(({ definition }) => definition.id === seen.format && definition.after !== 'stops'),
  );
}

const useStyles = makeStyles((t) => ({
  list: { gap: t.space.lg },
  run: {
    gap: t.space.sm,
    paddingLeft: t.space.md,
    borderLeftWidth: t.line.heavy,
    borderLeftColor: t.colours.ink,
  },
  waits: { borderLeftColor: t.colours.ruleStrong, borderStyle: 'dashed' },
  head: { flexDirection: 'row', alignItems: 'flex-start', justifyContent: 'space-between', gap: t.space.sm },
  title: { flexShrink: 1 },
  seen: { flexDirection: 'row', alignItems: 'flex-start', justifyContent: 'space-between', gap: t.space.sm },
  words: { flexShrink: 1, minWidth: 0 },
}));
