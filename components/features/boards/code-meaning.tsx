import { useState } from 'react';
import { View } from 'react-native';
import type { Bench, BenchFormat } from '@/components/features/diagnose/bench';
import { makeStyles } from '@/components/theme';
import { ButtonLink } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Text } from '@/components/ui/text';
import { meaningOf, type Meaning } from './code-reading';

type CodeMeaningProps = {
  bench: Bench;
  format: BenchFormat;
  /** Address of the board, for the way to its look-up; null for a board that is not published. */
  slug: string | null;
  /** Told what the code blames, so that a sketch can show it. */
  onSockets?: (sockets: readonly string[]) => void;
};

/** A field for one code, and what it means on this board. */
export function CodeMeaning({ bench, format, slug, onSockets }: CodeMeaningProps) {
  const styles = useStyles();
  const [text, setText] = useState('');
  const meaning = text.trim() === '' ? null : meaningOf(bench, format, text);
  const type = (next: string) => {
    setText(next);
    const read = next.trim() === '' ? null : meaningOf(bench, format, next);
    onSockets?.(read?.ok ? [...new Set(read.readings.flatMap(({ sockets }) => sockets))] : []);
  };
  return (
    <View style={styles.all}>
      <Field
        label="What does this code mean?"
        hint={`${format.definition.name}: ${format.compiled.next('').expects}`}
        value={text}
        onChangeText={type}
        mono
        autoCapitalize="characters"
        autoComplete="off"
      />
      <View role="status" style={styles.answer}>
        {meaning === null ? null : <Answer meaning={meaning} />}
      </View>
      {meaning?.ok && slug !== null ? (
        <ButtonLink
          href={{ pathname: '/boards/[slug]/diagnose', params: { slug, f: format.definition.id, d: text } }}
          label="Look up a failure with this code"
        />
      ) : null}
    </View>
  );
}

function Answer({ meaning }: { meaning: Meaning }) {
  const styles = useStyles();
  if (!meaning.ok) {
    return (
      <Text variant="smallStrong" tone="pencil">
        {meaning.reason}
      </Text>
    );
  }
  return (
    <>
      {meaning.readings.map(({ sockets, words, takes }) => (
        <View key={`${sockets.join()}${takes}`} style={styles.reading}>
          <Text variant="codeMedium">{sockets.join(' ') || 'no socket'}</Text>
          <Text variant="small">{takes === '' ? words : `${words}, if ${takes}`}</Text>
        </View>
      ))}
      {meaning.notes.map((note) => (
        <Text key={note} variant="small" tone="mark">
          {note}
        </Text>
      ))}
    </>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.sm },
  answer: { minHeight: t.text.small.lineHeight, gap: t.space.xs },
  reading: { gap: t.space.none },
}));
