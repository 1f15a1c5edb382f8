import type { LayoutDocument, SharedPart, Socket } from '@/shared';
import { listWords } from './words';

/** What became of a socket or a shared part, in words after its label: "is new", "takes another chip family". */
export interface ThingDifference {
  readonly label: string;
  readonly words: string;
}

/** What is said of a socket whose contents alone have changed. */
export const holdsOther = 'holds other lanes or words';

type Facts<Thing> = readonly (readonly [words: string, fact: (thing: Thing) => unknown])[];

const socketFacts: Facts<Socket> = [
  ['has another place on the sketch', ({ x, y, turn, width, height }) => [x, y, turn, width, height]],
  ['has pin 1 at another corner', ({ pin1 }) => pin1],
  ['takes another chip family', ({ family }) => family],
  ['is soldered or socketed otherwise', ({ soldered }) => soldered],
  [holdsOther, ({ holds }) => holds],
];

const partFacts: Facts<SharedPart> = [
  ['has another place on the sketch', ({ x, y, turn, width, height }) => [x, y, turn, width, height]],
  ['has another name', ({ name }) => name],
  ['does other work', ({ role, channels }) => [role, channels]],
  ['serves other lanes', ({ serves }) => serves],
];

/** Sockets that are new, gone or not what they were, by label. */
export function socketDifferences(before: LayoutDocument, after: LayoutDocument): ThingDifference[] {
  return differences({ before: before.sockets, after: after.sockets }, socketFacts);
}

/** Shared parts that are new, gone or not what they were, by label. */
export function partDifferences(before: LayoutDocument, after: LayoutDocument): ThingDifference[] {
  return differences({ before: before.sharedParts, after: after.sharedParts }, partFacts);
}

function differences<Thing extends { readonly label: string }>(
  { before, after }: { before: readonly Thing[]; after: readonly Thing[] },
  facts: Facts<Thing>,
): ThingDifference[] {
  const old = new Map(before.map((thing) => [thing.label, thing]));
  const now = new Map(after.map((thing) => [thing.label, thing]));
  const gone = before.filter(({ label }) => !now.has(label)).map(({ label }) => ({ label, words: 'is gone' }));
  const changed = after.flatMap((thing) => {
    const was = old.get(thing.label);
    if (was === undefined) return [{ label: thing.label, words: 'is new' }];
    const words = facts
      .filter(([, fact]) => JSON.stringify(fact(was)) !== JSON.stringify(fact(thing)))
      .map(([what]) => what);
    return words.length === 0 ? [] : [{ label: thing.label, words: listWords(words) }];
  });
  return [...gone, ...changed];
}
