import { lane } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { segmentsOf } from '../layout/segments';
import type { LinePattern, PlaneLine } from './screen';

const known = new WeakMap<LayoutIndex, readonly number[]>();

/** The words at which one chip of a lane ends and another begins, ascending; empty where each lane is one chip. */
export function chipEnds(index: LayoutIndex): readonly number[] {
  let ends = known.get(index);
  if (ends === undefined) {
    const all = new Set<number>();
    for (const of of index.lanes) {
      const segments = segmentsOf(index, lane(of));
      if (segments.length < 2) continue;
      for (const { from, to } of segments) all.add(from).add(to + 1);
    }
    ends = [...all].filter((end) => end > 0).sort((a, b) => a - b);
    known.set(index, ends);
  }
  return ends;
}

const before = (ends: readonly number[], word: number) => ends.filter((end) => end <= word).length;

/** Equal for lines whose words lie behind the same chips; null where a line reaches over the end of a chip. */
export function chipsOfLine(ends: readonly number[], { pattern, firstWord }: PlaneLine): number | null {
  if (ends.length === 0) return 0;
  const first = before(ends, firstWord + pattern.least);
  return first === before(ends, firstWord + pattern.most) ? first : null;
}

/** A line cut where one chip ends and another begins, each piece with one of its words. */
export function piecesOf(
  ends: readonly number[],
  { pattern, firstWord }: PlaneLine,
): { pattern: LinePattern; word: number }[] {
  const pieces = new Map<number, { units: Set<number>; word: number }>();
  pattern.cells.forEach((cell, unit) => {
    if (cell === null) return;
    const word = firstWord + pattern.words[unit]!;
    const chips = before(ends, word);
    const piece = pieces.get(chips);
    if (piece === undefined) pieces.set(chips, { units: new Set([unit]), word });
    else piece.units.add(unit);
  });
  return [...pieces.values()].map(({ units, word }) => ({
    pattern: { ...pattern, cells: pattern.cells.map((cell, unit) => (units.has(unit) ? cell : null)) },
    word,
  }));
}

/** For the lanes of a word, the bit that stands for the chip which holds it; 0 for a lane of one chip. */
export function segmentAt(index: LayoutIndex, word: number): (of: number) => number {
  const bits = new Map<number, number>();
  return (of) => {
    let bit = bits.get(of);
    if (bit === undefined) {
      const segments = segmentsOf(index, lane(of));
      const at = segments.findIndex(({ from, to }) => word >= from && word <= to);
      bit = segments.length < 2 || at < 0 ? 0 : 1 << at;
      bits.set(of, bit);
    }
    return bit;
  };
}
