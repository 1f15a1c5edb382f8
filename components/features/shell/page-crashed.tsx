import { useOnline } from '@/components/api/use-online';
import { ErrorState } from '@/components/ui/states';
import { Page } from '@/components/ui/page';

/**
 * Stands in for a page that threw, or whose code could not be loaded.
 * Loads the document again, because a code file that failed once is not asked for twice.
 */
export function PageCrashed() {
  const online = useOnline();
  return (
    <Page title="This page cannot be shown" width="prose">
      <ErrorState
        title={online ? 'Something in it broke.' : 'There is no network, and this page is not on the device yet.'}
        onRetry={() => window.location.reload()}
        retryLabel="Load again"
      >
        {online
          ? 'What you typed in the code field is kept in the address. Loading again usually helps.'
          : 'Open it once with a network, and it works without one from then on.'}
      </ErrorState>
    </Page>
  );
}
