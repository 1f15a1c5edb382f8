import { useSyncExternalStore } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Loading } from '@/components/ui/states';
import type { LayoutIndex } from '@/lib';
import type { LogEvidence } from '@/shared';
import { LogProgressPanel } from './log-progress';
import { LogSourceChoice } from './log-source';
import { logStoreOf } from './log-store';
import { LogSummaryPanel } from './log-summary';
import { PatternPanel } from './pattern-panel';

type LogImportProps = {
  index: LayoutIndex;
  /** Takes the log over, drawn together. Its lines stay on the device. */
  onEvidence: (evidence: LogEvidence) => void;
  /** Puts the import away without evidence. Left out: there is nothing to put away. */
  onClose?: () => void;
};

/** Imports the log of a memory test: choose it, see how its lines are read, read it in the background, look, use. */
export function LogImport({ index, onEvidence, onClose }: LogImportProps) {
  const styles = useStyles();
  const store = logStoreOf(index);
  const stage = useSyncExternalStore(store.subscribe, store.current, store.current);
  const { take, read, cancel, startOver } = store;
  return (
    <View style={styles.all}>
      {stage.at === 'choose' ? <LogSourceChoice problem={stage.problem} onTake={take} /> : null}
      {stage.at === 'looking' ? <Loading label={`Looking at ${stage.source.name}`} lines={3} /> : null}
      {stage.at === 'pattern' ? <PatternPanel index={index} look={stage} onRead={read} onOther={startOver} /> : null}
      {stage.at === 'reading' ? (
        <LogProgressPanel
          name={stage.source.name}
          progress={stage.progress}
          foreground={stage.foreground}
          onCancel={cancel}
        />
      ) : null}
      {stage.at === 'done' ? (
        <LogSummaryPanel
          index={index}
          result={stage.result}
          onUse={() => {
            onEvidence(stage.result.evidence);
            startOver();
          }}
          onAgain={cancel}
          onOther={startOver}
        />
      ) : null}
      {onClose === undefined || stage.at === 'reading' ? null : (
        <View style={styles.row}>
          <Button kind="quiet" label="Close without a log" onPress={onClose} />
        </View>
      )}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  row: { flexDirection: 'row' },
}));
