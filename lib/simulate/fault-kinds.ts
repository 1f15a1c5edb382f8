import type { BoardFault } from './faults';
import type { Random } from './self-test';

/** How often each part fails before anything is known: probabilities for one board. */
export interface FaultFigures {
  readonly chipDead: number;
  readonly chipHoldsLine: number;
  readonly chipHoldsStrobe: number;
  readonly chipHoldsAddress: number;
  readonly positionOpen: number;
  readonly oneDataPinShare: number;
  readonly sharedChannel: number;
  readonly sharedWhole: number;
  readonly lineShort: number;
  /** A data line shorted to a supply, beside the driver that the layout lists. */
  readonly lineItself: number;
  /** What spoils just one lane beside its position: wiring, gating, a trace further on. */
  readonly elsewhere: number;
  readonly intermittentShare: number;
}

export const faultKinds = [
  'chip dead',
  'chip dead in one bit',
  'chip holds its data line',
  'chip holds its strobe',
  'chip holds an address line',
  'position open',
  'position open in one bit',
  'channel of a buffer',
  'whole data part',
  'strobe or decoder',
  'address line',
  'other shared part',
  'lines shorted',
  'wiring of one lane',
] as const;
export type FaultKind = (typeof faultKinds)[number];

/** A part in a mode, as it can be drawn for a board. */
export interface PossibleFault {
  readonly kind: FaultKind;
  readonly part: 'chip' | 'position' | 'shared-part' | 'short' | 'wiring';
  /** The socket of a position, or where the chip is at first; null for what has none. */
  readonly socket: string | null;
  /** Label of the shared part in the layout; null for others, and for what the layout does not list. */
  readonly sharedPart: string | null;
  /** Every lane that it can spoil as the chips lie at first, ascending. */
  readonly lanes: readonly number[];
  readonly prior: number;
  /** One fault of this kind, what it leaves open drawn. */
  readonly draw: (random: Random, intermittent: boolean) => BoardFault;
}

/** Lanes in order, each once. */
export const ascending = (lanes: Iterable<number>): number[] => [...new Set(lanes)].sort((a, b) => a - b);
