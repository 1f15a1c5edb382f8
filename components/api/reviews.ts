import { infiniteQueryOptions, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { ReviewDetail, ReviewsPage, VersionRow } from '@/shared/api/layouts';
import { request } from './client';

/** Query of the versions that wait for a moderator, the longest waiting first: `GET /reviews`. */
export const reviewsQuery = infiniteQueryOptions({
  queryKey: ['reviews', 'list'],
  queryFn: ({ pageParam, signal }) => request<ReviewsPage>('/reviews', { query: { cursor: pageParam }, signal }),
  initialPageParam: undefined as string | undefined,
  getNextPageParam: ({ nextCursor }) => nextCursor ?? undefined,
  staleTime: 0,
});

/** Query of one version as a moderator sees it: `GET /reviews/:id`. */
export const reviewQuery = (id: string) =>
  queryOptions({
    queryKey: ['reviews', 'one', id],
    queryFn: ({ signal }) => request<ReviewDetail>(`/reviews/${encodeURIComponent(id)}`, { signal }),
    staleTime: 0,
  });

/** What a moderator can do with a version that waits. Remarks are for the author; publishing takes none. */
export type Decision = { readonly act: 'publish' } | { readonly act: 'return' | 'reject'; readonly remarks: string };

/** Decides on the version that was seen; the server refuses when it has changed since. */
export function useDecide({ id, change }: Pick<VersionRow, 'id' | 'change'>) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (decision: Decision) =>
      request<VersionRow>(`/reviews/${encodeURIComponent(id)}/${decision.act}`, {
        method: 'POST',
        version: change,
        ...(decision.act === 'publish' ? {} : { body: { remarks: decision.remarks } }),
      }),
    onSettled: () =>
      Promise.all([
        queryClient.invalidateQueries({ queryKey: ['reviews'] }),
        queryClient.invalidateQueries({ queryKey: ['layouts'] }),
      ]),
  });
}
