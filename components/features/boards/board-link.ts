import { useLocalSearchParams, useRouter } from 'expo-router';
import { useCallback } from 'react';

/** The parts of a board's page. */
export const boardTabs = ['map', 'codes', 'sources', 'versions'] as const;
export type BoardTab = (typeof boardTabs)[number];

/** What of a board's page stands in its link. */
export interface BoardLink {
  readonly slug: string;
  readonly tab: BoardTab;
  /** An older version; null for the one that the look-up uses. */
  readonly version: number | null;
  /** The socket or shared part that is looked at. */
  readonly at: string | null;
  /** Id of the report format whose codes are listed; the first where nothing is said. */
  readonly format: string | null;
}

type Change = Partial<Record<'tab' | 'version' | 'at' | 'format', string | undefined>>;

/** The link of a board's page, and how to change a part of it. What cannot be read is taken as not said. */
export function useBoardLink(): BoardLink & { change: (change: Change) => void } {
  const router = useRouter();
  const { slug = '', tab, version, at, format } = useLocalSearchParams<{ slug: string } & Record<string, string>>();
  const change = useCallback((next: Change) => router.setParams(next), [router]);
  return {
    slug,
    tab: boardTabs.find((one) => one === tab) ?? 'map',
    version: version !== undefined && /^[1-9]\d{0,5}$/.test(version) ? Number(version) : null,
    at: at ?? null,
    format: format ?? null,
    change,
  };
}
