import {
  infiniteQueryOptions,
  keepPreviousData,
  queryOptions,
  useMutation,
  useQueryClient,
  type InfiniteData,
} from '@tanstack/react-query';
import type {
  OwnRoleRequest,
  PeoplePage,
  PeopleQuery,
  PersonRow,
  RoleDecision,
  RoleRequestPage,
  RoleRequestRow,
} from '@/shared/api/people';
import type { Role } from '@/shared/standing';
import { request } from './client';

/** What the list of people is narrowed to. */
export type PeopleFilters = Pick<PeopleQuery, 'search' | 'role'>;

/** People with an account, page by page. */
export const peopleQueryOptions = (filters: PeopleFilters) =>
  infiniteQueryOptions({
    queryKey: ['people', 'list', filters],
    queryFn: ({ pageParam, signal }) =>
      request<PeoplePage>('/people', {
        query: { search: filters.search || undefined, role: filters.role, cursor: pageParam },
        signal,
      }),
    placeholderData: keepPreviousData,
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (last) => last.nextCursor ?? undefined,
  });

/** Gives a person another role; the row in every list shown is replaced by the server's answer. */
export function useChangeRole() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: ({ person, role }: { person: PersonRow; role: Role }) =>
      request<PersonRow>(`/people/${person.id}`, { method: 'PATCH', body: { role }, version: person.version }),
    onSuccess: (changed) => {
      queryClient.setQueriesData<InfiniteData<PeoplePage>>(
        { queryKey: ['people', 'list'] },
        (data) =>
          data && {
            ...data,
            pages: data.pages.map((page) => ({
              ...page,
              items: page.items.map((row) => (row.id === changed.id ? changed : row)),
            })),
          },
      );
    },
  });
}

/** Requests for the role of contributor that wait for an answer. */
export const openRoleRequestsQuery = queryOptions({
  queryKey: ['role-requests', 'open'],
  queryFn: ({ signal }) => request<RoleRequestPage>('/role-requests', { query: { state: 'open' }, signal }),
});

/** Grants or declines a request. */
export function useDecideRoleRequest() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: ({ id, decision }: { id: string } & RoleDecision) =>
      request<RoleRequestRow>(`/role-requests/${id}`, { method: 'PATCH', body: { decision } }),
    // Not awaited: the row that asked is gone once the queue is loaded again, and would never hear of its success.
    onSettled: () => {
      void queryClient.invalidateQueries({ queryKey: ['role-requests'] });
      void queryClient.invalidateQueries({ queryKey: ['people'] });
    },
  });
}

/** The latest request of whoever is signed in; `request` is null if there was none. */
export const ownRoleRequestQuery = queryOptions({
  queryKey: ['me', 'role-request'],
  queryFn: ({ signal }) => request<OwnRoleRequest>('/me/role-request', { signal }),
});
