import type { LayoutIndex } from '../layout/layout-index';
import { bitOf } from '../place/address-bits';

/** Row and column of a word inside a chip, as the layout's multiplexing takes them from its number. */
export interface RowAndColumn {
  readonly row: number;
  readonly column: number;
}

function pick(word: number, bits: readonly number[]): number {
  let value = 0;
  for (let i = 0; i < bits.length; i++) value += bitOf(word, bits[i] as number) * 2 ** i;
  return value;
}

/** Null where the layout does not say how the address reaches rows and columns. */
export function rowAndColumn(index: LayoutIndex, chipWord: number): RowAndColumn | null {
  const { multiplexing } = index.document;
  if (!multiplexing || multiplexing.row.length === 0 || multiplexing.column.length === 0) return null;
  return { row: pick(chipWord, multiplexing.row), column: pick(chipWord, multiplexing.column) };
}
