/** One line of the table. A figure with a target is told with its share of the target. */
export interface Row {
  readonly what: string;
  readonly value: number;
  readonly unit: string;
  readonly target?: { readonly atLeast: number } | { readonly atMost: number };
}

/** The value below which a share of the values lies, 0 to 1. */
export const quantile = (values: readonly number[], share: number): number => {
  const sorted = [...values].sort((a, b) => a - b);
  const value = sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))];
  if (value === undefined) throw new RangeError('Nothing was measured.');
  return value;
};

/** The middle one of several measurements: on a shared machine the mean tells of the others. */
export const median = (values: readonly number[]): number => quantile(values, 0.5);

/** Milliseconds that work takes. */
export const timed = (work: () => unknown): number => {
  const start = performance.now();
  work();
  return performance.now() - start;
};

/** A sequence of whole numbers below a bound, the same for the same seed (mulberry32). */
export const seeded = (seed: number) => {
  let state = seed;
  return (below: number): number => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return Math.floor((((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296) * below);
  };
};

/** Gives the rows of this part to the process that prints the table. */
export const report = (rows: readonly Row[]): void => {
  process.send?.({ rows });
};
