import { inputsOf, withBit, type Wiring } from './wiring';

/** Chips with no more words than this are simulated whole. */
const wholeUpTo = 256;

/**
 * The words of a chip that are simulated, ascending. A small chip is simulated whole. Of a larger one it is a grid of
 * rows and columns, each of which differs from the first of them in one address input at most: every address input
 * is exercised, a row and a column keep several words, and a board of hundreds of chips runs in milliseconds. What a
 * sampled chip reports is true word by word; only how many words fail is not to scale.
 */
export function sampledWords(wiring: Wiring, position: number, { most = wholeUpTo } = {}): number[] {
  const count = wiring.addressBits[position] ?? 0;
  if (2 ** count <= most) return Array.from({ length: 2 ** count }, (_, word) => word);
  const { row, column } = inputsOf(wiring, position);
  const rows = [0, ...row.map((bit) => withBit(0, bit, 1))];
  const columns = [0, ...column.map((bit) => withBit(0, bit, 1))];
  return rows.flatMap((r) => columns.map((c) => r + c)).sort((a, b) => a - b);
}
