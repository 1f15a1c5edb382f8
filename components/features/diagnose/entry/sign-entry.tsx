import { useEffect, useRef } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Text } from '@/components/ui/text';
import { signKinds, type SignKind } from '@/shared';
import type { Bench } from '../bench';
import { signWords } from '../sign-words';
import { ActionList } from './choice-list';
import { readSign, writeSign, type SignDraft } from './small-drafts';
import { SocketField } from './socket-field';

type SignEntryProps = { bench: Bench; text: string; onChange: (text: string) => void };

const lines = signKinds.map((sign) => ({ value: sign, label: signWords[sign].label, help: signWords[sign].help }));

/** What the board does besides naming bits: chosen from a list, which then makes room for where it was seen. */
export function SignEntry({ bench, text, onChange }: SignEntryProps) {
  const draft = readSign(text);
  const set = (next: Partial<SignDraft>) => onChange(writeSign({ ...draft, ...next }));
  if (draft.sign === null) {
    return (
      <ActionList<SignKind> label="What the board does" lines={lines} onPress={(sign) => set({ sign, socket: '' })} />
    );
  }
  return <Chosen bench={bench} sign={draft.sign} socket={draft.socket} set={set} />;
}

type ChosenProps = {
  bench: Bench;
  sign: SignKind;
  socket: string;
  set: (next: Partial<SignDraft>) => void;
};

function Chosen({ bench, sign, socket, set }: ChosenProps) {
  const styles = useStyles();
  const words = useRef<View>(null);
  // The line that was pressed is gone; the focus goes to what stands in its place.
  useEffect(() => (words.current as unknown as HTMLElement | null)?.focus({ preventScroll: true }), []);
  const { label, help, socket: asked } = signWords[sign];
  return (
    <View style={styles.all}>
      <View style={styles.head}>
        <View ref={words} tabIndex={-1} style={styles.words}>
          <Text variant="strong">{label}</Text>
          <Text variant="small" tone="soft">
            {help}
          </Text>
        </View>
        <Button label="Another sign" onPress={() => set({ sign: null, socket: '' })} />
      </View>
      {asked === undefined ? null : (
        <SocketField bench={bench} label={asked} optional value={socket} onChange={(next) => set({ socket: next })} />
      )}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  head: { flexDirection: 'row', alignItems: 'center', gap: t.space.md },
  words: { flex: 1, minWidth: 0 },
}));
