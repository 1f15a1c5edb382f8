import type { CellCoupling, ChipShape, Reads } from './faults';

/**
 * How faults look, as shares that sum to 1. All are estimates of the trade (common practice, no source): the literature
 * agrees only that part of a chip fails more often than all of it.
 */
export const faultShares = {
  /** How a fault lies inside a chip that is bad for its own lanes. */
  chipShape: { cell: 0.2, row: 0.1, column: 0.1, block: 0.05, scattered: 0.1, whole: 0.45 } satisfies Record<
    ChipShape,
    number
  >,
  /** A single bad cell: it always reads the same, or it needs a sequence of operations to show. */
  cell: { stuck: 0.7, transition: 0.1, inversion: 0.05, idempotent: 0.1, state: 0.05 } satisfies Record<
    CellCoupling['kind'] | 'stuck',
    number
  >,
  /** Half a chip: its cells read wrong, or an address input inside is dead so that two words share a cell. */
  block: { wrong: 0.5, aliased: 0.5 },
  /** What a dead part of a chip reads. */
  deadReads: { low: 0.4, high: 0.4, changing: 0.2 },
  /** A chip that holds its data line. */
  heldLevel: { low: 0.6, high: 0.3, changing: 0.1 },
  /** What an input reads that nothing drives. */
  floats: { low: 0.1, high: 0.7, changing: 0.2 },
  /** Which pin of a position has no contact: one of the address inputs, or any other (7 of 16 pins of the usual package). */
  contactPin: { address: 0.44, other: 0.56 },
  /** A multiplexer's channel: an input (one bit of the word number), an output (a row and a column bit), two outputs joined. */
  addressChannel: { input: 0.4, output: 0.4, joined: 0.2 },
} as const;

/** One of the names of a table of shares, drawn by a number from 0 to 1. */
export function pick<Name extends string>(shares: Readonly<Record<Name, number>>, random: () => number): Name {
  const names = Object.keys(shares) as Name[];
  let left = random();
  for (const name of names) {
    left -= shares[name];
    if (left < 0) return name;
  }
  return names[names.length - 1] as Name;
}

const levels = { low: 0, high: 1, changing: 'changing' } as const;

/** A level drawn from a table of shares. */
export const pickLevel = (shares: Readonly<Record<keyof typeof levels, number>>, random: () => number): Reads =>
  levels[pick(shares, random)];

/** One of a list, each with the same chance. Throws a RangeError on an empty list. */
export function oneOf<T>(list: readonly T[], random: () => number): T {
  const item = list[Math.floor(random() * list.length)];
  if (item === undefined) throw new RangeError('There is nothing to choose from.');
  return item;
}
