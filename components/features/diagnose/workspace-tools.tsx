import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { toggleStar, useDeviceBoards } from '@/components/features/lookup/device-boards';
import { boardName } from '@/components/api/layouts';
import { useShareLink } from './use-share-link';
import type { WorkspaceModel } from './use-workspace-model';

/** What can be done with the look-up as a whole. */
export function WorkspaceTools({ model, onPrint }: { model: WorkspaceModel; onPrint: () => void }) {
  const styles = useStyles();
  const { bench, workspace, diagnosis } = model;
  const { board } = bench.document;
  const { starred } = useDeviceBoards();
  const { slug } = workspace;
  const star = starred.some((one) => one.slug === slug);
  const share = useShareLink(`${board.name}, rev ${board.revision}: ${diagnosis.headline}`, workspace.leftBehind);
  if (workspace.runs.length === 0 || workspace.step.at !== 'answer') return null;
  return (
    <View style={styles.tools}>
      <Button label="Print the pull sheet" onPress={onPrint} />
      <Button label="Copy or share the link" onPress={share} />
      <Button
        label={star ? 'Starred' : 'Star this board'}
        pressed={star}
        onPress={() => toggleStar({ slug, name: boardName(board) })}
      />
      <Button kind="quiet" label="Start over" onPress={() => workspace.commit([], { at: 'entry', place: null })} />
    </View>
  );
}

const useStyles = makeStyles((t) => ({ tools: { gap: t.space.sm, alignItems: 'stretch' } }));
