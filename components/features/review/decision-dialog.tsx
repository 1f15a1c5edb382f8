import { useState, type ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Text } from '@/components/ui/text';
import type { ReviewDetail } from '@/shared/api/layouts';
import { remarksInput } from '@/shared/api/layouts';

/** What a moderator can do with a version that waits. */
export type Act = 'publish' | 'return' | 'reject';

type ActWords = { title: string; does: string; label: string; busy: string };

const wordsOf = (act: Act, { number, publishedNumber }: ReviewDetail): ActWords => {
  switch (act) {
    case 'publish':
      return {
        title: `Publish version ${number}?`,
        does:
          publishedNumber === null
            ? 'The board is in the library and in the look-up at once. The author is told.'
            : `The look-up uses it at once in place of version ${publishedNumber}. The author is told.`,
        label: 'Publish',
        busy: 'Publishing…',
      };
    case 'return':
      return {
        title: `Return version ${number}`,
        does: 'The author gets your words by mail, and can put the version right and send it again.',
        label: 'Return it',
        busy: 'Returning…',
      };
    case 'reject':
      return {
        title: `Reject version ${number}`,
        does: 'The version is turned down for good. The author gets your words by mail.',
        label: 'Reject it',
        busy: 'Rejecting…',
      };
  }
};

type DecisionDialogProps = {
  /** Null: closed. */
  act: Act | null;
  review: ReviewDetail;
  busy: boolean;
  failure: ReactNode;
  onDecide: (remarks: string) => void;
  onClose: () => void;
};

/** Asks once more, and for the words that the author gets. What was typed stays until the decision is through. */
export function DecisionDialog({ act, review, busy, failure, onDecide, onClose }: DecisionDialogProps) {
  const [remarks, setRemarks] = useState('');
  const [error, setError] = useState<string | undefined>(undefined);
  if (act === null) return null;
  const words = wordsOf(act, review);
  const needsWords = act !== 'publish';
  const decide = () => {
    const read = remarksInput.safeParse({ remarks });
    if (needsWords && !read.success) {
      setError(remarks.trim() === '' ? 'Say in words what the author should know.' : read.error.issues[0]?.message);
      return;
    }
    onDecide(remarks.trim());
  };
  return (
    <Dialog
      open
      title={words.title}
      onClose={onClose}
      closeLabel="Cancel"
      actions={
        <Button
          kind={act === 'reject' ? 'danger' : 'primary'}
          label={words.label}
          busy={busy}
          busyLabel={words.busy}
          onPress={decide}
        />
      }
    >
      <Text>{words.does}</Text>
      {needsWords ? (
        <Field
          label="What the author should know"
          hint="Name sockets, codes or pages. Up to 2000 characters."
          value={remarks}
          onChangeText={(text) => {
            setRemarks(text);
            setError(undefined);
          }}
          error={error}
          multiline
          maxLength={2000}
        />
      ) : null}
      {failure}
    </Dialog>
  );
}
