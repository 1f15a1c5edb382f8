import { createStore, del, entries, get, set, type UseStore } from 'idb-keyval';
import type { LayoutDocument } from '@/shared';
import type { LayoutCard, PublishedLayout } from '@/shared/api/layouts';

/** A board that is kept on this device, so that it can be looked up with no network. */
export interface KeptLayout extends PublishedLayout {
  /** When it was last brought from the server, ms since 1970. */
  readonly keptAt: number;
}

let opened: UseStore | undefined;

function store(): UseStore {
  opened ??= createStore('rowcall-layouts', 'published');
  return opened;
}

/** The kept copy of a board; undefined where there is none, or where storage is closed. */
export async function readKeptLayout(slug: string): Promise<KeptLayout | undefined> {
  try {
    return await get<KeptLayout>(slug, store());
  } catch {
    return undefined;
  }
}

/** All boards kept on this device. Empty where storage is closed. */
export async function readKeptLayouts(): Promise<KeptLayout[]> {
  try {
    return (await entries<string, KeptLayout>(store())).map(([, kept]) => kept);
  } catch {
    return [];
  }
}

/** Keeps a board on this device. Says whether that worked: a private window or a full disk keeps nothing. */
export async function keepLayout(layout: PublishedLayout, now: number): Promise<boolean> {
  try {
    await set(layout.slug, { ...layout, keptAt: now } satisfies KeptLayout, store());
    return true;
  } catch {
    return false;
  }
}

/** Lets a board go from this device. */
export async function forgetLayout(slug: string): Promise<void> {
  try {
    await del(slug, store());
  } catch {
    // What cannot be opened holds nothing to let go.
  }
}

/** A kept board as a row of the library. */
export function cardOf({ slug, number, publishedAt, document }: KeptLayout): LayoutCard {
  const { maker, name, revision, kind, year } = document.board;
  return {
    slug,
    maker,
    name,
    revision,
    kind,
    year: year ?? null,
    families: familiesOf(document),
    dataBits: document.memory.dataBits,
    banks: document.memory.banks.length,
    sockets: document.sockets.length,
    number,
    publishedAt,
  };
}

const familiesOf = ({ sockets }: LayoutDocument) => [...new Set(sockets.map(({ family }) => family))].sort();
