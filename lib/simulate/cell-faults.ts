import type { Memory } from './march';

type Bit = 0 | 1;

/** A fault of single cells, after the usual classes of the literature on memory test. */
export type CellFault =
  /** Stuck-at: the cell always holds the value. */
  | { readonly kind: 'stuck'; readonly cell: number; readonly value: Bit }
  /** Transition: a write of `to` over the other value leaves the old one. */
  | { readonly kind: 'transition'; readonly cell: number; readonly to: Bit }
  /** Inversion coupling: when the aggressor changes to `to` by a write, the victim is inverted. */
  | { readonly kind: 'inversion'; readonly aggressor: number; readonly victim: number; readonly to: Bit }
  /** Idempotent coupling: when the aggressor changes to `to` by a write, the victim takes the value. */
  | {
      readonly kind: 'idempotent';
      readonly aggressor: number;
      readonly victim: number;
      readonly to: Bit;
      readonly value: Bit;
    }
  /** State coupling: while the aggressor holds `while`, the victim is forced to the value. */
  | {
      readonly kind: 'state';
      readonly aggressor: number;
      readonly victim: number;
      readonly while: Bit;
      readonly value: Bit;
    }
  /** Decoder: the address reaches no cell; a read gives the value that the output then has. */
  | { readonly kind: 'no-cell'; readonly address: number; readonly reads: Bit }
  /** Decoder: the address reaches another cell in place of its own. */
  | { readonly kind: 'other-cell'; readonly address: number; readonly cell: number }
  /** Decoder: the address reaches another cell beside its own; a read gives the AND or the OR of both. */
  | { readonly kind: 'also-cell'; readonly address: number; readonly cell: number; readonly join: 'and' | 'or' };

/** A small memory of one-bit cells with one fault or none. `initial` gives the content at power-up. */
export function faultyCells(initial: readonly Bit[], fault: CellFault | null): Memory {
  const cells: Bit[] = [...initial];
  /** Cells that an address reaches. */
  const reached = (address: number): number[] => {
    if (fault?.kind === 'no-cell' && fault.address === address) return [];
    if (fault?.kind === 'other-cell' && fault.address === address) return [fault.cell];
    if (fault?.kind === 'also-cell' && fault.address === address) return [address, fault.cell];
    return [address];
  };
  settle(cells, fault);
  return {
    size: cells.length,
    read: (address) => {
      const values = reached(address).map((cell) => cells[cell] as Bit);
      const [first, second] = values;
      if (first === undefined) return fault?.kind === 'no-cell' ? fault.reads : 0;
      if (second === undefined || fault?.kind !== 'also-cell') return first;
      return (fault.join === 'and' ? first & second : first | second) as Bit;
    },
    write: (address, value) => {
      for (const cell of reached(address)) writeCell(cells, fault, { cell, value });
    },
  };
}

/**
 * Writes one cell of a set of cells under a fault of cells (not of the decoder), with what it does to its neighbours.
 * Changes `cells`.
 */
export function writeCell(
  cells: { [at: number]: number },
  fault: CellFault | null,
  { cell, value }: { cell: number; value: Bit },
): void {
  const before = cells[cell];
  if (fault?.kind === 'transition' && fault.cell === cell && before !== value && value === fault.to) return;
  cells[cell] = value;
  if (fault === null) return;
  const changed = before !== value;
  if ((fault.kind === 'inversion' || fault.kind === 'idempotent') && fault.aggressor === cell) {
    if (changed && value === fault.to)
      cells[fault.victim] = fault.kind === 'inversion' ? 1 - (cells[fault.victim] as number) : fault.value;
  }
  settle(cells, fault);
}

/** What holds at every moment, whatever was written. */
export function settle(cells: { [at: number]: number }, fault: CellFault | null): void {
  if (fault?.kind === 'stuck') cells[fault.cell] = fault.value;
  if (fault?.kind === 'state' && cells[fault.aggressor] === fault.while) cells[fault.victim] = fault.value;
}
