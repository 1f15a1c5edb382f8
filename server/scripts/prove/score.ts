import type { PossibleFault, Wiring } from '@/lib';
import type { Diagnosis, Suspect } from '@/shared';

/** A place or a part without a place, with its probability. */
export interface Entity {
  /** place:U25 or the id of a shared part or short. */
  readonly key: string;
  readonly probability: number;
}

/** How an answer did on a fault that is known. */
export interface Score {
  /** What the headline names, or holds in its group, has the fault. */
  readonly first: boolean;
  readonly inThree: boolean;
  /** A chip is named first. */
  readonly chipFirst: boolean;
  /** Chips that are pulled before the place of the fault comes, in the order of the answer. */
  readonly pulled: number;
  /** What the answer says of what it names, and whether that is so; null where it names nothing. */
  readonly stated: { readonly probability: number; readonly right: boolean } | null;
  /** The smallest set that holds 95 % of the probability. */
  readonly set: { readonly size: number; readonly holds: boolean };
}

/** Places, shared parts and shorts of an answer, the likeliest first. */
export function entitiesOf(answer: Diagnosis): Entity[] {
  const others = answer.suspects.filter(({ kind }) => kind === 'shared-part' || kind === 'short' || kind === 'rail');
  return [
    ...answer.places.map(({ socket, probability }) => ({ key: `place:${socket}`, probability })),
    ...others.map(({ id, probability }) => ({ key: id, probability })),
  ].sort((a, b) => b.probability - a.probability);
}

const lanesKey = (lanes: Iterable<number>) => [...new Set(lanes)].sort((a, b) => a - b).join(' ');

const lanesOf = (wiring: Wiring, { lanes }: Suspect) =>
  lanesKey(lanes.map(({ bank, bit }) => wiring.banks.indexOf(bank) * wiring.bits + bit));

/** The keys under which an answer would name the part that has the fault. `socket` is where a chip is now. */
export function keysOf(
  wiring: Wiring,
  answer: Diagnosis,
  { part, socket, sharedPart, lanes }: Pick<PossibleFault, 'part' | 'socket' | 'sharedPart' | 'lanes'>,
): string[] {
  if (socket !== null) return [`place:${socket}`];
  const own = lanesKey(lanes);
  return answer.suspects
    .filter((suspect) => {
      if (suspect.kind !== part) return false;
      if (sharedPart !== null) return suspect.sharedPart === sharedPart;
      return suspect.sharedPart === null && lanesOf(wiring, suspect) === own;
    })
    .map(({ id }) => id);
}

/** What the headline names: the members of its group, or what leads. */
function namedKeys(answer: Diagnosis, ranked: readonly Entity[]): string[] {
  const members = (answer.outcome === 'place' ? [] : (answer.groups[0]?.members ?? [])).map(({ id, label }) => {
    const suspect = answer.suspects.find((each) => each.id === id);
    if (suspect?.socket) return `place:${suspect.socket}`;
    return answer.places.some(({ socket }) => socket === label) ? `place:${label}` : id;
  });
  return members.length > 0 ? members : ranked.slice(0, 1).map(({ key }) => key);
}

/** The smallest set that holds a share of the probability, in the order of the list. */
export function smallestSet(ranked: readonly Entity[], share = 0.95): string[] {
  const total = ranked.reduce((sum, { probability }) => sum + probability, 0);
  const keys: string[] = [];
  let held = 0;
  for (const { key, probability } of ranked) {
    if (held >= share * total) break;
    keys.push(key);
    held += probability;
  }
  return keys;
}

/** Compares an answer with the fault that was put in. */
export function scoreAnswer(wiring: Wiring, answer: Diagnosis, fault: PossibleFault): Score {
  const ranked = entitiesOf(answer);
  const keys = new Set(keysOf(wiring, answer, fault));
  const named = namedKeys(answer, ranked);
  const first = named.some((key) => keys.has(key));
  const rank = ranked.findIndex(({ key }) => keys.has(key));
  const before = rank < 0 ? ranked : ranked.slice(0, rank);
  const set = smallestSet(ranked);
  return {
    first,
    inThree: first || (rank >= 0 && rank < 3),
    chipFirst: answer.outcome === 'place' || (ranked[0]?.key.startsWith('place:') ?? false),
    pulled: before.filter(({ key }) => key.startsWith('place:')).length,
    stated: answer.probability === null ? null : { probability: answer.probability, right: first },
    set: { size: set.length, holds: set.some((key) => keys.has(key)) },
  };
}

/** Chips that the naive rule pulls: those of the reported lanes in turn, until the place of the fault comes. */
export function naiveScore(
  wiring: Wiring,
  lanes: readonly number[],
  { socket }: Pick<PossibleFault, 'socket'>,
): { first: boolean; pulled: number } {
  const sockets = [
    ...new Set(
      lanes.flatMap((lane) =>
        (wiring.portsOfLane.get(lane) ?? []).map((port) => wiring.labels[wiring.ports[port]?.position ?? -1]),
      ),
    ),
  ];
  const rank = socket === null ? -1 : sockets.indexOf(socket);
  return { first: rank === 0, pulled: rank < 0 ? sockets.length : rank };
}
