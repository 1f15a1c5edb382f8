import { useQuery } from '@tanstack/react-query';
import { useBoardLayout } from '@/components/api/layouts';
import { versionQuery } from '@/components/api/layout-versions';
import { ApiProblem, problemWords } from '@/components/api/problem';
import { benchOf } from '@/components/features/diagnose/bench';
import { ButtonLink } from '@/components/ui/button';
import { dateWords } from '@/components/ui/date-words';
import { Notice } from '@/components/ui/notice';
import { Page } from '@/components/ui/page';
import { EmptyState, ErrorState, Loading } from '@/components/ui/states';
import { useBoardLink } from './board-link';
import { BoardPage } from './board-page';

/** The page of one board: what is published, or an older version of it. */
export function BoardScreen() {
  const { slug, version } = useBoardLink();
  return version === null ? <CurrentVersion key={slug} slug={slug} /> : <OlderVersion slug={slug} number={version} />;
}

function CurrentVersion({ slug }: { slug: string }) {
  const { layout, fromDevice, pending, error, retry } = useBoardLayout(slug);
  const bench = layout === null ? null : benchOf(layout.document);
  if (layout === null || bench === null) return <NoBoard pending={pending} error={error} retry={retry} />;
  const withdrawn = error instanceof ApiProblem && (error.status === 404 || error.status === 410);
  return (
    <BoardPage
      bench={bench}
      slug={slug}
      version={`Version ${layout.number}, ${dateWords(layout.publishedAt)}${fromDevice ? ', kept on this device' : ''}`}
      notice={
        withdrawn ? (
          <Notice kind="warning" title="This board is no longer published.">
            You see the copy that is kept on this device. It may have been withdrawn because it misled somebody.
          </Notice>
        ) : null
      }
    />
  );
}

function OlderVersion({ slug, number }: { slug: string; number: number }) {
  const { data, error, isPending, refetch } = useQuery(versionQuery(slug, number));
  const bench = data === undefined ? null : benchOf(data.document);
  if (data === undefined || bench === null) {
    return <NoBoard pending={isPending} error={error} retry={() => void refetch()} version={number} slug={slug} />;
  }
  const when = dateWords(data.decidedAt ?? data.submittedAt);
  return (
    <BoardPage
      bench={bench}
      slug={slug}
      version={`Version ${number}, ${data.state}${when === '' ? '' : ` ${when}`}`}
      notice={
        data.current ? null : (
          <Notice
            kind="warning"
            title={`This is version ${number}, not the one that the look-up uses.`}
            action={
              <ButtonLink
                href={{ pathname: '/boards/[slug]', params: { slug } }}
                label="Show the version that is used"
              />
            }
          >
            Codes may name other sockets here.
          </Notice>
        )
      }
    />
  );
}

type NoBoardProps = {
  pending: boolean;
  error: Error | null;
  retry: () => void;
  version?: number;
  slug?: string;
};

/** Why there is no board to show: on its way, not there, withdrawn, or out of reach. */
function NoBoard({ pending, error, retry, version, slug }: NoBoardProps) {
  if (pending) {
    return (
      <Page title="Board" hideTitle>
        <Loading label="Fetching the board" lines={8} />
      </Page>
    );
  }
  const code = error instanceof ApiProblem ? error.code : null;
  if (code === 'layout-retired') {
    return (
      <Page title="Withdrawn" width="prose">
        <EmptyState title="This layout was withdrawn." action={<ButtonLink href="/boards" label="All boards" />}>
          A moderator took it back, mostly because a code named the wrong socket. It is not kept on this device.
        </EmptyState>
      </Page>
    );
  }
  if (error instanceof ApiProblem && (error.status === 404 || error.status === 400)) {
    return (
      <Page title={version === undefined ? 'No such board' : 'No such version'} width="prose">
        <EmptyState
          title={
            version === undefined ? 'There is no board at this address.' : `There is no version ${version} to be seen.`
          }
          action={
            <>
              <ButtonLink kind="primary" href="/boards" label="All boards" />
              {slug === undefined ? null : (
                <ButtonLink href={{ pathname: '/boards/[slug]', params: { slug } }} label="The board as published" />
              )}
            </>
          }
        >
          {version === undefined
            ? 'The link may be cut off, or the board was never published.'
            : 'It may still wait for a moderator; then only its author and moderators see it.'}
        </EmptyState>
      </Page>
    );
  }
  return (
    <Page title="The board did not arrive" width="prose">
      <ErrorState
        title={error === null ? 'The board that arrived cannot be read.' : problemWords(error)}
        onRetry={retry}
      >
        Boards that were opened on this device before work without the network.
      </ErrorState>
    </Page>
  );
}
