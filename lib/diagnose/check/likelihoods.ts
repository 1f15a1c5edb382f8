/** What a part can be, as far as checks tell it from others. */
export type Sort = 'chip' | 'contact' | 'line' | 'holder' | 'short' | 'shared' | 'supply' | 'other';

/** Probability of one outcome by what is at fault. */
export type Row = Readonly<Record<Sort, number>>;

/** The same for everything that is not named. */
function row(others: number, named: Partial<Row>): Row {
  const even = { chip: others, contact: others, line: others, holder: others, short: others, shared: others };
  return { ...even, supply: others, other: others, ...named };
}

/**
 * How likely each check shows something, by what is at fault. All are estimates (common practice, no source).
 * What a swap, a replacement or a reseating shows is not here: that follows from the model of `priors`.
 */
export const shows = {
  /** Continuity to the legs at the place that is at fault: a leg without contact. */
  openLeg: row(0.02, { chip: 0.01, contact: 0.55, other: 0.3 }),
  /** The chip at fault is much hotter than its neighbours. */
  hot: row(0.01, { chip: 0.15, holder: 0.15, other: 0.02 }),
  /** Better with a good chip on top of the one at fault: only where its output floats. */
  better: row(0.02, { chip: 0.5, contact: 0.15, other: 0.05 }),
  /** The data pin at the place at fault looks wrong on a scope. */
  badPin: row(0.3, { chip: 0.75, line: 0.6, holder: 0.75, short: 0.6 }),
  /** The output of the shared part at fault looks wrong, for its own fault. */
  badPart: row(0.05, { line: 0.85, shared: 0.85, supply: 0.85 }),
  /** The same while something else drags the same lines. */
  draggedPart: row(0.05, { line: 0.25, shared: 0.25, holder: 0.5, short: 0.5, other: 0.3, supply: 0.25 }),
  /** Two lines measured against each other, power off. */
  joined: row(0.02, { short: 0.95, line: 0.1, other: 0.1 }),
  /** Two bits that read alike when they were written differently, and right when they were written alike. */
  together: row(0.02, { short: 0.95, line: 0.04, shared: 0.04, other: 0.1 }),
  /** A rail out of its limits at a socket, by a part that could be the supply or that serves everything. */
  railOut: row(0.01, { supply: 0.97, shared: 0.1, other: 0.05 }),
  /** The same for something unnamed that all banks share. */
  railOutForAll: 0.35,
  /** Read back by the processor, the memory behind a wrong picture is wrong too. */
  memoryWrong: row(0.95, { other: 0.5 }),
  memoryWrongBehindVideo: 0.03,
  /** A whole test finds only some addresses of the lane: cells, rows or columns. Partial failures are most chip failures. */
  someAddresses: row(0.05, { chip: 0.5, holder: 0.1, contact: 0.03, other: 0.2 }),
  /** Taking out the chip that holds a line or strobe sets the others free. */
  freed: 0.93,
  freedByChance: 0.02,
  /** What nothing in the model names: the test shows the same again, or nothing. */
  otherStays: 0.75,
  otherClears: 0.15,
  /** A soak of hours brings it back: a fault that comes and goes, and a contact that handling cured for a time. */
  returnsComesAndGoes: 0.9,
  returnsContact: 0.35,
  returnsOther: 0.3,
} as const;
