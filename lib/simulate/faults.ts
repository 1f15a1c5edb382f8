/** What a faulty place reads: a fixed level, or another at each look. */
export type Reads = 0 | 1 | 'changing';

/** How a fault lies inside a chip. */
export const chipShapes = ['cell', 'row', 'column', 'block', 'scattered', 'whole'] as const;
export type ChipShape = (typeof chipShapes)[number];

/** Faults of single cells that need a sequence of operations to show. Cells are words inside the chip. */
export type CellCoupling =
  | { readonly kind: 'transition'; readonly to: 0 | 1 }
  | { readonly kind: 'inversion'; readonly aggressor: number; readonly to: 0 | 1 }
  | { readonly kind: 'idempotent'; readonly aggressor: number; readonly to: 0 | 1; readonly value: 0 | 1 }
  | { readonly kind: 'state'; readonly aggressor: number; readonly while: 0 | 1; readonly value: 0 | 1 };

/** What a fault does to the lanes that it reaches. */
type Effect =
  /** Part of a chip reads wrong, on one data pin or on all (null). `word` is where: its row, its column, its cell. */
  | {
      readonly kind: 'chip';
      readonly chip: string;
      readonly pin: number | null;
      readonly shape: ChipShape;
      readonly word: number;
      /** For a block, the bit of the word number that halves the chip. */
      readonly addressBit: number;
      readonly reads: Reads;
    }
  | {
      readonly kind: 'cell';
      readonly chip: string;
      readonly pin: number;
      readonly word: number;
      readonly coupling: CellCoupling;
    }
  /** Cells lose their content to a level after so many seconds. */
  | {
      readonly kind: 'retention';
      readonly chip: string;
      readonly pin: number | null;
      readonly shape: ChipShape;
      readonly word: number;
      readonly addressBit: number;
      readonly seconds: number;
      readonly decaysTo: 0 | 1;
    }
  /** An address pin of one chip is open or dead inside: pairs of its words are one cell. */
  | {
      readonly kind: 'chip-address';
      readonly chip: string;
      readonly addressBits: readonly number[];
      readonly level: 0 | 1;
    }
  /** A chip that never lets go of its data line. */
  | { readonly kind: 'holds-line'; readonly chip: string; readonly pin: number; readonly level: Reads }
  /** A chip that holds the strobe of the banks that it sits in. */
  | { readonly kind: 'holds-strobe'; readonly chip: string; readonly floats: Reads }
  /** A chip that holds an address line of the whole array. */
  | {
      readonly kind: 'holds-address';
      readonly chip: string;
      readonly addressBits: readonly number[];
      readonly level: 0 | 1;
    }
  /** A position without contact at one data pin or at all (null). */
  | { readonly kind: 'contact'; readonly socket: string; readonly pin: number | null; readonly floats: Reads }
  /** A position without contact at an address pin. */
  | {
      readonly kind: 'contact-address';
      readonly socket: string;
      readonly addressBits: readonly number[];
      readonly level: 0 | 1;
    }
  /** A leg bent or a chip turned round when a position was last handled. */
  | { readonly kind: 'fitting'; readonly socket: string; readonly floats: Reads }
  /** The way of the data is broken: a buffer, one channel of it, a data line. */
  | { readonly kind: 'data'; readonly lanes: readonly number[]; readonly level: Reads }
  /** Two data lines joined: the lower level wins. */
  | { readonly kind: 'short'; readonly pairs: readonly (readonly [number, number])[] }
  /** The chips behind these lanes are never selected. */
  | { readonly kind: 'strobe'; readonly lanes: readonly number[]; readonly floats: Reads }
  /** Bits of the word number inside every chip behind these lanes that are always at a level. */
  | {
      readonly kind: 'address';
      readonly lanes: readonly number[];
      readonly addressBits: readonly number[];
      readonly level: 0 | 1;
    }
  /** Two address inputs joined: the lower level wins, at row time and at column time. */
  | {
      readonly kind: 'address-short';
      readonly lanes: readonly number[];
      readonly pairs: readonly (readonly [number, number])[];
    }
  /** Writes do not arrive. */
  | { readonly kind: 'write'; readonly lanes: readonly number[] }
  /** Rows are not refreshed: cells lose their content during the test. */
  | { readonly kind: 'refresh'; readonly lanes: readonly number[] }
  /** One lane read wrong in one pass, for no cause that stays. */
  | { readonly kind: 'stray'; readonly lane: number };

/** A fault on a simulated board. */
export type BoardFault = Effect & {
  /** It comes and goes: in each pass it is there or not, for each lane by itself. */
  readonly intermittent: boolean;
};
