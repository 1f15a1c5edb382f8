import { useMemo } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Chip } from '@/components/ui/chip';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Text } from '@/components/ui/text';
import type { Bench, BenchFormat } from '../bench';
import { doubtsOf, doubtWords, type Doubt } from './doubts';
import { bitsTab, otherTab } from './entry-tabs';
import type { Entry } from './use-entry';

type NotSureProps = { open: boolean; onClose: () => void; bench: Bench; format: BenchFormat; entry: Entry };

const after = {
  stops: 'The test stops at the first failure, so what comes after it was not tested.',
  'lists-lanes': 'The test goes on and reports every failing lane. Enter them one after the other.',
  'lists-banks': 'The test goes on and reports each failing bank once, with all its failing bits.',
} as const;

/** Help with a code: where it is seen, what it looks like, what nobody knows of it, and the ways round it. */
export function NotSure({ open, onClose, bench, format, entry }: NotSureProps) {
  const styles = useStyles();
  const { definition } = format;
  return (
    <Dialog open={open} onClose={onClose} title={definition.name}>
      {definition.where === undefined ? null : <Part title="Where to look" text={definition.where} />}
      <Part title="What it looks like" text={`It expects ${entry.code?.prefix.expects ?? 'a code'}.`} />
      <Part title="What silence means" text={after[definition.after]} />
      {definition.notes === undefined ? null : <Part title="Remarks" text={definition.notes} />}
      {format.open.length === 0 ? null : (
        <View style={styles.part}>
          <Text variant="strong">What is not known</Text>
          {format.open.map(([one, other]) => (
            <Text key={one}>{`Either ${one}, or ${other}.`}</Text>
          ))}
          <Text variant="small" tone="soft">
            Type the code as it is. Both meanings are weighed, and the answer says so; a second report often settles it.
          </Text>
        </View>
      )}
      {open ? <Doubts {...{ bench, format, entry }} /> : null}
      <View style={styles.part}>
        <Text variant="strong">It is a long code, or you have a keyboard</Text>
        <Field
          mono
          multiline
          label="Type or paste it"
          value={entry.code?.text ?? ''}
          onChangeText={entry.setCode}
          error={entry.code?.prefix.reason ?? undefined}
        />
        <Button kind="primary" label="Use this" onPress={onClose} />
      </View>
      <View style={styles.part}>
        <Text variant="strong">You cannot read the code at all</Text>
        <Text variant="small" tone="soft">
          If you know which bits fail, from a scope or from another test, mark them instead.
        </Text>
        <View style={styles.row}>
          <Button
            label="Mark failing bits"
            onPress={() => {
              entry.chooseTab(bitsTab);
              onClose();
            }}
          />
          <Button
            label="Say something else"
            onPress={() => {
              entry.chooseTab(otherTab);
              onClose();
            }}
          />
        </View>
      </View>
    </Dialog>
  );
}

/** What the layout takes for granted of this machine, to be left open where the technician does not. */
function Doubts({ bench, format: { definition }, entry }: Pick<NotSureProps, 'bench' | 'format' | 'entry'>) {
  const styles = useStyles();
  const offered = useMemo(() => doubtsOf(definition, bench.index), [definition, bench]);
  const toggle = (doubt: Doubt) =>
    entry.setDoubts(
      entry.doubts.includes(doubt) ? entry.doubts.filter((one) => one !== doubt) : [...entry.doubts, doubt],
    );
  if (offered.length === 0) return null;
  return (
    <View style={styles.part}>
      <Text variant="strong">Not sure how this machine counts?</Text>
      <Text variant="small" tone="soft">
        The layout says how. If yours may differ, leave it open: every meaning is then weighed.
      </Text>
      <View role="group" aria-label="Left open" style={styles.row}>
        {offered.map((doubt) => (
          <Chip
            key={doubt}
            label={doubtWords[doubt]}
            selected={entry.doubts.includes(doubt)}
            onPress={() => toggle(doubt)}
          />
        ))}
      </View>
    </View>
  );
}

function Part({ title, text }: { title: string; text: string }) {
  const styles = useStyles();
  return (
    <View style={styles.part}>
      <Text variant="strong">{title}</Text>
      <Text>{text}</Text>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  part: { gap: t.space.xs, alignItems: 'stretch' },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
