import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Chip } from '@/components/ui/chip';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Text } from '@/components/ui/text';
import { evidenceWords } from '../evidence-words';
import type { WorkspaceModel } from '../use-workspace-model';
import { runInHand } from '../workspace-runs';

const wholes = [
  { value: 'whole', label: 'That was the whole list' },
  { value: 'more', label: 'There was more' },
] as const;

/** What of the run in hand is entered already, where a machine reports one failure after the other. */
export function EnteredList({ model: { bench, workspace, entry, takeOut } }: { model: WorkspaceModel }) {
  const styles = useStyles();
  const { runs } = workspace;
  const at = runInHand(runs);
  const seen = runs[at]?.evidence ?? [];
  if (entry.editing || seen.length === 0) return null;
  return (
    <View style={styles.all}>
      <Text variant="small" tone="soft">
        {seen.length === 1 ? 'One report is in this run.' : `${seen.length} reports are in this run.`}
      </Text>
      <View role="list" aria-label="Reports of this run" style={styles.row}>
        {seen.map((one, index) => {
          const { text } = evidenceWords(one, bench, runs);
          const place = { run: at, index };
          const found = one.kind === 'finding';
          return (
            <View key={index} role="listitem">
              <Chip
                label={text}
                aria-label={`${text}, ${found ? 'take out' : 'change'}`}
                onPress={() => (found ? takeOut(place) : workspace.goTo({ at: 'entry', place }))}
              />
            </View>
          );
        })}
      </View>
      {entry.lists && entry.format !== null ? (
        <SegmentedControl
          label="Was that the whole list?"
          options={wholes}
          value={entry.complete ? 'whole' : 'more'}
          onChange={(value) => entry.setWhole(value === 'whole')}
        />
      ) : null}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.sm },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm, maxHeight: t.target * 3, overflow: 'scroll' },
}));
