import { useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Text } from '@/components/ui/text';
import type { LayoutIndex } from '@/lib';
import { addressWords, bankWords, listWords, sentenceCase, bitName } from '@/lib/layout/words';
import type { ReadEvidence } from '@/shared';

/** Places that stand at once. */
const atOnce = 3;

type Place = ReadEvidence['words'][number];

/** Where the readings of one piece of evidence lead: bank, bits, row and column inside the chip. */
export function WordPlaces({ index, words }: { index: LayoutIndex; words: readonly Place[] }) {
  const styles = useStyles();
  const [all, setAll] = useState(false);
  if (words.length === 0) return null;
  const shown = all ? words : words.slice(0, atOnce);
  return (
    <View style={styles.all}>
      <View role="list" aria-label="Where they lead">
        {shown.map((place, at) => (
          <View key={at} role="listitem">
            <Text variant="small">
              <Text variant="codeSmall">{addressWords(index.document.addressMap, place.address)}</Text>
              {` ${placeWords(index, place)}`}
            </Text>
          </View>
        ))}
      </View>
      {words.length > atOnce ? (
        <Button
          kind="quiet"
          label={all ? 'Show the first only' : `${words.length - atOnce} more places`}
          aria-expanded={all}
          onPress={() => setAll(!all)}
          style={styles.more}
        />
      ) : null}
    </View>
  );
}

/** "Bank C, bit 3, row 12, column 26": where a failing word lies. */
export function placeWords({ document: { memory } }: LayoutIndex, { bank, word, row, column, mask }: Place): string {
  const bits = Array.from({ length: Math.min(40, memory.dataBits) }, (_, bit) => bit)
    .filter((bit) => Math.floor(mask / 2 ** bit) % 2 === 1)
    .map((bit) => bitName(memory, bit));
  return [
    sentenceCase(bankWords(bank)),
    bits.length === 0 ? '' : `${bits.length === 1 ? 'bit' : 'bits'} ${listWords(bits)}`,
    row === null || column === null ? `word ${word}` : `row ${row}, column ${column}`,
  ]
    .filter((part) => part !== '')
    .join(', ');
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.hair },
  more: { alignSelf: 'flex-start' },
}));
