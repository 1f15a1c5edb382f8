import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { signKinds, type SignKind } from '@/shared';
import type { Bench } from '../bench';
import { signWords } from '../sign-words';
import { ChoiceList } from './choice-list';
import { readSign, writeSign } from './small-drafts';
import { SocketField } from './socket-field';

type SignEntryProps = { bench: Bench; text: string; onChange: (text: string) => void };

const lines = signKinds.map((sign) => ({ value: sign, label: signWords[sign].label, help: signWords[sign].help }));

/** What the board does besides naming bits, and where it was seen. */
export function SignEntry({ bench, text, onChange }: SignEntryProps) {
  const styles = useStyles();
  const draft = readSign(text);
  const asked = draft.sign === null ? undefined : signWords[draft.sign].socket;
  return (
    <View style={styles.all}>
      <ChoiceList<SignKind>
        label="What the board does"
        lines={lines}
        value={draft.sign}
        onChange={(sign) => onChange(writeSign({ ...draft, sign }))}
      />
      {asked === undefined ? null : (
        <SocketField
          bench={bench}
          label={asked}
          optional
          value={draft.socket}
          onChange={(socket) => onChange(writeSign({ ...draft, socket }))}
        />
      )}
    </View>
  );
}

const useStyles = makeStyles((t) => ({ all: { gap: t.space.md } }));
