import type { LayoutDocument } from '@/shared';

/** A supply of the board as it lies at pins of a socket, in volts against 0 V. */
export type RailAtPins = Pick<LayoutDocument['rails'][number], 'name' | 'volts' | 'pins'>;

/**
 * fits: as it is. fits-after-changes: nothing breaks, but it does not work before the changes. destroyed: the socket
 * as it is wired breaks the chip. does-not-fit: no small change helps.
 */
export type FitVerdict = 'fits' | 'fits-after-changes' | 'destroyed' | 'does-not-fit';

/** How much one difference matters. change: the chip does not work until it is mended. */
export type FitSeverity = 'harmless' | 'change' | 'destroys';

/** One difference between what the socket gives and what the chip wants. */
export interface FitReason {
  /** Pin of the socket, counted from 1; null for the chip as a whole. */
  readonly pin: number | null;
  readonly words: string;
  readonly severity: FitSeverity;
}

/** A pin in the comparison, whether it differs or not. */
export interface FitPin {
  readonly pin: number;
  /** What the socket is wired for: "+12 V", "A7", "nothing". */
  readonly socket: string;
  /** What the chip has there. */
  readonly chip: string;
  readonly severity: FitSeverity | 'same';
}

/** A remark that decides nothing by itself. */
export interface FitNote {
  readonly about: 'capacity' | 'refresh' | 'speed' | 'supply';
  readonly words: string;
}

/** Whether a chip of one family may go into a socket wired for another. */
export interface FitCheck {
  readonly verdict: FitVerdict;
  /** The verdict with its weightiest reason, in one sentence. */
  readonly headline: string;
  /** The weightiest first, then by pin. */
  readonly reasons: readonly FitReason[];
  /** What to change so that it fits, one instruction each. */
  readonly changes: readonly string[];
  /** The changes are enough. Also true where it would be destroyed as the socket is, but not after them. */
  readonly fitsAfterChanges: boolean;
  readonly notes: readonly FitNote[];
  /** Pin by pin from pin 1; empty where the packages differ or the pins of a family are not described. */
  readonly pins: readonly FitPin[];
}

/** What the comparison of one pin or of one property found. */
export interface Finding extends FitReason {
  /** What mends it; none where nothing has to be done, or nothing can be. */
  readonly change?: string;
  /** No small change mends it. */
  readonly blocks?: boolean;
}
