import { keepPreviousData, useInfiniteQuery, useQuery } from '@tanstack/react-query';
import { useDeferredValue, useEffect, useMemo, useState } from 'react';
import { NetworkFailure } from '@/components/api/problem';
import { keptLayoutsQuery, layoutListQuery } from '@/components/api/layouts';
import { byBoard, fits, type BoardFamily } from './find-boards';

/** Time in ms after the last key before the server is asked. */
const pause = 180;

/** Boards that fit what was typed. */
export interface BoardSearch {
  readonly families: readonly BoardFamily[];
  /** Addresses of the boards that are kept on this device. */
  readonly kept: ReadonlySet<string>;
  readonly state: 'loading' | 'ready' | 'failed';
  /** The server did not answer: only boards of this device are in the list. */
  readonly deviceOnly: boolean;
  readonly error: Error | null;
  readonly retry: () => void;
  /** Fetches more rows; null where there are no more. */
  readonly more: (() => void) | null;
}

/** Searches the server's boards and those of the device at once. Without network the device's remain. */
export function useBoardSearch(text: string): BoardSearch {
  const search = useSettled(text.trim());
  const served = useInfiniteQuery({
    ...layoutListQuery(search === '' ? {} : { q: search.slice(0, 120) }),
    placeholderData: keepPreviousData,
  });
  const kept = useQuery(keptLayoutsQuery);
  const now = useDeferredValue(text);
  const families = useMemo(() => {
    // Rows of the search before this one are narrowed at once; the device's stand in for what has not come yet.
    const rows = served.data?.pages.flatMap(({ items }) => items) ?? [];
    const stale = served.isPlaceholderData || search !== now.trim();
    const fromServer = stale ? rows.filter((card) => fits(card, now)) : rows;
    const fromDevice = (kept.data ?? []).filter((card) => fits(card, now));
    return byBoard([...fromServer, ...fromDevice]);
  }, [served.data, served.isPlaceholderData, kept.data, search, now]);
  const keptSlugs = useMemo(() => new Set(kept.data?.map(({ slug }) => slug)), [kept.data]);
  const failed = served.isError && served.data === undefined;
  return {
    families,
    kept: keptSlugs,
    state: failed && keptSlugs.size === 0 ? 'failed' : served.isPending && families.length === 0 ? 'loading' : 'ready',
    deviceOnly: served.isError && served.error instanceof NetworkFailure,
    error: served.error,
    retry: () => void served.refetch(),
    more: served.hasNextPage && !served.isFetchingNextPage ? () => void served.fetchNextPage() : null,
  };
}

function useSettled(text: string): string {
  const [settled, setSettled] = useState(text);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(text), pause);
    return () => clearTimeout(timer);
  }, [text]);
  return settled;
}
