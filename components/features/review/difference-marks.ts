import type { SketchMarks, SocketMark } from '@/components/board/sketch-types';
import type { LaneDifference, LayoutDifference } from '@/lib/layout/difference';
import { bitName, listWords } from '@/lib/layout/words';
import type { LayoutDocument } from '@/shared';

/** The sketch of a version with the double line around every socket of which something has changed, and what it was. */
export function differenceMarks(after: LayoutDocument, difference: LayoutDifference): SketchMarks {
  const notes = new Map<string, string>();
  for (const { label, words } of difference.sockets) notes.set(label, noteOf(words));
  for (const { text, before, after: now } of difference.formats.flatMap(({ changed }) => changed)) {
    // A code that moved without its lane: the counting changed.
    for (const label of [...before, ...now]) if (!notes.has(label)) notes.set(label, `was not ${text}`);
  }
  for (const [label, was] of heldBefore(difference.lanes)) notes.set(label, wasWords(after, label, was));
  const sockets = new Map(
    after.sockets.flatMap(({ label }): [string, SocketMark][] => {
      const note = notes.get(label);
      return note === undefined ? [] : [[label, { state: 'plain', outlined: true, note }]];
    }),
  );
  return { sockets, sharedParts: new Map(), ...(sockets.size === 0 ? {} : { outlinedMeans: 'changed' }) };
}

/** The lanes that each socket held before and does not hold now. */
function heldBefore(lanes: readonly LaneDifference[]): Map<string, LaneDifference[]> {
  const held = new Map<string, LaneDifference[]>();
  for (const lane of lanes) {
    for (const label of lane.before.filter((one) => !lane.after.includes(one))) {
      held.set(label, [...(held.get(label) ?? []), lane]);
    }
  }
  return held;
}

/** "was bit 3"; with the bank where the socket belongs to another one now. */
function wasWords({ memory, sockets }: LayoutDocument, label: string, was: readonly LaneDifference[]): string {
  const banks = new Set(sockets.find((socket) => socket.label === label)?.holds.map(({ bank }) => bank));
  const several = was.some(({ bank }) => !banks.has(bank));
  return `was ${listWords(
    was.map(({ bank, bit }) => `${several ? `${bank} ` : ''}bit ${bitName(memory, bit)}`),
    2,
  )}`;
}

/** A few letters for what a sentence says of a socket. */
function noteOf(words: string): string {
  if (words === 'is new') return 'new';
  return words.includes('place') ? 'new place' : 'changed';
}
