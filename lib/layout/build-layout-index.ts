import type { ChipFamily, LayoutDocument } from '@/shared';
import {
  type BankIndex,
  type BitIndex,
  type Lane,
  type SocketIndex,
  bankIndex,
  bitIndex,
  lane,
  socketIndex,
} from '../brand';
import { findFamily } from '../chips/families';
import type { LayoutIndex } from './layout-index';
import { bankWords, bitWords, lineLabel } from './words';

/** First occurrence wins, so that a doubled name still leads somewhere steady. */
function firstByName<I>(names: readonly string[], make: (at: number) => I): Map<string, I> {
  const map = new Map<string, I>();
  names.forEach((name, at) => {
    if (!map.has(name)) map.set(name, make(at));
  });
  return map;
}

function existingLanes({ memory }: LayoutDocument): Uint8Array {
  const exists = new Uint8Array(memory.banks.length * memory.dataBits);
  memory.banks.forEach((bank, at) => {
    const base = at * memory.dataBits;
    if (bank.bits === undefined) exists.fill(1, base, base + memory.dataBits);
    else for (const bit of bank.bits) if (bit < memory.dataBits) exists[base + bit] = 1;
  });
  return exists;
}

interface Lists {
  readonly start: Uint32Array;
  readonly pairs: readonly (readonly [owner: number, member: number])[];
}

/** Starts of the lists of each owner in one array, by counting. The pairs come in the order that members are wanted. */
function startsOf(owners: number, pairs: Lists['pairs']): Uint32Array {
  const start = new Uint32Array(owners + 1);
  for (const [owner] of pairs) start[owner + 1]!++;
  for (let i = 0; i < owners; i++) start[i + 1]! += start[i]!;
  return start;
}

function fill<A extends Uint16Array | Uint32Array>({ start, pairs }: Lists, into: A): A {
  const next = start.slice();
  for (const [owner, member] of pairs) into[next[owner]!++] = member;
  return into;
}

function heldPairs(document: LayoutDocument, bankByName: ReadonlyMap<string, BankIndex>, exists: Uint8Array) {
  const { dataBits } = document.memory;
  const bySocket: [number, number][] = [];
  document.sockets.forEach((socket, at) => {
    const lanes = new Set<number>();
    for (const { bank, bit } of socket.holds) {
      const index = bankByName.get(bank);
      if (index === undefined || bit >= dataBits) continue;
      const held = index * dataBits + bit;
      if (exists[held] === 1) lanes.add(held);
    }
    for (const held of [...lanes].sort((a, b) => a - b)) bySocket.push([at, held]);
  });
  return bySocket;
}

function dataLines({ memory }: LayoutDocument) {
  const groups = firstByName([...new Set(memory.banks.map((bank) => bank.dataLines ?? ''))], (at) => at);
  const names = [...groups.keys()];
  const lineOfLane = new Uint32Array(memory.banks.length * memory.dataBits);
  memory.banks.forEach((bank, at) => {
    const first = groups.get(bank.dataLines ?? '')! * memory.dataBits;
    for (let bit = 0; bit < memory.dataBits; bit++) lineOfLane[at * memory.dataBits + bit] = first + bit;
  });
  const lineName = (line: number) => {
    const group = names[Math.floor(line / memory.dataBits)];
    const label = lineLabel(memory, line % memory.dataBits);
    return group === undefined || group === '' || names.length === 1 ? label : `${group} ${label}`;
  };
  return { lineOfLane, lineCount: names.length * memory.dataBits, lineName };
}

function checkBitMarks({ memory }: LayoutDocument): Uint8Array {
  const marks = new Uint8Array(memory.dataBits);
  for (const bit of memory.checkBits) if (bit < memory.dataBits) marks[bit] = 1;
  return marks;
}

function familiesOf(document: LayoutDocument): (ChipFamily | null)[] {
  const known = new Map<string, ChipFamily | null>();
  return document.sockets.map(({ family }) => {
    if (!known.has(family)) known.set(family, findFamily(document, family));
    return known.get(family)!;
  });
}

/**
 * Everything that is looked up in a layout, built once. Never throws on a document that the schema allows: what
 * refers to nothing (a bank that is not there, a bit beyond the word) is left out, and validateLayout says so.
 */
export function buildLayoutIndex(document: LayoutDocument): LayoutIndex {
  const { memory } = document;
  const bitCount = memory.dataBits;
  const bankByName = firstByName(
    memory.banks.map((bank) => bank.id),
    bankIndex,
  );
  const laneExists = existingLanes(document);
  const laneCount = laneExists.length;

  const bySocket = heldPairs(document, bankByName, laneExists);
  const byLane = bySocket.map(([at, held]): [number, number] => [held, at]);
  const socketLaneStart = startsOf(document.sockets.length, bySocket);
  const laneSocketStart = startsOf(laneCount, byLane);

  return {
    document,
    bankCount: memory.banks.length,
    bitCount,
    laneCount,
    laneExists,
    isCheckBit: checkBitMarks(document),
    bankByName,
    socketByLabel: firstByName<SocketIndex>(
      document.sockets.map((socket) => socket.label),
      socketIndex,
    ),
    familyOfSocket: familiesOf(document),
    laneSocketStart,
    laneSockets: fill({ start: laneSocketStart, pairs: byLane }, new Uint16Array(byLane.length)),
    socketLaneStart,
    socketLanes: fill({ start: socketLaneStart, pairs: bySocket }, new Uint32Array(bySocket.length)),
    ...dataLines(document),
    laneOf: (bank: BankIndex, bit: BitIndex): Lane => lane(bank * bitCount + bit),
    bankOf: (of: Lane): BankIndex => bankIndex(Math.floor(of / bitCount)),
    bitOf: (of: Lane): BitIndex => bitIndex(of % bitCount),
    laneWords: (of: Lane) =>
      `${bitWords(memory, of % bitCount)} of ${bankWords(memory.banks[Math.floor(of / bitCount)]?.id ?? '?')}`,
    lanes: Uint32Array.from(laneExists.keys()).filter((of) => laneExists[of] === 1),
  };
}
