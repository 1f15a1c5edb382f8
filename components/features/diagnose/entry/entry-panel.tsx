import type { ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Text } from '@/components/ui/text';
import type { WorkspaceModel } from '../use-workspace-model';
import { runTitle } from '../evidence-words';
import type { Workspace } from '../use-workspace';
import { awaitsReport, runInHand } from '../workspace-runs';
import { CodeEntry } from './code-entry';
import { CodeKeys } from './code-keys';
import { EnteredList } from './entered-list';
import { isOther, otherTab, stripTabs } from './entry-tabs';
import { hasOwnWay, KindEntry } from './kind-entry';

type EntryPanelProps = {
  model: WorkspaceModel;
  /** What stands between the code and the keys: on a phone the sketch. */
  between?: ReactNode;
  /** Holds the keys at the foot of the screen, under the thumb. */
  keysAtFoot?: boolean;
};

/** What did the board report? The format and its code with the keys that it can take, or another kind of evidence. */
export function EntryPanel({ model, between, keysAtFoot = false }: EntryPanelProps) {
  const styles = useStyles();
  const { bench, workspace, entry } = model;
  const choice = (
    <SegmentedControl
      label="How it was reported"
      options={stripTabs(bench)}
      value={isOther(bench, entry.tab) ? otherTab : entry.tab}
      onChange={entry.chooseTab}
    />
  );
  return (
    <View style={styles.panel}>
      <View style={styles.top}>
        <EntryTitle model={model} named={keysAtFoot} />
        {keysAtFoot ? (
          <ScrollView horizontal showsHorizontalScrollIndicator={false} contentContainerStyle={styles.tabs}>
            {choice}
          </ScrollView>
        ) : (
          choice
        )}
        <CodeEntry bench={bench} entry={entry} />
        <KindEntry
          bench={bench}
          entry={entry}
          onClose={() => (entry.editing ? workspace.goTo({ at: 'answer' }) : entry.chooseTab(otherTab))}
        />
        <EnteredList model={model} />
        {workspace.runs.length > 0 ? <EditActions model={model} /> : null}
      </View>
      {between}
      {hasOwnWay(entry.tab) ? null : <CodeKeys entry={entry} atFoot={keysAtFoot} />}
    </View>
  );
}

/** The question, and on a phone over it the run that it is about; elsewhere the list of runs stands above. */
function EntryTitle({ model: { workspace }, named }: { model: WorkspaceModel; named: boolean }) {
  const { runs, step } = workspace;
  const place = step.at === 'entry' ? step.place : null;
  const at = place?.run ?? runInHand(runs);
  const run = runs[at];
  const later = at > 0 || (run?.evidence.length ?? 0) > 0;
  const title = titleOf(workspace);
  return (
    <View>
      {named && run !== undefined && later ? (
        <Text variant="small" tone="soft">
          {`Run ${runTitle(run, at)}`}
        </Text>
      ) : null}
      <Text variant="title">{title}</Text>
    </View>
  );
}

function titleOf({ runs, step }: Workspace): string {
  if (step.at === 'entry' && step.place !== null) return 'What did it report?';
  if (!awaitsReport(runs)) return 'What else did it report?';
  return runs.length > 1 ? 'What does it report now?' : 'What did the board report?';
}

/** The ways out of typing where there is an answer to go back to. */
function EditActions({ model: { workspace, entry, diagnosis } }: { model: WorkspaceModel }) {
  const styles = useStyles();
  if (diagnosis.evidence.length === 0 || (awaitsReport(workspace.runs) && !entry.editing)) return null;
  return (
    <View style={styles.row}>
      <Button kind="quiet" label="Back to the answer" onPress={() => workspace.goTo({ at: 'answer' })} />
      {entry.editing ? <Button kind="danger" label="Take this report out" onPress={entry.remove} /> : null}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  panel: { gap: t.space.lg, flexGrow: 1 },
  top: { gap: t.space.md },
  tabs: { paddingVertical: t.space.hair },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
