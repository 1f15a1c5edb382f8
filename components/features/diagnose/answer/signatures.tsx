import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';
import { lanesWords, type BitIndex, type LayoutIndex } from '@/lib';
import type { Diagnosis, Signature } from '@/shared';

/** Patterns that stand at once. */
const mostShown = 5;

/** Patterns that were found in the readings, in words, each with the bits that show it. */
export function Signatures({ index, diagnosis }: { index: LayoutIndex; diagnosis: Diagnosis }) {
  const styles = useStyles();
  const said = diagnosis.sentences.join(' ');
  const shown = diagnosis.signatures.filter(({ words }) => !said.includes(words)).slice(0, mostShown);
  if (shown.length === 0) return null;
  return (
    <View role="list" aria-label="Patterns in the readings" style={styles.list}>
      {shown.map((signature) => (
        <View key={`${signature.words}${lanesOf(index, signature)}`} role="listitem">
          <Text variant="small">
            {signature.words}
            {signature.lanes.length === 0 ? null : (
              <Text variant="small" tone="soft">{` (${lanesOf(index, signature)})`}</Text>
            )}
          </Text>
        </View>
      ))}
    </View>
  );
}

/** The bits that a pattern was seen in, in words. */
export function lanesOf(index: LayoutIndex, { lanes }: Pick<Signature, 'lanes'>): string {
  const known = lanes.flatMap(({ bank, bit }) => {
    const at = index.bankByName.get(bank);
    return at === undefined || bit >= index.bitCount ? [] : [index.laneOf(at, bit as BitIndex)];
  });
  return lanesWords(index, known);
}

const useStyles = makeStyles((t) => ({ list: { gap: t.space.xs } }));
