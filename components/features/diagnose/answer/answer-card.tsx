import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Sheet, type SheetProps } from '@/components/ui/sheet';
import { Text } from '@/components/ui/text';
import type { Diagnosis, Run } from '@/shared';
import type { Bench } from '../bench';
import { GroupMembers } from './group-members';
import { Headline } from './headline';
import { measuredSupplies } from './measured';
import { Signatures } from './signatures';

const bars: Record<Diagnosis['outcome'], SheetProps['bar']> = {
  supply: 'mark',
  place: 'pencil',
  group: 'pencil',
  shared: 'mark',
  'not-shown': 'tick',
  unexplained: 'mark',
  'no-evidence': 'pen',
};

/** Words over the headline that say what kind of answer it is, where the headline alone may be misread. */
const kinds: Partial<Record<Diagnosis['outcome'], string>> = {
  supply: 'The supply comes before any chip',
  group: 'Cannot be told apart yet',
  shared: 'A part that many chips share',
  unexplained: 'No cause fits',
};

/** Keeps a number and its per cent on one line. */
const unbroken = (text: string) => text.replace(/ %/g, '\u00a0%');

/** Sentences of an answer that stand at once; the rest follows under it. */
const atOnce = 4;

type AnswerCardProps = { bench: Bench; runs: readonly Run[]; diagnosis: Diagnosis };

/** The answer: what to do, how sure that is, and why. */
export function AnswerCard({ bench, runs, diagnosis }: AnswerCardProps) {
  const styles = useStyles();
  const kind = kinds[diagnosis.outcome];
  const first = unbroken(diagnosis.sentences.slice(0, atOnce).join(' '));
  const more = diagnosis.sentences.slice(atOnce);
  return (
    <Sheet bar={bars[diagnosis.outcome]} gap="sm" label="Answer">
      {kind === undefined ? null : (
        <Text variant="small" tone="soft">
          {kind}
        </Text>
      )}
      <Headline diagnosis={diagnosis} />
      {first === '' ? null : <Text>{first}</Text>}
      {more.length === 0 ? null : (
        <View style={styles.more}>
          {more.map((sentence) => (
            <Text key={sentence} variant="small" tone="soft">
              {sentence}
            </Text>
          ))}
        </View>
      )}
      <Signatures index={bench.index} diagnosis={diagnosis} />
      {diagnosis.outcome === 'supply' ? <Supplies {...{ bench, runs, diagnosis }} /> : null}
      <Unread diagnosis={diagnosis} />
      {diagnosis.groups.map((group) => (
        <GroupMembers
          key={group.why}
          members={group.members}
          why={isSaid(diagnosis, group.why) ? null : group.why}
          check={group.check === diagnosis.nextChecks[0]?.label ? null : group.check}
        />
      ))}
      {diagnosis.pairs.map(({ parts, labels, probability }) => (
        <Text key={parts.join()} variant="small">
          {`Two faults at once are likely: ${labels[0]} and ${labels[1]} (${Math.round(probability * 100)} %).`}
        </Text>
      ))}
      {diagnosis.exact ? null : (
        <Text variant="fine" tone="soft">
          {`Not every combination of faults was weighed; what was left out holds at most ${Math.ceil(diagnosis.leftOut * 100)} %.`}
        </Text>
      )}
    </Sheet>
  );
}

/** What was measured, where the supply is the answer: the pin and the value stand large. */
function Supplies({ bench, runs, diagnosis }: AnswerCardProps) {
  const styles = useStyles();
  const measured = measuredSupplies(bench, runs);
  if (measured.length === 0) return null;
  return (
    <View role="list" aria-label="Measured supplies" style={styles.more}>
      {measured.map(({ text, verdict, bad, place }) => (
        <View key={text} role="listitem">
          <Text variant={bad ? 'code' : 'codeSmall'} tone={bad ? 'answer' : 'ink'}>
            {text}
          </Text>
          {verdict === '' || isSaid(diagnosis, place) ? null : <Text variant="small">{verdict}</Text>}
        </View>
      ))}
    </View>
  );
}

/** Whether the sentences say it already. */
const isSaid = ({ sentences }: Diagnosis, words: string | null) =>
  words !== null && sentences.join(' ').includes(words);

/** Evidence that was not used, and why: an answer that rests on less than was typed says so. */
function Unread({ diagnosis }: { diagnosis: Diagnosis }) {
  const unread = diagnosis.evidence.filter(({ ok, reason }) => !ok && !isSaid(diagnosis, reason));
  return unread.map(({ run, index, text, reason }) => (
    <Text key={`${run}.${index}`} variant="small">
      <Text variant="smallStrong" tone="pencil">
        Not used:{' '}
      </Text>
      <Text variant="codeSmall">{text.length > 40 ? `${text.slice(0, 40)}…` : text}</Text>
      {` ${reason ?? ''}`}
    </Text>
  ));
}

const useStyles = makeStyles((t) => ({ more: { gap: t.space.xs } }));
