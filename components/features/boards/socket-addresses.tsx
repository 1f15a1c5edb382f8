import { useMemo } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';
import { effectOf, type AddressSpan, type ShapeEffect } from '@/lib';
import type { LayoutDocument } from '@/shared';
import { spanWords } from './address-spans';
import { wordsCount } from './board-facts';
import { DetailLines } from './detail-lines';

type SocketAddressesProps = { document: LayoutDocument; at: number };

/** At which addresses the chip of a socket shows, whole, and in a dead row or column; nothing where no window leads to it. */
export function SocketAddresses({ document, at }: SocketAddressesProps) {
  const styles = useStyles();
  const effect = useMemo(() => effectOf(document, at), [document, at]);
  if (effect === null || effect.whole.length === 0) return null;
  const line = (name: string, words: number | null, spans: readonly AddressSpan[]) => ({
    key: name,
    name,
    value: <Spans document={document} words={words} spans={spans} />,
  });
  const part = (name: string, shape: ShapeEffect | null) =>
    shape === null || shape.spans.length === 0 ? [] : [line(name, shape.words, shape.spans)];
  return (
    <View style={styles.part}>
      <Text variant="subheading">Addresses</Text>
      <DetailLines
        label="Addresses"
        lines={[
          line('all of it', null, effect.whole),
          ...part('a dead row, such as', effect.row),
          ...part('a dead column, such as', effect.column),
        ]}
      />
    </View>
  );
}

function Spans({
  document,
  words,
  spans,
}: {
  document: LayoutDocument;
  words: number | null;
  spans: readonly AddressSpan[];
}) {
  return (
    <>
      {spanWords(document, spans).map((each) => (
        <Text key={each} variant="code">
          {each}
        </Text>
      ))}
      {words === null ? null : (
        <Text variant="fine" tone="soft">
          {`${wordsCount(words)} words`}
        </Text>
      )}
    </>
  );
}

const useStyles = makeStyles((t) => ({ part: { gap: t.space.sm } }));
