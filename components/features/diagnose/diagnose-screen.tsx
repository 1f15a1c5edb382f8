import { useLocalSearchParams } from 'expo-router';
import { useBoardLayout } from '@/components/api/layouts';
import { ApiProblem, problemWords } from '@/components/api/problem';
import { ButtonLink } from '@/components/ui/button';
import { EmptyState, ErrorState, Loading } from '@/components/ui/states';
import { Page } from '@/components/ui/page';
import { benchOf } from './bench';
import { WorkspaceScreen } from './workspace-screen';

/** The workspace of one board: from the device at once where it was opened before, else from the server. */
export function DiagnoseScreen() {
  const { slug = '' } = useLocalSearchParams<{ slug: string }>();
  const { layout, fromDevice, pending, error, retry } = useBoardLayout(slug);
  const bench = layout === null ? null : benchOf(layout.document);
  if (bench !== null) return <WorkspaceScreen key={slug} bench={bench} fromDevice={fromDevice} error={error} />;
  if (pending) {
    return (
      <Page title="Look up" hideTitle>
        <Loading label="Fetching the board" lines={6} />
      </Page>
    );
  }
  const unknown = error instanceof ApiProblem && (error.status === 404 || error.status === 400);
  if (unknown) {
    return (
      <Page title="No such board">
        <EmptyState
          title="There is no board at this address."
          action={<ButtonLink kind="primary" href="/" label="Look for a board" />}
        >
          The link may be cut off, or the board may have been withdrawn. What was typed in the link is still in the
          address bar.
        </EmptyState>
      </Page>
    );
  }
  return (
    <Page title="The board did not arrive">
      <ErrorState
        title={layout === null ? problemWords(error) : 'The board that arrived cannot be read.'}
        onRetry={retry}
      >
        What was typed is in the address bar and is not lost. Boards that were opened on this device before work without
        the network.
      </ErrorState>
    </Page>
  );
}
