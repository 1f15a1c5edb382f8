import type { Lane } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { bitOf } from '../place/address-bits';
import type { RunObservation } from './observe/observations';

/** What written and read values say of two data lines being joined. */
export interface LinePair {
  /** Data lines, the lower first. */
  readonly lines: readonly [number, number];
  /** Readings in which one failed as joined lines do: the two were written differently and read alike. */
  readonly joined: number;
  /** Readings that joined lines do not give. */
  readonly against: number;
  /** Readings in which both were written alike and both were right. */
  readonly alike: number;
  /** What both read as when they were written differently; null where it was not always the same. */
  readonly wins: 'low' | 'high' | null;
}

/**
 * Every pair of lines of which one failed in readings whose values are known. A pair of lines that are joined is right
 * whenever both are written alike. At most 12 failing lines are compared with each other and with their neighbours.
 */
export function linePairs(index: LayoutIndex, runs: readonly RunObservation[]): LinePair[] {
  const failing = new Set<number>();
  for (const run of runs) {
    if (run.values.length === 0) continue;
    for (const lane of run.failing) failing.add(index.lineOfLane[lane] as number);
  }
  if (failing.size < 1) return [];
  const candidates = [...failing].sort((a, b) => a - b).slice(0, 12);
  const pairs = new Map<string, [number, number]>();
  for (const line of candidates) {
    const others = [...candidates.filter((other) => sameSet(index, line, other)), line - 1, line + 1];
    for (const other of others) {
      if (other === line || other < 0 || other >= index.lineCount || !sameSet(index, line, other)) continue;
      const pair: [number, number] = line < other ? [line, other] : [other, line];
      pairs.set(pair.join(' '), pair);
    }
  }
  return [...pairs.values()].map((lines) => countPair(index, runs, lines)).filter((p) => p.joined + p.against > 0);
}

function sameSet(index: LayoutIndex, one: number, other: number): boolean {
  return Math.floor(one / index.bitCount) === Math.floor(other / index.bitCount);
}

function countPair(index: LayoutIndex, runs: readonly RunObservation[], lines: [number, number]): LinePair {
  const [a, b] = lines.map((line) => line % index.bitCount) as [number, number];
  let joined = 0;
  let against = 0;
  let alike = 0;
  let lows = 0;
  for (const run of runs) {
    for (const { bank, written, read, count } of run.values) {
      const lane = index.laneOf(bank, a as never) as Lane;
      if (index.lineOfLane[lane] !== lines[0]) continue;
      const [wa, wb, ra, rb] = [bitOf(written, a), bitOf(written, b), bitOf(read, a), bitOf(read, b)];
      const failed = wa !== ra || wb !== rb;
      if (wa === wb && !failed) alike += count;
      else if (wa !== wb && ra === rb) {
        joined += count;
        if (ra === 0) lows += count;
      } else against += count;
    }
  }
  return {
    lines,
    joined,
    against,
    alike,
    wins: joined === 0 ? null : lows === joined ? 'low' : lows === 0 ? 'high' : null,
  };
}

/** True where the readings can only be told as joined lines: each failure fits, and alike values were right. */
export function looksJoined({ joined, against, alike }: LinePair): boolean {
  return joined >= 2 && against === 0 && (alike > 0 || joined >= 4);
}
