import type { LayoutIndex } from '../layout/layout-index';
import { fixedBits, shapesThatFit } from './shapes';
import { looksJoined } from './line-pairs';
import type { Told } from './mixture';
import { chipSize } from './signals';

/** Causes that are worth listing only because the readings point at them. */
export interface Hints {
  readonly addressLines: boolean;
  /** Pairs of data lines that read as joined. */
  readonly joinedLines: readonly (readonly [number, number])[];
}

/** Nothing points beyond the usual causes. */
export const noHints: Hints = { addressLines: false, joinedLines: [] };

/** What the readings, in any of the ways to understand them, point at. */
export function hintsOf(index: LayoutIndex, interpretations: readonly Told[]): Hints {
  let addressLines = false;
  const joined = new Map<string, readonly [number, number]>();
  for (const { runs, signals } of interpretations) {
    if (!runs.some((run) => run.seen.size > 0 || run.aliased.size > 0)) continue;
    for (const pair of signals.pairs) {
      if (looksJoined(pair)) joined.set(pair.lines.join(' '), pair.lines);
    }
    for (const run of runs) {
      if (run.aliased.size > 0) addressLines = true;
      const [lane] = run.failing;
      const seen = lane === undefined ? undefined : run.seen.get(lane);
      if (lane === undefined || !seen || run.failing.size < 4) continue;
      const size = chipSize(index, lane);
      const shapes = shapesThatFit(seen, { size, whole: run.whole });
      if (shapes?.length === 1 && shapes[0] === 'block' && fixedBits(seen, size.words).length > 0) addressLines = true;
    }
  }
  return addressLines || joined.size > 0 ? { addressLines, joinedLines: [...joined.values()] } : noHints;
}
