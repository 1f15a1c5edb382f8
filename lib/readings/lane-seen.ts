/** What readings showed of one lane. */
export interface LaneSeen {
  readsOne: number;
  readsZero: number;
  /** Readings in which it was right, by what was written. */
  rightZeros: number;
  rightOnes: number;
  /** Failing readings in which no other bit of the word failed. */
  alone: number;
  /** Different failing words. */
  words: number;
  /** Of how many words that were looked at; null where that is not known. */
  outOf: number | null;
  rows: number;
  columns: number;
  row: number | null;
  column: number | null;
  /** Bits of the word number inside the chip that were 1, or 0, in every failing word. */
  ones: number;
  zeros: number;
  /** Mask of the chips behind the lane that hold a failing word, and of those that were seen right. */
  failingSegments: number;
  rightSegments: number;
}

/** A lane of which nothing was seen yet. */
export function emptySeen(): LaneSeen {
  return {
    readsOne: 0,
    readsZero: 0,
    rightZeros: 0,
    rightOnes: 0,
    alone: 0,
    words: 0,
    outOf: null,
    rows: 0,
    columns: 0,
    row: null,
    column: null,
    ones: 0,
    zeros: 0,
    failingSegments: 0,
    rightSegments: 0,
  };
}
