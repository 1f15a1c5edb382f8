import type { FaultMode, PartKind } from '@/shared';
import type { SocketIndex } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import type { Priors } from './priors';
import type { Scope, Scopes } from './scopes';
import type { Timeline } from './timeline';

/** One way for a cause to be there; the kinds of one cause exclude each other. */
export interface Kind {
  readonly intermittent: boolean;
  /** Prior probability. */
  readonly prior: number;
  /** Probability that it does not show on a lane that it spoils and that is tested. */
  readonly miss: number;
  /** What it spoils in each run; null for nothing. */
  readonly scopes: readonly (Scope | null)[];
  /** The run before which handling cured or caused it; null where it lasts. */
  readonly cured: number | null;
}

/** A part in a mode. */
export interface Cause {
  readonly mode: FaultMode;
  /** Which channel, data pin or line it is, in words; null where the part has but one. */
  readonly where: string | null;
  /** For address lines: the bits of the word number inside the chip that go through it. */
  readonly addressBits?: readonly number[];
  /** For a short: the data lines that are joined. */
  readonly lines?: readonly [number, number];
  readonly kinds: readonly Kind[];
}

/** What can be at fault. */
export interface Part {
  readonly kind: PartKind;
  readonly id: string;
  /** In words, by where it is now. */
  readonly label: string;
  /** The socket of a position, or where a chip is in the last run. */
  readonly socket: SocketIndex | null;
  readonly cameFrom: SocketIndex | null;
  /** Label of the shared part in the layout. */
  readonly sharedPart: string | null;
  readonly causes: readonly Cause[];
}

/** What the causes of a board are listed from. */
export interface Builder {
  readonly index: LayoutIndex;
  readonly timeline: Timeline;
  readonly priors: Priors;
  readonly scopes: Scopes;
  /** The list that repeats a scope for every run, made once a scope. */
  readonly everyRun: Map<Scope, readonly Scope[]>;
}

/** The two kinds of a fault: always there, or coming and going. */
export function twoKinds(
  { priors, timeline, everyRun }: Builder,
  prior: number,
  scopes: Scope | readonly (Scope | null)[],
): Kind[] {
  let perRun: readonly (Scope | null)[];
  if ('lanes' in scopes) {
    perRun = everyRun.get(scopes) ?? new Array<Scope>(timeline.runCount).fill(scopes);
    everyRun.set(scopes, perRun as readonly Scope[]);
  } else perRun = scopes;
  const hard = {
    intermittent: false,
    prior: prior * (1 - priors.intermittentShare),
    miss: 1 - priors.detectionHard,
    scopes: perRun,
    cured: null,
  };
  const comesAndGoes = {
    intermittent: true,
    prior: prior * priors.intermittentShare,
    miss: 1 - priors.detectionIntermittent,
    scopes: perRun,
    cured: null,
  };
  return [hard, comesAndGoes];
}
