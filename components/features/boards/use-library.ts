import { keepPreviousData, useInfiniteQuery, useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { keptLayoutsQuery, layoutListQuery } from '@/components/api/layouts';
import { NetworkFailure } from '@/components/api/problem';
import { fits } from '@/components/features/lookup/find-boards';
import type { LayoutCard } from '@/shared/api/layouts';
import { filtersOf, fitsFilters, type LibraryLink } from './library-link';

/** The library as it can be shown now. */
export interface Library {
  readonly rows: readonly LayoutCard[];
  readonly kept: ReadonlySet<string>;
  readonly state: 'loading' | 'ready' | 'failed';
  /** The rows are those of the search before this one. */
  readonly settling: boolean;
  /** The server cannot be reached: only what is on this device is listed. */
  readonly deviceOnly: boolean;
  readonly error: Error | null;
  readonly retry: () => void;
  /** Fetches the next page; null where there is none. */
  readonly more: (() => void) | null;
  readonly fetchingMore: boolean;
  /** The next page did not come. */
  readonly moreFailed: boolean;
}

/** The published boards that fit a link, page by page; without the server those that are kept on this device. */
export function useLibrary(link: LibraryLink): Library {
  const served = useInfiniteQuery({ ...layoutListQuery(filtersOf(link)), placeholderData: keepPreviousData });
  const device = useQuery(keptLayoutsQuery);
  const deviceOnly = served.error instanceof NetworkFailure && !served.isFetchNextPageError;
  const rows = useMemo(() => {
    if (!deviceOnly) return served.data?.pages.flatMap(({ items }) => items) ?? [];
    return (device.data ?? []).filter((card) => fitsFilters(card, link) && fits(card, link.q ?? ''));
  }, [deviceOnly, served.data, device.data, link]);
  const kept = useMemo(() => new Set(device.data?.map(({ slug }) => slug)), [device.data]);
  const nothing = served.data === undefined && !deviceOnly;
  return {
    rows,
    kept,
    state: nothing ? (served.isError ? 'failed' : 'loading') : deviceOnly && device.isPending ? 'loading' : 'ready',
    settling: served.isPlaceholderData,
    deviceOnly,
    error: served.error,
    retry: () => void served.refetch(),
    more: served.hasNextPage && !deviceOnly ? () => void served.fetchNextPage() : null,
    fetchingMore: served.isFetchingNextPage,
    moreFailed: served.isFetchNextPageError,
  };
}
