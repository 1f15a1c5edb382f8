import { useSyncExternalStore } from 'react';

/** A board that was opened on this device. */
export interface RecentBoard {
  readonly slug: string;
  /** As it is called in a list. */
  readonly name: string;
}

interface DeviceBoards {
  /** The last one first. */
  readonly recent: readonly RecentBoard[];
  readonly starred: readonly RecentBoard[];
  /** The last look-up of a board, as the text of its link. */
  readonly lookups: Readonly<Record<string, string>>;
}

const storageKey = 'rowcall.boards';
const mostRecent = 8;
const mostLookups = 24;
const nothing: DeviceBoards = { recent: [], starred: [], lookups: {} };

let held: DeviceBoards | null = null;
const listeners = new Set<() => void>();

const isBoard = (value: unknown): value is RecentBoard =>
  typeof value === 'object' &&
  value !== null &&
  typeof (value as RecentBoard).slug === 'string' &&
  typeof (value as RecentBoard).name === 'string';

/** What storage holds may be of an older version, or spoiled: only what is sound is taken. */
function read(): DeviceBoards {
  try {
    const stored = JSON.parse(window.localStorage.getItem(storageKey) ?? 'null') as Partial<DeviceBoards> | null;
    const list = (value: unknown) => (Array.isArray(value) ? value.filter(isBoard) : []);
    const lookups = Object.entries(stored?.lookups ?? {}).filter(([, link]) => typeof link === 'string');
    return { recent: list(stored?.recent), starred: list(stored?.starred), lookups: Object.fromEntries(lookups) };
  } catch {
    return nothing;
  }
}

const current = () => (held ??= read());

function change(next: DeviceBoards): void {
  held = next;
  try {
    window.localStorage.setItem(storageKey, JSON.stringify(next));
  } catch {
    // Private windows and full disks: it holds until the page is closed.
  }
  for (const changed of listeners) changed();
}

const subscribe = (changed: () => void) => {
  const elsewhere = (event: StorageEvent) => {
    if (event.key !== storageKey) return;
    held = null;
    changed();
  };
  listeners.add(changed);
  window.addEventListener('storage', elsewhere);
  return () => {
    listeners.delete(changed);
    window.removeEventListener('storage', elsewhere);
  };
};

const without = (boards: readonly RecentBoard[], slug: string) => boards.filter((board) => board.slug !== slug);

/** Boards opened and starred on this device, and their last look-ups. */
export function useDeviceBoards(): DeviceBoards {
  return useSyncExternalStore(subscribe, current, () => nothing);
}

/** Puts a board at the head of those opened here. */
export function rememberBoard(board: RecentBoard): void {
  const before = current();
  if (before.recent[0]?.slug === board.slug && before.recent[0].name === board.name) return;
  change({ ...before, recent: [board, ...without(before.recent, board.slug)].slice(0, mostRecent) });
}

/** Stars a board, or takes its star away. */
export function toggleStar(board: RecentBoard): void {
  const before = current();
  const rest = without(before.starred, board.slug);
  change({ ...before, starred: rest.length < before.starred.length ? rest : [...rest, board] });
}

/** Keeps the last look-up of a board, so that it can be taken up again. */
export function rememberLookup(slug: string, link: string): void {
  const before = current();
  if (before.lookups[slug] === link) return;
  const others = Object.entries(before.lookups).filter(([key]) => key !== slug);
  change({ ...before, lookups: Object.fromEntries([...others, [slug, link]].slice(-mostLookups)) });
}
