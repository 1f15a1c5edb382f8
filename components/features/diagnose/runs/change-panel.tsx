import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Text } from '@/components/ui/text';
import type { Bench } from '../bench';
import { changeProblem, changeTabs, type ChangeDraft } from './change-draft';
import { FittedFamily } from './fitted-family';

type ChangePanelProps = {
  bench: Bench;
  draft: ChangeDraft;
  onDraft: (draft: ChangeDraft) => void;
  onDone: () => void;
  onCancel: () => void;
};

/** What was done to the board before the next run. Sockets are tapped on the sketch or written. */
export function ChangePanel({ bench, draft, onDraft, onDone, onCancel }: ChangePanelProps) {
  const styles = useStyles();
  const tab = changeTabs.find(({ value }) => value === draft.kind) ?? changeTabs[0];
  const problem = changeProblem(draft, (label) => bench.index.socketByLabel.has(label));
  const set = (at: 0 | 1, text: string) =>
    onDraft({ ...draft, sockets: at === 0 ? [text, draft.sockets[1]] : [draft.sockets[0], text] });
  return (
    <View style={styles.panel}>
      <SegmentedControl
        label="What was done"
        options={changeTabs}
        value={draft.kind}
        onChange={(kind) => onDraft({ ...draft, kind })}
      />
      <Text variant="small" tone="soft">
        {tab.hint}
      </Text>
      {tab.sockets === 0 ? null : (
        <View style={styles.fields}>
          <View style={styles.field}>
            <Field
              mono
              label={tab.sockets === 2 ? 'One socket' : 'Socket'}
              value={draft.sockets[0]}
              onChangeText={(text) => set(0, text)}
            />
          </View>
          {tab.sockets === 2 ? (
            <View style={styles.field}>
              <Field mono label="The other socket" value={draft.sockets[1]} onChangeText={(text) => set(1, text)} />
            </View>
          ) : null}
        </View>
      )}
      {draft.kind === 'known-good' || draft.kind === 'untested' ? (
        <FittedFamily
          bench={bench}
          socket={draft.sockets[0].trim()}
          family={draft.family}
          onFamily={(family) => onDraft({ ...draft, family })}
        />
      ) : null}
      <View role="status">
        {problem === null || problem.quiet ? null : (
          <Text variant="smallStrong" tone="pencil">
            {problem.text}
          </Text>
        )}
      </View>
      <View style={styles.row}>
        <Button kind="primary" label="Done, run again" disabled={problem !== null} onPress={onDone} />
        <Button label="Cancel" onPress={onCancel} />
      </View>
      <Text variant="fine" tone="soft">
        Power off and wait before you move a chip. Look twice at pin 1.
      </Text>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  panel: { gap: t.space.md },
  fields: { flexDirection: 'row', gap: t.space.md },
  field: { flex: 1, minWidth: 0 },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
