import { createStore, del, get, set, type UseStore } from 'idb-keyval';

/** What somebody was writing when the page was left. */
export interface KeptText {
  readonly text: string;
  /** The version that it puts right; null for a new one. */
  readonly instead: { readonly slug: string; readonly number: number; readonly change: number } | null;
}

let opened: UseStore | undefined;

const store = () => (opened ??= createStore('rowcall-writing', 'texts'));

/** The text that a person left on this device; undefined where there is none, or where storage is closed. */
export async function readKeptText(personId: string): Promise<KeptText | undefined> {
  try {
    return await get<KeptText>(personId, store());
  } catch {
    return undefined;
  }
}

/** Keeps a text on this device; an empty one is let go. Where storage is closed nothing is kept. */
export async function keepText(personId: string, kept: KeptText): Promise<void> {
  try {
    if (kept.text.trim() === '') await del(personId, store());
    else await set(personId, kept, store());
  } catch {
    // A private window or a full disk: the text stays in the field for as long as the page is open.
  }
}
