import { View } from 'react-native';
import { ApiProblem } from '@/components/api/problem';
import { FormFailure } from '@/components/features/account/form-failure';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';
import type { CheckedText } from './check-text';
import type { KeptText } from './kept-text';

type SubmitBarProps = {
  checked: CheckedText;
  /** The check has caught up with the text. */
  settled: boolean;
  instead: KeptText['instead'];
  busy: boolean;
  failure: Error | null;
  onSend: () => void;
  /** Sends it as a new version rather than in place of an older one. */
  onNew: () => void;
};

/** Sends the document, or says why it cannot be sent yet. */
export function SubmitBar({ checked, settled, instead, busy, failure, onSend, onNew }: SubmitBarProps) {
  const styles = useStyles();
  const reason = settled ? whyNot(checked) : 'Checking…';
  return (
    <View style={styles.all}>
      {instead === null ? null : (
        <Text variant="small" tone="soft">
          {`It takes the place of version ${instead.number}, which was sent before.`}
        </Text>
      )}
      <View style={styles.row}>
        <Button
          kind="primary"
          label={instead === null ? 'Send to the moderators' : `Send version ${instead.number} again`}
          disabled={reason !== null}
          busy={busy}
          busyLabel="Sending…"
          onPress={onSend}
        />
        {instead === null ? null : <Button kind="quiet" label="Send as a new version instead" onPress={onNew} />}
        {reason === null ? null : (
          <Text variant="small" tone="soft" style={styles.reason}>
            {reason}
          </Text>
        )}
      </View>
      <Failure failure={failure} />
    </View>
  );
}

function whyNot({ sent, errors }: CheckedText): string | null {
  if (errors > 0) return 'First put the errors right.';
  return sent === null ? 'There is no document yet.' : null;
}

function Failure({ failure }: { failure: Error | null }) {
  const code = failure instanceof ApiProblem ? failure.code : null;
  if (code === 'version-conflict' || code === 'conflict') {
    return (
      <Notice kind="problem" live title="Its version has changed since you opened it.">
        {`${(failure as ApiProblem).message} Your text is still here. Look at its state under “What you have sent”, then send it as a new version.`}
      </Notice>
    );
  }
  if (failure instanceof ApiProblem && failure.layoutProblems.length > 0) {
    return (
      <Notice kind="problem" live title={failure.message}>
        {failure.layoutProblems
          .slice(0, 5)
          .map(({ pointer, message }) => `${pointer}: ${message}`)
          .join(' ')}
      </Notice>
    );
  }
  return <FormFailure failure={failure} />;
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.sm },
  row: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: t.space.md },
  reason: { flexShrink: 1 },
}));
