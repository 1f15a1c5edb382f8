import { useQuery } from '@tanstack/react-query';
import { useLocalSearchParams } from 'expo-router';
import { versionQuery } from '@/components/api/layout-versions';
import { ApiProblem, problemWords } from '@/components/api/problem';
import { reviewQuery } from '@/components/api/reviews';
import { useSession } from '@/components/api/session';
import { SignedInOnly } from '@/components/features/account/signed-in-only';
import { benchOf } from '@/components/features/diagnose/bench';
import { ButtonLink } from '@/components/ui/button';
import { Page } from '@/components/ui/page';
import { EmptyState, ErrorState, Loading } from '@/components/ui/states';
import type { ReviewDetail } from '@/shared/api/layouts';
import { ReviewPage, type Published } from './review-page';

/** One version that waits, beside what is published. */
export function ReviewScreen() {
  const { id = '' } = useLocalSearchParams<{ id: string }>();
  const { mayReview } = useSession();
  if (mayReview) return <Review key={id} id={id} />;
  // The page of a review has a head of its own; what stands in its place gets one here.
  return (
    <Page title="Review">
      <SignedInOnly page={`/review/${id}`} needs="moderator">
        {() => null}
      </SignedInOnly>
    </Page>
  );
}

function Review({ id }: { id: string }) {
  const { data, error, isPending, refetch } = useQuery(reviewQuery(id));
  if (data !== undefined) return <WithPublished review={data} />;
  if (isPending) {
    return (
      <Page title="Review" hideTitle>
        <Loading label="Fetching the version" lines={8} />
      </Page>
    );
  }
  const missing = error instanceof ApiProblem && (error.status === 404 || error.status === 400);
  return (
    <Page title={missing ? 'No such version' : 'Review'} width="prose">
      {missing ? (
        <EmptyState
          title="There is no version at this address."
          action={<ButtonLink kind="primary" href="/review" label="What waits" />}
        />
      ) : (
        <ErrorState title={problemWords(error)} onRetry={() => void refetch()} />
      )}
    </Page>
  );
}

function WithPublished({ review }: { review: ReviewDetail }) {
  const published = usePublished(review);
  const bench = benchOf(review.document);
  if (bench === null) {
    return (
      <Page title="Review" width="prose">
        <ErrorState title="The document that arrived cannot be read by this version of the application." />
      </Page>
    );
  }
  return <ReviewPage review={review} bench={bench} published={published} />;
}

/** What the version is compared with: the published one, if it is another. */
function usePublished({ slug, number, publishedNumber }: ReviewDetail): Published {
  const other = publishedNumber !== null && publishedNumber !== number;
  const { data, error, refetch } = useQuery({ ...versionQuery(slug, publishedNumber ?? 0), enabled: other });
  if (!other) return { state: 'none' };
  const bench = data === undefined ? null : benchOf(data.document);
  if (bench !== null) return { state: 'ready', number: publishedNumber, bench };
  return error === null && data === undefined
    ? { state: 'loading', number: publishedNumber }
    : { state: 'failed', number: publishedNumber, retry: () => void refetch() };
}
