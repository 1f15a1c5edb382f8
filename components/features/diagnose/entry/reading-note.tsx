import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';
import { lanesWords } from '@/lib';
import { sentenceCase } from '@/lib/layout/words';
import type { Bench } from '../bench';
import type { Entry } from './use-entry';

/** Under the code: why it is impossible, else how it is read, and what was read otherwise than typed. */
export function ReadingNote({ id, bench, entry }: { id: string; bench: Bench; entry: Entry }) {
  const styles = useStyles();
  return (
    <View id={id} role="status" style={styles.note}>
      <Words bench={bench} entry={entry} />
    </View>
  );
}

/** Whether the note has something to say of what is typed, so that what is expected may stand back. */
export function saysMore({ code, refused }: Entry): boolean {
  if (refused !== null) return true;
  return code !== null && code.text !== '' && (code.prefix.reason !== null || code.prefix.complete);
}

function Words({ bench, entry }: { bench: Bench; entry: Entry }) {
  const { code, compiled, refused } = entry;
  if (refused !== null) return <Problem text={refused} />;
  if (code === null || compiled === null || code.text === '') return null;
  if (code.prefix.reason !== null) return <Problem text={code.prefix.reason} />;
  if (!code.prefix.complete) return null;
  const read = compiled.read(code.text + code.ghost);
  if (!read.ok) return <Problem text={read.reason} />;
  const meanings = read.readings.map(({ failing, takes }) => ({
    words: sentenceCase(
      lanesWords(
        bench.index,
        failing.map(({ lane }) => lane),
      ),
    ),
    takes: takes.join(', '),
  }));
  return (
    <>
      {meanings.map(({ words, takes }) => (
        <Text key={`${words}${takes}`} variant="small">
          {takes === '' ? `${words}.` : `${words}, if ${takes}.`}
        </Text>
      ))}
      {read.notes.map((note) => (
        <Text key={note} variant="small" tone="mark">
          {/* No capital: "c read as C" would say nothing any more. */}
          {`${note}.`}
        </Text>
      ))}
    </>
  );
}

function Problem({ text }: { text: string }) {
  return (
    <Text variant="smallStrong" tone="pencil">
      {text}
    </Text>
  );
}

const useStyles = makeStyles((t) => ({ note: { gap: t.space.hair } }));
