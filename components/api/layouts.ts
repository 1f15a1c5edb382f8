import { infiniteQueryOptions, queryOptions, useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { LayoutCard, LayoutFilters, LayoutsPage, LayoutsQueryInput, PublishedLayout } from '@/shared/api/layouts';
import { request } from './client';
import { cardOf, keepLayout, readKeptLayout, readKeptLayouts } from './layout-store';

/** What narrows a list of boards down; the page is not part of it. */
export type LayoutListFilters = Pick<LayoutsQueryInput, 'q' | 'maker' | 'kind' | 'family' | 'bits'>;

/** Rows of one page of the library. */
const pageSize = 50;

/** Query of the published boards, page by page: `GET /layouts`. */
export const layoutListQuery = (filters: LayoutListFilters = {}) =>
  infiniteQueryOptions({
    queryKey: ['layouts', 'list', filters],
    queryFn: ({ pageParam, signal }) =>
      request<LayoutsPage>('/layouts', {
        query: { ...filters, bits: filters.bits as number | undefined, limit: pageSize, cursor: pageParam },
        signal,
      }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: ({ nextCursor }) => nextCursor ?? undefined,
  });

/** Query of what the library can be narrowed down by: `GET /layout-filters`. */
export const layoutFiltersQuery = queryOptions({
  queryKey: ['layouts', 'filters'],
  queryFn: ({ signal }) => request<LayoutFilters>('/layout-filters', { signal }),
});

/** Query of one published board from the server, `GET /layouts/:slug`. What comes is kept on the device. */
export const layoutQuery = (slug: string) =>
  queryOptions({
    queryKey: ['layouts', 'one', slug],
    queryFn: async ({ signal, client }) => {
      const layout = await request<PublishedLayout>(`/layouts/${encodeURIComponent(slug)}`, { signal });
      if (await keepLayout(layout, Date.now())) void client.invalidateQueries({ queryKey: keptLayoutsQuery.queryKey });
      return layout;
    },
  });

/** Query of one board as it is kept on this device; null where it is not. */
export const keptLayoutQuery = (slug: string) =>
  queryOptions({
    queryKey: ['kept-layouts', 'one', slug],
    queryFn: async () => (await readKeptLayout(slug)) ?? null,
    staleTime: Infinity,
  });

/** Query of the rows of all boards that are kept on this device, by maker and name. */
export const keptLayoutsQuery = queryOptions({
  queryKey: ['kept-layouts', 'list'],
  queryFn: async (): Promise<LayoutCard[]> => (await readKeptLayouts()).map(cardOf).sort(byName),
});

const byName = (a: LayoutCard, b: LayoutCard) => boardName(a).localeCompare(boardName(b), 'en', { numeric: true });

/** "Tarnvall Textil T-64 loom controller, rev B": a board as it is called in a list. */
export function boardName({ maker, name, revision }: Pick<LayoutCard, 'maker' | 'name' | 'revision'>): string {
  return `${maker} ${name}, rev ${revision}`;
}

/** A board on its way to the screen. */
export interface BoardLayout {
  /** Null while neither the server nor the device has given it. */
  readonly layout: PublishedLayout | null;
  /** The device's copy is shown: the server has not answered, or could not be reached. */
  readonly fromDevice: boolean;
  readonly pending: boolean;
  /** What the server or the network said; may stand beside a layout from the device. */
  readonly error: Error | null;
  readonly retry: () => void;
}

/**
 * One board: the device's copy at once where there is one, and the server's as soon as it is there.
 * With no network a board that was opened before is whole.
 */
export function useBoardLayout(slug: string): BoardLayout {
  const served = useQuery(layoutQuery(slug));
  const kept = useQuery(keptLayoutQuery(slug));
  const layout = useMemo(() => {
    const device = kept.data ?? null;
    if (served.data === undefined) return device;
    // The same version keeps its identity, so that nothing that was made from it is made again.
    return device?.number === served.data.number && device.publishedAt === served.data.publishedAt
      ? device
      : served.data;
  }, [served.data, kept.data]);
  return {
    layout,
    fromDevice: layout !== null && served.data === undefined,
    pending: layout === null && (served.isPending || kept.isPending),
    error: served.error,
    retry: () => void served.refetch(),
  };
}
