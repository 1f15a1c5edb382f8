import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Text } from '@/components/ui/text';
import { sentenceCase } from '@/lib/layout/words';
import { evidenceWords, runTitle } from '../evidence-words';
import type { WorkspaceModel } from '../use-workspace-model';

/** What the board reported last, over the answer on a phone. */
export function ReportStrip({ model: { bench, workspace, takeOut } }: { model: WorkspaceModel }) {
  const styles = useStyles();
  const at = workspace.runs.length - 1;
  const run = workspace.runs[at];
  const index = (run?.evidence.length ?? 0) - 1;
  const seen = run?.evidence[index];
  if (run === undefined || seen === undefined) return null;
  const { text, note, code } = evidenceWords(seen, bench, workspace.runs);
  const found = seen.kind === 'finding';
  const first = found ? sentenceCase(note) : `The board reports, ${note}`;
  const lead = at === 0 ? first : `Run ${runTitle(run, at)}: ${note}`;
  const verb = found ? 'Take out' : 'Change';
  return (
    <View style={styles.strip}>
      <View style={styles.words}>
        <Text variant="small" tone="soft">
          {index > 0 ? `${lead}, the last of ${index + 1}` : lead}
        </Text>
        <Text variant={code ? (text.length > 14 ? 'code' : 'codeLarge') : 'subheading'} level={null}>
          {text}
        </Text>
      </View>
      <Button
        label={verb}
        aria-label={`${verb} ${text}`}
        onPress={() =>
          found ? takeOut({ run: at, index }) : workspace.goTo({ at: 'entry', place: { run: at, index } })
        }
      />
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  strip: {
    flexDirection: 'row',
    alignItems: 'center',
    justifyContent: 'space-between',
    gap: t.space.md,
    paddingHorizontal: t.space.lg,
    paddingVertical: t.space.sm,
  },
  words: { flexShrink: 1, minWidth: 0 },
}));
