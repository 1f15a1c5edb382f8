import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { TallyStrokes } from '@/components/ui/tally-strokes';
import { Text } from '@/components/ui/text';
import type { Diagnosis } from '@/shared';

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
  const pull = pulledFirst(diagnosis);
  const calm = outcome === 'not-shown' || outcome === 'no-evidence';
  return (
    <View style={styles.head}>
      <View role="heading" aria-level={1} aria-label={headline} style={styles.words}>
        {pull === null ? (
          <Labelled text={headline} labels={labelsIn(diagnosis)} tone={calm ? 'ink' : 'answer'} />
        ) : (
          <>
            <Text variant="heading" level={null}>
              Pull first
            </Text>
            <Text variant={pull.length > 7 ? 'codeLarge' : 'answer'} tone="answer">
              {pull}
            </Text>
          </>
        )}
      </View>
      {probability === null ? null : (
        <View style={styles.odds}>
          <TallyStrokes probability={probability} />
          <Text variant="small" tone="soft" align="right">
            {sureWords[sure]}
          </Text>
        </View>
      )}
    </View>
  );
}

/** The one socket that the headline tells to pull first; null where it says something else. */
function pulledFirst({ headline, places }: Diagnosis): string | null {
  const [first] = places;
  return first !== undefined && headline === `Pull ${first.socket} first.` ? first.socket : null;
}

function labelsIn({ suspects, places, headline }: Diagnosis): string[] {
  const all = [...places.map(({ socket }) => socket), ...suspects.flatMap(({ sharedPart }) => sharedPart ?? [])];
  // Longer labels first: U31 is not to be found inside U310.
  return [...new Set(all)].filter((label) => headline.includes(label)).sort((a, b) => b.length - a.length);
}

/** A sentence in which every label stands in the letters of codes. */
function Labelled({ text, labels, tone }: { text: string; labels: readonly string[]; tone: 'ink' | 'answer' }) {
  const pieces = splitAt(text, labels);
  return (
    <Text variant="display" level={null} tone="ink">
      {pieces.map(({ piece, label }, at) =>
        label ? (
          <Text key={at} variant="codeLarge" tone={tone}>
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
  words: { flexGrow: 1, flexShrink: 1, flexBasis: 180 },
  odds: { gap: t.space.hair, alignItems: 'flex-end', paddingTop: t.space.sm },
}));
