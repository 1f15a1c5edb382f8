import { z } from 'zod';
import type { Evidence } from '@/shared';
import { readLink, type EvidenceStore } from './workspace-link';

const storageKey = 'rowcall.kept';

/** Pieces of evidence that a device keeps; the oldest goes first. A large log takes some 100 kB. */
const mostKept = 12;

let held: Map<string, unknown> | null = null;

function current(): Map<string, unknown> {
  if (held !== null) return held;
  try {
    const stored: unknown = JSON.parse(window.localStorage.getItem(storageKey) ?? '{}');
    held = new Map(typeof stored === 'object' && stored !== null ? Object.entries(stored) : []);
  } catch {
    held = new Map();
  }
  return held;
}

/** The same text always has the same key, so that a step back in the history finds it again. */
function keyOf(text: string): string {
  // FNV-1a, twice with different seeds: 64 bits are enough for the few that one device keeps.
  const hash = (seed: number) => {
    let sum = seed;
    for (let at = 0; at < text.length; at++) sum = Math.imul(sum ^ text.charCodeAt(at), 0x01000193) >>> 0;
    return sum.toString(16).toUpperCase().padStart(8, '0');
  };
  return hash(0x811c9dc5) + hash(0x5bd1e995);
}

/** Evidence that is too large for a link, kept on this device. */
export const keptEvidence: EvidenceStore = {
  keep: (seen: Evidence) => {
    const key = keyOf(JSON.stringify(seen));
    const kept = current();
    kept.delete(key);
    kept.set(key, seen);
    for (const old of [...kept.keys()].slice(0, -mostKept)) kept.delete(old);
    try {
      window.localStorage.setItem(storageKey, JSON.stringify(Object.fromEntries(kept)));
    } catch {
      // Private windows and full disks: it holds until the page is closed.
    }
    return key;
  },
  find: (key) => current().get(key) ?? null,
};

/** The link as zod reads it, for a route's parameters: any text in, runs and problems out. */
export const workspaceLink = z
  .string()
  .catch('')
  .transform((text) => readLink(text, keptEvidence.find));
