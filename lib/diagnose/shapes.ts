import type { Shape, SharedPart } from '@/shared';
import { bitOf } from '../place/address-bits';
import type { LaneSeen } from '../readings/lane-seen';
import type { Cause, Part } from './cause-types';

/**
 * How the failing words of one lane lie, by what has failed: the share of faults of each kind that show so. Estimates
 * of the trade (common practice, no source) but for the chip, whose single cells and whole rows and columns lean on
 * field counts of later chips (single bit 47 %, row or column 22.5 % of faults: a memory maker's tutorial on
 * error-correcting memories, secondary) and on the bench, where a chip that a self-test names is mostly dead as a
 * whole. A pair of lanes that follow each other is a shape of both lanes.
 *
 * The likelihood ratio of a shape for two causes is the ratio of their figures in one column.
 */
export const shapeShares = {
  //               cell      row       column    block     scattered whole     follows-neighbour
  chip: shares([0.19, 0.1, 0.1, 0.05, 0.1, 0.45, 0.01]),
  contact: shares([0.005, 0.005, 0.005, 0.1, 0.085, 0.795, 0.005]),
  'held line': shares([0.002, 0.001, 0.001, 0.006, 0.04, 0.945, 0.005]),
  'data channel': shares([0.002, 0.001, 0.001, 0.006, 0.04, 0.94, 0.01]),
  'address line': shares([0.001, 0.01, 0.01, 0.579, 0.15, 0.245, 0.005]),
  'whole part': shares([0.002, 0.004, 0.004, 0.04, 0.15, 0.795, 0.005]),
  short: shares([0.002, 0.001, 0.001, 0.006, 0.04, 0.05, 0.9]),
  unknown: shares([0.12, 0.02, 0.02, 0.05, 0.38, 0.4, 0.01]),
} as const satisfies Record<string, Readonly<Record<Shape, number>>>;

export type ShapeRow = keyof typeof shapeShares;

function shares([cell, row, column, block, scattered, whole, follows]: [
  number,
  number,
  number,
  number,
  number,
  number,
  number,
]): Readonly<Record<Shape, number>> {
  return { cell, row, column, block, scattered, whole, 'follows-neighbour': follows };
}

/** The row of the table for a cause. */
export function shapeRowOf(part: Part, cause: Cause, role: SharedPart['role'] | null): ShapeRow {
  switch (cause.mode) {
    case 'dead':
    case 'dead-bit':
    case 'wrong-part':
      return 'chip';
    case 'holds-line':
      return 'held line';
    case 'holds-strobe':
    case 'supply':
      return 'whole part';
    case 'holds-address':
      return 'address line';
    case 'open':
    case 'open-bit':
    case 'fitting':
      return 'contact';
    case 'short':
      return 'short';
    case 'channel':
      return cause.addressBits ? 'address line' : 'data channel';
    case 'whole':
      return cause.addressBits && role === 'multiplexer' ? 'address line' : 'whole part';
  }
}

/** Sizes of the chip behind a lane; 0 where the layout does not say. */
export interface ChipSize {
  readonly words: number;
  readonly rows: number;
  readonly columns: number;
}

const fewWords = 4;
const everywhere: readonly Shape[] = ['cell', 'row', 'column', 'block', 'scattered', 'whole'];

/**
 * The shapes that fit what was seen of a failing lane, null where nothing is known of its words. One where the whole
 * memory was read; several where only some lines are known, because a log that ends early looks like a part of a chip.
 */
export function shapesThatFit(
  seen: LaneSeen,
  { size, whole }: { size: ChipSize; whole: boolean },
): readonly Shape[] | null {
  const n = seen.words;
  if (n === 0) return null;
  const oneRow = seen.row !== null && seen.rows === 1;
  const oneColumn = seen.column !== null && seen.columns === 1;
  if (!whole) {
    if (n === 1) return null;
    // A list that ends exactly where a row or column of the chip ends is one.
    if (oneRow && size.columns > 1 && seen.columns >= size.columns) return ['row'];
    if (oneColumn && size.rows > 1 && seen.rows >= size.rows) return ['column'];
    return everywhere.filter(
      (shape) =>
        !(shape === 'cell' && n > fewWords) && !(shape === 'row' && !oneRow) && !(shape === 'column' && !oneColumn),
    );
  }
  if (n <= fewWords) return n > 1 && (oneRow || oneColumn) ? ['cell', oneRow ? 'row' : 'column'] : ['cell'];
  if (oneRow) return ['row'];
  if (oneColumn) return ['column'];
  const outOf = seen.outOf ?? size.words;
  const fixed = fixedBits(seen, size.words).length;
  if (fixed > 0 && n >= (0.3 * outOf) / 2 ** fixed) return ['block'];
  return outOf > 0 && n >= 0.4 * outOf ? ['whole'] : ['scattered'];
}

/** Bits of the word number inside the chip that were the same in every failing word. */
export function fixedBits(seen: LaneSeen, words: number): number[] {
  const bits: number[] = [];
  if (seen.outOf !== null) return bits;
  for (let bit = 0; 2 ** bit < words; bit++) {
    if (bitOf(seen.ones, bit) !== bitOf(seen.zeros, bit)) bits.push(bit);
  }
  return bits;
}

/** Probability of the shapes that fit, for a row of the table. */
export function shareOf(row: ShapeRow, shapes: readonly Shape[]): number {
  let total = 0;
  for (const shape of shapes) total += shapeShares[row][shape];
  return total;
}

/** What was tried of a lane that passed: right words, and whether both values were written. */
export interface Tried {
  readonly words: number;
  readonly bothValues: boolean;
}

/** A fault that holds a lane at one value is seen by one written value in this share of cases (estimate). */
const oneValueShows = 0.65;
/** So many doublings of the words that were tried find any part of a chip. */
const allFound = 16;

/**
 * The chance that a fault of this row would have shown in what was tried of a lane, 0 to 1: in one word by the share
 * of faults that spoil any word, growing with the words that were tried.
 */
export function shownBy(row: ShapeRow, { words, bothValues }: Tried): number {
  const own = shapeShares[row];
  const anyWord = row === 'short' ? 0.3 : own.whole + (own.scattered + own.block) / 2 + own['follows-neighbour'];
  const found = Math.min(1, Math.log2(Math.max(1, words)) / allFound);
  return (bothValues ? 1 : oneValueShows) * (anyWord + (1 - anyWord) * found);
}
