import type { BoardFault, CellCoupling } from './faults';
import { sampledWords } from './sample';
import type { Random } from './self-test';
import { faultShares, oneOf, pick, pickLevel } from './shares';
import { inputsOf, type Wiring } from './wiring';

type Lasting<F> = F extends unknown ? Omit<F, 'intermittent'> : never;
/** A fault before it is said whether it comes and goes. */
export type DrawnFault = Lasting<BoardFault>;

interface Place {
  readonly wiring: Wiring;
  readonly position: number;
  readonly random: Random;
  /** Null for all data pins. */
  readonly pin: number | null;
}

/** How a chip has failed for its own lanes (`whole`) or one of several: where inside it, and what it then reads. */
export function drawChipFault({
  wiring,
  position,
  chip,
  random,
  pin,
  whole,
}: Place & { chip: string; whole: boolean }): DrawnFault {
  const shape = pick(faultShares.chipShape, random);
  const words = sampledWords(wiring, position);
  const word = oneOf(words, random);
  const bits = wiring.addressBits[position] ?? 0;
  const addressBit = Math.floor(random() * Math.max(1, bits));
  const level = random() < 0.5 ? 0 : 1;
  if (shape === 'block' && bits > 0 && pick(faultShares.block, random) === 'aliased' && whole) {
    return { kind: 'chip-address', chip, addressBits: [addressBit], level };
  }
  if (shape === 'cell' && pin !== null && words.length > 1) {
    const coupling = drawCoupling(words, word, random);
    if (coupling) return { kind: 'cell', chip, pin, word, coupling };
  }
  const reads = pickLevel(faultShares.deadReads, random);
  return { kind: 'chip', chip, pin, shape, word, addressBit, reads };
}

function drawCoupling(words: readonly number[], victim: number, random: Random): CellCoupling | null {
  const kind = pick(faultShares.cell, random);
  const bit = () => (random() < 0.5 ? 0 : 1);
  const aggressor = oneOf(
    words.filter((word) => word !== victim),
    random,
  );
  switch (kind) {
    case 'stuck':
      return null;
    case 'transition':
      return { kind, to: bit() };
    case 'inversion':
      return { kind, aggressor, to: bit() };
    case 'idempotent':
      return { kind, aggressor, to: bit(), value: bit() };
    case 'state':
      return { kind, aggressor, while: bit(), value: bit() };
  }
}

/** How a position has lost contact: at an address pin, so that words share cells, or so that nothing comes through. */
export function drawContactFault({ wiring, position, socket, random, pin }: Place & { socket: string }): DrawnFault {
  const bits = wiring.addressBits[position] ?? 0;
  if (pin === null && bits > 0 && pick(faultShares.contactPin, random) === 'address') {
    const level = random() < 0.8 ? 1 : 0;
    return { kind: 'contact-address', socket, addressBits: randomAddressPair(wiring, position, random), level };
  }
  return { kind: 'contact', socket, pin, floats: pickLevel(faultShares.floats, random) };
}

/** The bits of the word number that one address pin of a chip takes: a row and a column bit where they share the pin. */
export function randomAddressPair(wiring: Wiring, position: number, random: Random): number[] {
  const { row, column } = inputsOf(wiring, position);
  const nth = Math.floor(random() * Math.max(row.length, column.length));
  if (!wiring.document.multiplexing) return [oneOf([...row, ...column], random)];
  return [row[nth], column[nth]].flatMap((bit) => (bit === undefined ? [] : [bit]));
}
