import { CautionNotice } from '@/components/features/cautions/caution-notice';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { EmptyState, ErrorState, Loading } from '@/components/ui/states';

const kinds = ['info', 'good', 'warning', 'problem'] as const;

/** Empty, wrong, on its way, and remarks. */
export function StateSamples() {
  const nothing = () => undefined;
  return (
    <>
      {kinds.map((kind) => (
        <Notice key={kind} kind={kind} title={`A notice: ${kind}`} onDismiss={kind === 'info' ? nothing : undefined}>
          Words that say what it is about.
        </Notice>
      ))}
      <CautionNotice id="power-off" />
      <EmptyState title="No board answers to that." action={<Button label="Clear the search" onPress={nothing} />}>
        Try the maker, or a label printed on the board.
      </EmptyState>
      <ErrorState title="The list could not be loaded." onRetry={nothing}>
        The server cannot be reached. Check the connection and try again.
      </ErrorState>
      <Loading />
    </>
  );
}
