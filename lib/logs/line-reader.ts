/** What a line turned out to be: nothing but separators, a reading, or a line that cannot be read. */
export const outcomes = { blank: 0, read: 1, unread: 2 } as const;
export type Outcome = (typeof outcomes)[keyof typeof outcomes];

/** Where each value lies in the limbs of a reader. */
export const slots = { written: 0, read: 3, mask: 6 } as const;

/** Marks of what a line had. */
export const marks = { address: 1, written: 2, read: 4, mask: 8, register: 16 } as const;

/**
 * Reads the lines of a log, one after the other, from bytes. What it read stands in its fields until the next line;
 * nothing is made for a line.
 */
export interface LineReader {
  /** CPU address or word number; below 2^40. */
  readonly address: number;
  /** Last address of a run; -1 where the line stands for one address. */
  readonly to: number;
  readonly step: number;
  /** Value of the page or bank register; -1 where the line has none. */
  readonly register: number;
  /** Marks of what the line had. */
  readonly has: number;
  /** Written, read and mask, three limbs each. */
  readonly values: Int32Array;
  /** The byte after the line's end. */
  readonly next: number;
  /** Reads the line that begins at `at`. The bytes must have a line's end at or after it. */
  readonly line: (bytes: Uint8Array, at: number) => Outcome;
  /** Why the line that was read last could not be read, in words. */
  readonly reason: () => string;
}
