import { infiniteQueryOptions, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { ImportAnswer, VersionDetail, VersionRow, VersionsAnswer, VersionsPage } from '@/shared/api/layouts';
import { request } from './client';

/** Query of the versions of a board, the newest first: `GET /layouts/:slug/versions`. */
export const versionsQuery = (slug: string) =>
  queryOptions({
    queryKey: ['layouts', 'versions', slug],
    queryFn: ({ signal }) => request<VersionsAnswer>(`/layouts/${encodeURIComponent(slug)}/versions`, { signal }),
  });

/** Query of one version with its document: `GET /layouts/:slug/versions/:number`. */
export const versionQuery = (slug: string, number: number) =>
  queryOptions({
    queryKey: ['layouts', 'version', slug, number],
    queryFn: ({ signal }) =>
      request<VersionDetail>(`/layouts/${encodeURIComponent(slug)}/versions/${number}`, { signal }),
  });

/** Query of what whoever is signed in has sent, the last change first: `GET /me/layout-versions`. */
export const ownVersionsQuery = infiniteQueryOptions({
  queryKey: ['me', 'layout-versions'],
  queryFn: ({ pageParam, signal }) =>
    request<VersionsPage>('/me/layout-versions', { query: { cursor: pageParam }, signal }),
  initialPageParam: undefined as string | undefined,
  getNextPageParam: ({ nextCursor }) => nextCursor ?? undefined,
});

/** A layout document on its way to the moderators. */
export interface Submission {
  readonly document: unknown;
  /** The version that it puts right; null for a new one. */
  readonly instead: Pick<VersionRow, 'slug' | 'number' | 'change'> | null;
}

/** Sends a layout document as a new version, or in place of one that was returned. */
export function useSubmitLayout() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: ({ document, instead }: Submission) =>
      instead === null
        ? request<ImportAnswer>('/layouts', { method: 'POST', body: document })
        : request<ImportAnswer>(`/layouts/${encodeURIComponent(instead.slug)}/versions/${instead.number}`, {
            method: 'PUT',
            body: document,
            version: instead.change,
          }),
    onSettled: () =>
      Promise.all([
        queryClient.invalidateQueries({ queryKey: ownVersionsQuery.queryKey }),
        queryClient.invalidateQueries({ queryKey: ['layouts', 'versions'] }),
        queryClient.invalidateQueries({ queryKey: ['reviews'] }),
      ]),
  });
}
