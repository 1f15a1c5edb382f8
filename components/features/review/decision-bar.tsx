import { useState } from 'react';
import { View } from 'react-native';
import { useQueryClient } from '@tanstack/react-query';
import { ApiProblem } from '@/components/api/problem';
import { reviewQuery, useDecide } from '@/components/api/reviews';
import { stateWords } from '@/components/features/boards/version-words';
import { FormFailure } from '@/components/features/account/form-failure';
import { makeStyles } from '@/components/theme';
import { Button, ButtonLink } from '@/components/ui/button';
import { dateWords } from '@/components/ui/date-words';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';
import type { ReviewDetail } from '@/shared/api/layouts';
import { DecisionDialog, type Act } from './decision-dialog';

/** What a moderator can do with the version, or why nothing can be done. */
export function DecisionBar({ review }: { review: ReviewDetail }) {
  const styles = useStyles();
  const queryClient = useQueryClient();
  const [act, setAct] = useState<Act | null>(null);
  const [overtaken, setOvertaken] = useState(false);
  const decide = useDecide(review);
  const errors = review.problemList.filter(({ severity }) => severity === 'error').length;
  const begin = (next: Act) => {
    decide.reset();
    setAct(next);
  };
  const finish = (remarks: string) => {
    if (act === null) return;
    decide.mutate(act === 'publish' ? { act } : { act, remarks }, {
      onSuccess: () => setAct(null),
      onError: (error) => {
        if (!(error instanceof ApiProblem) || (error.code !== 'version-conflict' && error.code !== 'conflict')) return;
        // What holds now is fetched and shown in place of the buttons.
        setAct(null);
        setOvertaken(true);
        void queryClient.invalidateQueries({ queryKey: reviewQuery(review.id).queryKey });
      },
    });
  };
  if (review.state !== 'submitted') return <Decided review={review} overtaken={overtaken} />;
  return (
    <View style={styles.all}>
      <View style={styles.row}>
        <Button kind="plain" label="Reject" disabled={review.own} onPress={() => begin('reject')} />
        <Button label="Return with words" disabled={review.own} onPress={() => begin('return')} />
        <Button
          kind="primary"
          label={`Publish version ${review.number}`}
          disabled={review.own || errors > 0}
          onPress={() => begin('publish')}
        />
      </View>
      <Why own={review.own} errors={errors} />
      {overtaken ? (
        <Notice kind="warning" live title="The author has changed it meanwhile.">
          You see the version as it is now. Look at it again before you decide.
        </Notice>
      ) : null}
      <DecisionDialog
        act={act}
        review={review}
        busy={decide.isPending}
        failure={<FormFailure failure={decide.error} />}
        onDecide={finish}
        onClose={() => setAct(null)}
      />
    </View>
  );
}

function Why({ own, errors }: { own: boolean; errors: number }) {
  if (own) {
    return (
      <Text variant="small" tone="mark">
        You wrote this version, so another moderator must decide.
      </Text>
    );
  }
  if (errors === 0) return null;
  return (
    <Text variant="small" tone="pencil">
      {`The check finds ${errors} ${errors === 1 ? 'error' : 'errors'} now, so it cannot be published.`}
    </Text>
  );
}

/** How it was decided, and by whom; what a moderator sees who came second. */
function Decided({ review, overtaken }: { review: ReviewDetail; overtaken: boolean }) {
  const { moderator, decidedAt, remarks, state, slug } = review;
  const by = moderator === null ? '' : ` by ${moderator.name}`;
  const when = decidedAt === null ? '' : `, ${dateWords(decidedAt)}`;
  return (
    <Notice
      kind={overtaken ? 'warning' : state === 'published' ? 'good' : 'info'}
      live
      title={overtaken ? 'Somebody else decided first.' : `This version is decided: ${stateWords(review)}.`}
      action={
        <>
          <ButtonLink href="/review" label="What waits" />
          {state === 'published' ? (
            <ButtonLink kind="quiet" href={{ pathname: '/boards/[slug]', params: { slug } }} label="The board" />
          ) : null}
        </>
      }
    >
      {`${overtaken ? `It is ${stateWords(review)}` : 'Decided'}${by}${when}.${remarks === null ? '' : ` “${remarks}”`}`}
    </Notice>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.sm, alignItems: 'flex-end', flexShrink: 1 },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.md },
}));
