import type { LayoutDocument } from '@/shared';

/** One data pin of a position and the words of one bank's bit that it carries. */
export interface Port {
  /** Place of the socket in the layout's list. */
  readonly position: number;
  readonly pin: number;
  readonly bank: number;
  readonly bit: number;
  /** bank * bits + bit. */
  readonly lane: number;
  /** First and last word of the bank, and the word inside the chip where they begin. */
  readonly from: number;
  readonly to: number;
  readonly at: number;
}

/**
 * How a board is wired, read straight from the layout document. The simulated bench has its own reading of a layout,
 * so that what it reports does not rest on the look-up that it is used to prove.
 */
export interface Wiring {
  readonly document: LayoutDocument;
  readonly banks: readonly string[];
  readonly bits: number;
  /** Lanes that a port carries, ascending. */
  readonly lanes: readonly number[];
  readonly ports: readonly Port[];
  readonly portsOfLane: ReadonlyMap<number, readonly number[]>;
  readonly portsOfPosition: readonly (readonly number[])[];
  /** Address inputs of the chip of each position. */
  readonly addressBits: readonly number[];
  readonly labels: readonly string[];
  readonly positionOf: ReadonlyMap<string, number>;
  /** The data line of each lane: equal for the same bit of banks that share their lines. */
  readonly lineOfLane: ReadonlyMap<number, number>;
  readonly lanesOfLine: ReadonlyMap<number, readonly number[]>;
}

const wirings = new WeakMap<LayoutDocument, Wiring>();

/** Reads the wiring of a layout, once a document. Holds that refer to no bank or bit of the board are left out. */
export function wiringOf(document: LayoutDocument): Wiring {
  const before = wirings.get(document);
  if (before) return before;
  const made = readWiring(document);
  wirings.set(document, made);
  return made;
}

function readWiring(document: LayoutDocument): Wiring {
  const { memory, sockets } = document;
  const bits = memory.dataBits;
  const banks = memory.banks.map(({ id }) => id);
  const ports = sockets.flatMap(({ holds }, position) =>
    holds.flatMap(({ pin, bank: name, bit, words, at }): Port[] => {
      const bank = banks.indexOf(name);
      const described = memory.banks[bank];
      if (described === undefined || bit >= bits || (described.bits && !described.bits.includes(bit))) return [];
      const { from, to } = words ?? { from: 0, to: described.words - 1 };
      return [{ position, pin, bank, bit, lane: bank * bits + bit, from, to: Math.min(to, described.words - 1), at }];
    }),
  );
  const portNumbers = ports.map((_, at) => at);
  const lanes = [...new Set(ports.map(({ lane }) => lane))].sort((a, b) => a - b);
  const sets = [...new Set(memory.banks.map(({ dataLines }) => dataLines ?? ''))];
  const line = (lane: number) =>
    sets.indexOf(memory.banks[Math.floor(lane / bits)]?.dataLines ?? '') * bits + (lane % bits);
  return {
    document,
    banks,
    bits,
    lanes,
    ports,
    portsOfLane: grouped(portNumbers, (port) => (ports[port] as Port).lane),
    portsOfPosition: sockets.map((_, position) => portNumbers.filter((port) => ports[port]?.position === position)),
    addressBits: sockets.map((_, position) => {
      const own = ports.filter((port) => port.position === position);
      const words = Math.max(1, ...own.map(({ from, to, at }) => at + to - from + 1));
      return Math.ceil(Math.log2(words));
    }),
    labels: sockets.map(({ label }) => label),
    positionOf: new Map(sockets.map(({ label }, position) => [label, position])),
    lineOfLane: new Map(lanes.map((lane) => [lane, line(lane)])),
    lanesOfLine: grouped(lanes, line),
  };
}

/** The members of a list by a number of theirs. */
export function grouped<T>(list: readonly T[], key: (item: T) => number): Map<number, T[]> {
  const groups = new Map<number, T[]>();
  for (const item of list) {
    const group = groups.get(key(item));
    if (group) group.push(item);
    else groups.set(key(item), [item]);
  }
  return groups;
}

/**
 * Which bits of the word number inside a chip reach its row inputs and which its column inputs. Where the layout does
 * not say, the lower half are taken for the rows (common practice, no source).
 */
export function inputsOf({ document, addressBits }: Wiring, position: number): { row: number[]; column: number[] } {
  const count = addressBits[position] ?? 0;
  const all = Array.from({ length: count }, (_, bit) => bit);
  const { multiplexing } = document;
  if (!multiplexing) {
    const half = Math.floor(count / 2);
    return { row: all.slice(0, half), column: all.slice(half) };
  }
  const row = multiplexing.row.filter((bit) => bit < count);
  const column = multiplexing.column.filter((bit) => bit < count && !row.includes(bit));
  const rest = all.filter((bit) => !row.includes(bit) && !column.includes(bit));
  return { row, column: [...column, ...rest] };
}

/** A bit of a whole number of any size. */
export const bitOf = (number: number, bit: number): number => Math.floor(number / 2 ** bit) % 2;

/** The number with a bit set to a value. */
export const withBit = (number: number, bit: number, value: number): number =>
  number + (value - bitOf(number, bit)) * 2 ** bit;
