import { useInfiniteQuery } from '@tanstack/react-query';
import { problemWords } from '@/components/api/problem';
import { reviewsQuery } from '@/components/api/reviews';
import { SignedInOnly } from '@/components/features/account/signed-in-only';
import { Button } from '@/components/ui/button';
import { agoWords } from '@/components/ui/date-words';
import { Link } from '@/components/ui/link';
import { Page } from '@/components/ui/page';
import { EmptyState, ErrorState, Loading } from '@/components/ui/states';
import { Table, type Column } from '@/components/ui/table';
import { Text } from '@/components/ui/text';
import type { ReviewRow } from '@/shared/api/layouts';

/** The versions that wait for a moderator. */
export function ReviewListScreen() {
  return (
    <Page title="Review" lead="Layouts that wait for a moderator, the longest waiting first.">
      <SignedInOnly page="/review" needs="moderator">
        {() => <Queue />}
      </SignedInOnly>
    </Page>
  );
}

function Queue() {
  const { data, error, isPending, isFetching, refetch, hasNextPage, fetchNextPage, isFetchingNextPage, dataUpdatedAt } =
    useInfiniteQuery(reviewsQuery);
  if (isPending) return <Loading label="Fetching what waits" lines={4} />;
  if (data === undefined) {
    return (
      <ErrorState title={problemWords(error)} onRetry={() => void refetch()}>
        Nothing was decided meanwhile. The list is on the server.
      </ErrorState>
    );
  }
  const rows = data.pages.flatMap(({ items }) => items);
  if (rows.length === 0) {
    return (
      <EmptyState
        title="Nothing waits."
        action={<Button label="Look again" busy={isFetching} onPress={() => void refetch()} />}
      >
        Every layout that was sent has been decided on.
      </EmptyState>
    );
  }
  return (
    <>
      <Table
        caption={`${rows.length}${hasNextPage ? ' and more' : ''} waiting`}
        columns={columns(dataUpdatedAt)}
        rows={rows}
        rowKey={({ id }) => id}
      />
      {hasNextPage ? (
        <Button label="More" busy={isFetchingNextPage} busyLabel="Fetching…" onPress={() => void fetchNextPage()} />
      ) : null}
    </>
  );
}

const columns = (now: number): Column<ReviewRow>[] => [
  {
    key: 'board',
    header: 'Board',
    share: 3,
    cell: ({ id, name, revision, number }) => (
      <Link href={{ pathname: '/review/[id]', params: { id } }} standalone>
        {`${name}, rev ${revision}, version ${number}`}
      </Link>
    ),
  },
  { key: 'maker', header: 'Maker', share: 2, cell: ({ maker }) => maker },
  {
    key: 'instead',
    header: 'Instead of',
    share: 1.3,
    cell: ({ publishedNumber }) => (publishedNumber === null ? 'new board' : `version ${publishedNumber}`),
  },
  {
    key: 'author',
    header: 'By',
    share: 1.5,
    cell: ({ author, own }) => (own ? 'you' : (author?.name ?? 'an account that is gone')),
  },
  { key: 'sent', header: 'Sent', cell: ({ submittedAt }) => agoWords(submittedAt, now) },
  {
    key: 'problems',
    header: 'Warnings',
    cell: ({ problems }) => (problems === 0 ? 'none' : <Text tone="mark">{problems}</Text>),
  },
];
