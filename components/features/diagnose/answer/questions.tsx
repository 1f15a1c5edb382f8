import { View, Pressable } from 'react-native';
import { makeStyles } from '@/components/theme';
import { percentWords } from '@/components/ui/percent';
import { Sheet } from '@/components/ui/sheet';
import { Text } from '@/components/ui/text';
import { listWords, sentenceCase } from '@/lib/layout/words';
import type { Question } from '@/shared';
import { stated } from '../stated';

type QuestionsProps = {
  questions: readonly Question[];
  /** What to do next as it stands under the questions, so that it is not said twice. */
  next: string;
  /** Whether an answer can be taken over. */
  settles: (answer: string) => boolean;
  onAnswer: (answer: string) => void;
};

/** What is open in the evidence: each question with its answers, how likely each is, and what would settle it. */
export function Questions({ questions, ...rest }: QuestionsProps) {
  return questions.map((question) => <OneQuestion key={question.ask} question={question} {...rest} />);
}

type OneQuestionProps = Omit<QuestionsProps, 'questions'> & { question: Question };

function OneQuestion({ question, next, settles, onAnswer }: OneQuestionProps) {
  const styles = useStyles();
  const { ask, answers, settles: bySettling } = question;
  return (
    <Sheet kind="boxed" bar="pen" gap="sm" label="Open question">
      <Text variant="subheading" level={2}>
        {ask}
      </Text>
      {answers.some(({ words }) => settles(words)) ? (
        <Text variant="small" tone="soft">
          Tap the one that is true, if you know.
        </Text>
      ) : null}
      <View role="list" aria-label="Answers">
        {answers.map(({ words, share, sockets }) => {
          const row = <AnswerWords {...{ words, share, sockets }} />;
          return (
            <View key={words} role="listitem">
              {settles(words) ? (
                <Pressable
                  role="button"
                  aria-label={`It is so: ${words}`}
                  onPress={() => onAnswer(words)}
                  style={(state) => [styles.answer, (state.hovered || state.pressed) && styles.held]}
                >
                  {row}
                </Pressable>
              ) : (
                <View style={styles.answer}>{row}</View>
              )}
            </View>
          );
        })}
      </View>
      {bySettling === '' || next.includes(bySettling) ? null : (
        <Text variant="small">
          <Text variant="smallStrong">If nobody knows: </Text>
          {bySettling}
        </Text>
      )}
    </Sheet>
  );
}

function AnswerWords({ words, share, sockets }: Question['answers'][number]) {
  const styles = useStyles();
  return (
    <>
      <View style={styles.words}>
        <Text variant="strong">{sentenceCase(words)}</Text>
        {sockets.length === 0 ? null : (
          <Text variant="codeSmall" tone="soft">
            {listWords(sockets)}
          </Text>
        )}
      </View>
      <Text variant="smallStrong" align="right">
        {percentWords(stated(share))}
      </Text>
    </>
  );
}

const useStyles = makeStyles((t) => ({
  answer: {
    minHeight: t.target,
    flexDirection: 'row',
    alignItems: 'center',
    gap: t.space.md,
    paddingVertical: t.space.sm,
    borderTopWidth: t.line.thin,
    borderTopColor: t.colours.ruleStrong,
  },
  held: { backgroundColor: t.colours.faded },
  words: { flex: 1, minWidth: 0 },
}));
