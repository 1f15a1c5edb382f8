import { chipFaults, priors, type PossibleFault, type Wiring } from '@/lib';
import type { ProofBoard } from './boards';

/** One fault alone, as the search believes in it. */
export interface Belief {
  readonly fault: PossibleFault;
  /** Place of the fault among those of its chip, so that it can be followed to another socket. */
  readonly nth: number;
  readonly shows: number;
  readonly cured: boolean;
  readonly weight: number;
}

/** Where chips are: the socket of each, by the socket where it was at first; null once it was taken out. */
export type Places = ReadonlyMap<string, string | null>;

/** Beliefs below this share are dropped. */
const least = 1e-4;

/** The part that a belief blames: chip and position of a socket are two parts. */
export const partOf = ({ fault: { part, socket, sharedPart, lanes } }: Belief): string =>
  `${part} ${socket ?? sharedPart ?? lanes.join(' ')}`;

/** The share of the likeliest part, and which it is. */
export function leading(beliefs: readonly Belief[]): { part: string; share: number } {
  const shares = sharesOf(beliefs);
  const [first] = [...shares].sort((a, b) => b[1] - a[1]);
  return first ? { part: first[0], share: first[1] } : { part: '', share: 0 };
}

/** The share of each part. */
export function sharesOf(beliefs: readonly Belief[]): Map<string, number> {
  const total = beliefs.reduce((sum, { weight }) => sum + weight, 0);
  const shares = new Map<string, number>();
  for (const belief of beliefs) {
    const part = partOf(belief);
    shares.set(part, (shares.get(part) ?? 0) + belief.weight / total);
  }
  return shares;
}

/** Every single fault of a board before anything was seen. */
export function beliefsOf({ possible }: ProofBoard): Belief[] {
  const counts = new Map<string, number>();
  return possible.flatMap((fault): Belief[] => {
    const key = `${fault.part} ${fault.socket}`;
    const nth = counts.get(key) ?? 0;
    counts.set(key, nth + 1);
    const common = { fault, nth, cured: false };
    const comesAndGoes = priors.intermittentShare;
    return [
      { ...common, shows: priors.detectionHard, weight: fault.prior * (1 - comesAndGoes) },
      { ...common, shows: priors.detectionIntermittent, weight: fault.prior * comesAndGoes },
    ];
  });
}

/** The lanes that a fault spoils where the chips are now. */
export class Reach {
  private readonly known = new Map<string, readonly PossibleFault[]>();

  constructor(private readonly wiring: Wiring) {}

  lanes({ fault, nth, cured }: Belief, places: Places): readonly number[] {
    if (cured) return [];
    if (fault.part !== 'chip' || fault.socket === null) return fault.lanes;
    const now = places.get(fault.socket);
    if (now === null) return [];
    if (now === undefined || now === fault.socket) return fault.lanes;
    const there = this.known.get(now) ?? chipFaults(this.wiring, priors, { chip: '', socket: now });
    this.known.set(now, there);
    return there[nth]?.lanes ?? [];
  }
}

/** Beliefs after a pass of the test. */
export function seen(
  beliefs: readonly Belief[],
  {
    reach,
    places,
    lanes,
    failing,
  }: { reach: Reach; places: Places; lanes: readonly number[]; failing: readonly number[] },
): Belief[] {
  const failed = new Set(failing);
  return kept(
    beliefs.map((belief) => {
      const own = new Set(reach.lanes(belief, places));
      const likelihood = lanes.reduce((product, lane) => {
        const fails = own.has(lane) ? belief.shows : priors.leak;
        return product * (failed.has(lane) ? fails : 1 - fails);
      }, 1);
      return { ...belief, weight: belief.weight * likelihood };
    }),
  );
}

/** Contacts at a socket that was handled may be cured. */
export const handled = (beliefs: readonly Belief[], sockets: readonly string[]): Belief[] =>
  beliefs.flatMap((belief) => {
    const { fault, cured, weight } = belief;
    if (cured || fault.part !== 'position' || fault.socket === null || !sockets.includes(fault.socket)) return [belief];
    const share = priors.handlingCures;
    return [
      { ...belief, weight: weight * (1 - share) },
      { ...belief, cured: true, weight: weight * share },
    ];
  });

/** Beliefs with a total of 1, without those that no longer matter. */
export function kept(beliefs: readonly Belief[]): Belief[] {
  const total = beliefs.reduce((sum, { weight }) => sum + weight, 0);
  return beliefs.flatMap((belief) =>
    belief.weight > least * total ? [{ ...belief, weight: belief.weight / total }] : [],
  );
}
