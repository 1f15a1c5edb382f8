import type { Lane } from '../brand';
import type { FailingLane } from './meaning';

/** Why a text is no code of this board, and where in the typed text. */
export interface Refusal {
  readonly reason: string;
  readonly at: number;
  /** The layout knows the code: it means something that is not a lane of this board. */
  readonly known?: boolean;
}

/** What was written and read. */
export interface WordValues {
  readonly written: number;
  readonly read: number;
}

/** What one way to understand a code says, before it is asked what silence means. */
export interface RawReading {
  readonly failing: readonly FailingLane[];
  /** Lanes that the code itself shows to be right. */
  readonly shown: readonly Lane[];
  /** The code shows the bits of a word one by one, so nothing is said of others. */
  readonly showsWord: boolean;
  readonly address: number | null;
  /** What was written and read, as words of the bank: bit n of the number is data bit n, as far as bit 39. */
  readonly values: WordValues | null;
  readonly takes: readonly string[];
}

/** Readings, and the first reason why there are no more. */
export interface Resolved {
  readonly readings: readonly RawReading[];
  readonly refusal: Refusal | null;
}

/** The failing bits of a word, as far as a code tells them. */
export interface FailingBits {
  /** Null where the code says nothing of the bit. */
  readonly failing: readonly { readonly bit: number; readonly reads: FailingLane['reads'] }[] | null;
  /** The bits that the code shows, right and wrong ones; null where it shows no word. */
  readonly shown: readonly number[] | null;
  readonly values?: WordValues;
  readonly at: number;
}
