import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { TallyStrokes } from '@/components/ui/tally-strokes';
import { Text } from '@/components/ui/text';
import type { Diagnosis } from '@/shared';
import { stated } from '../stated';

/** Words for how sure an answer is, beside its percentage. */
const sureWords: Record<Diagnosis['sure'], string> = {
  sure: 'as good as sure',
  strong: 'strong',
  likely: 'likely, not proved',
  'not sure': 'not sure',
  'no reading': '',
};

/** What to do, larger than anything else, with how sure that is. */
export function Headline({ diagnosis }: { diagnosis: Diagnosis }) {
  const styles = useStyles();
  const { headline, probability, sure, outcome } = diagnosis;
  const place = onePlace(diagnosis);
  const short = place !== null && headline === `Pull ${place} first.`;
  return (
    <View style={styles.head}>
      <View role="heading" aria-level={1} aria-label={headline} style={short ? styles.beside : styles.whole}>
        {place === null ? (
          <Labelled text={headline} labels={labelsIn(diagnosis)} />
        ) : (
          <>
            <Text variant={short ? 'heading' : 'title'} level={null}>
              {short ? 'Pull first' : headline}
            </Text>
            <Text variant={place.length > 7 ? 'codeLarge' : 'answer'} tone="answer">
              {place}
            </Text>
          </>
        )}
      </View>
      {probability === null ? null : (
        <View style={short ? styles.odds : styles.oddsBelow}>
          <TallyStrokes probability={stated(probability)} layout={short ? 'above' : 'beside'} />
          <Text variant="small" tone="soft">
            {outcome === 'group' ? 'together' : sureWords[sure]}
          </Text>
        </View>
      )}
    </View>
  );
}

/** The one socket that the headline is about; null where it names several, or none. */
function onePlace(diagnosis: Diagnosis): string | null {
  const [first] = diagnosis.places;
  if (diagnosis.outcome !== 'place' || first === undefined) return null;
  const cameFrom = diagnosis.suspects[0]?.cameFrom;
  const named = splitAt(diagnosis.headline, labelsIn(diagnosis)).flatMap(({ piece, label }) => (label ? [piece] : []));
  return named.includes(first.socket) && named.every((label) => label === first.socket || label === cameFrom)
    ? first.socket
    : null;
}

function labelsIn({ suspects, places, headline }: Diagnosis): string[] {
  const all = [...places.map(({ socket }) => socket), ...suspects.flatMap(({ sharedPart }) => sharedPart ?? [])];
  // Longer labels first: U31 is not to be found inside U310.
  return [...new Set(all)].filter((label) => headline.includes(label)).sort((a, b) => b.length - a.length);
}

/** A sentence in which every label stands in the letters of codes. */
function Labelled({ text, labels }: { text: string; labels: readonly string[] }) {
  const pieces = splitAt(text, labels);
  return (
    <Text variant={text.length > 48 ? 'title' : 'display'} level={null}>
      {pieces.map(({ piece, label }, at) =>
        label ? (
          <Text key={at} variant={text.length > 48 ? 'codeMedium' : 'codeLarge'} tone="answer">
            {piece}
          </Text>
        ) : (
          piece
        ),
      )}
    </Text>
  );
}

/** Cuts a text at labels that stand by themselves in it. */
export function splitAt(text: string, labels: readonly string[]): { piece: string; label: boolean }[] {
  if (labels.length === 0) return [{ piece: text, label: false }];
  const escaped = labels.map((label) => label.replace(/[.*+?^${}()|[\]\\]/g, '\\$&')).join('|');
  const parts = text.split(new RegExp(`(?<![\\p{L}\\p{N}])(${escaped})(?![\\p{L}\\p{N}])`, 'u'));
  return parts.map((piece, at) => ({ piece, label: at % 2 === 1 })).filter(({ piece }) => piece !== '');
}

const useStyles = makeStyles((t) => ({
  head: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    justifyContent: 'space-between',
    alignItems: 'flex-start',
    gap: t.space.md,
  },
  beside: { flexGrow: 1, flexShrink: 1, flexBasis: t.measure.beside },
  whole: { flexBasis: '100%' },
  odds: { gap: t.space.hair, alignItems: 'flex-end', paddingTop: t.space.sm },
  oddsBelow: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: t.space.md },
}));
