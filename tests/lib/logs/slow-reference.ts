import type { LayoutDocument } from '@/shared';

/** A reading as a log says it, before it is written as a line. Values are words of up to 72 bits. */
export interface LoggedReading {
  readonly address: number;
  readonly written: bigint;
  readonly read: bigint;
}

interface LaneCount {
  readsOne: number;
  readsZero: number;
  alone: number;
  words: Set<number>;
  chipWords: Set<number>;
  zeros: number;
  ones: number;
  first: number;
  last: number;
}

/** Where an address leads, worked out bit by bit from the words of the layout's own description. */
function placeOf({ addressMap, memory }: LayoutDocument, address: number) {
  for (const window of addressMap.windows) {
    if (address < window.range.from || address > window.range.to) continue;
    const text = address.toString(2).padStart(48, '0');
    const bitAt = (bit: number) => Number(text[47 - bit]);
    const number = window.interleave.reduce(
      (sum, bits, at) => sum + (bits.reduce((odd, bit) => odd + bitAt(bit), 0) % 2) * 2 ** at,
      0,
    );
    const bank = memory.banks.find(({ id }) => id === window.banks[number]);
    if (bank === undefined) continue;
    const all = Array.from({ length: memory.dataBits }, (_, bit) => bit);
    const lanes = window.lanes ?? [all];
    const offset = address - window.range.from;
    const laneBits = Math.log2(lanes.length);
    const gone = new Set(window.interleave.map((bits) => bits[0]! - laneBits));
    const unit = Math.floor(offset / lanes.length)
      .toString(2)
      .split('')
      .reverse();
    const kept = unit.filter((_, bit) => !gone.has(bit)).reverse();
    const word = window.firstWord + Number.parseInt(kept.join('') || '0', 2);
    const bits = lanes[offset % lanes.length]!.filter((bit) => (bank.bits ?? all).includes(bit));
    const plain = bits.filter((bit) => !memory.checkBits.includes(bit));
    if (word < bank.words) return { bank: bank.id, word, bits: plain.length > 0 ? plain : bits };
  }
  return null;
}

function chipWordsOf(
  { sockets }: LayoutDocument,
  bank: string,
  { bit, word }: { bit: number; word: number },
): number[] {
  return sockets.flatMap(({ holds }) =>
    holds
      .filter((held) => held.bank === bank && held.bit === bit)
      .filter(({ words }) => words === undefined || (word >= words.from && word <= words.to))
      .map((held) => word - (held.words?.from ?? 0) + held.at),
  );
}

function gather(word: number, bits: readonly number[]): number {
  return bits.reduce((sum, bit, at) => sum + (Math.floor(word / 2 ** bit) % 2) * 2 ** at, 0);
}

const everyBit = (words: Iterable<number>, value: 0 | 1) => {
  const list = [...words].map(BigInt);
  const kept = Array.from({ length: 40 }, (_, bit) => BigInt(bit)).filter((bit) =>
    list.every((word) => ((word >> bit) & 1n) === BigInt(value)),
  );
  return Number(kept.reduce((sum, bit) => sum + (1n << bit), 0n));
};

/** The tally of a log the slow and plain way, in the form of the evidence without its name and its line counts. */
export function slowTally(document: LayoutDocument, readings: readonly LoggedReading[]) {
  const lanes = new Map<string, LaneCount>();
  const values = new Map<string, number>();
  let outside = 0;
  readings.forEach(({ address, written, read }, at) => {
    const place = placeOf(document, address);
    if (place === null) return outside++;
    const bad = place.bits.filter((_, n) => ((written ^ read) >> BigInt(n)) % 2n === 1n);
    let [whole, back] = [0, 0];
    place.bits.forEach((bit, n) => {
      const key = `${place.bank} ${bit}`;
      const lane: LaneCount = lanes.get(key) ?? {
        ...{ readsOne: 0, readsZero: 0, alone: 0, zeros: 0, ones: 0, first: 0, last: 0 },
        ...{ words: new Set<number>(), chipWords: new Set<number>() },
      };
      lanes.set(key, lane);
      const [wrote, got] = [(written >> BigInt(n)) % 2n, (read >> BigInt(n)) % 2n];
      if (bit < 40) {
        whole += Number(wrote) * 2 ** bit;
        back += Number(got) * 2 ** bit;
      }
      if (wrote === got) return wrote === 1n ? lane.ones++ : lane.zeros++;
      if (got === 1n) lane.readsOne++;
      else lane.readsZero++;
      if (bad.length === 1) lane.alone++;
      lane.words.add(place.word);
      for (const word of chipWordsOf(document, place.bank, { bit, word: place.word })) lane.chipWords.add(word);
      if (lane.first === 0) lane.first = at + 1;
      lane.last = at + 1;
      return 0;
    });
    const pair = `${place.bank} ${whole} ${back}`;
    values.set(pair, (values.get(pair) ?? 0) + 1);
    return 0;
  });
  const { multiplexing } = document;
  const named = [...lanes].map(([key, lane]) => {
    const [bank, bit] = key.split(' ') as [string, string];
    return { bank, bit: Number(bit), lane };
  });
  return {
    outside,
    values: new Set([...values].map(([pair, count]) => `${pair}: ${count}`)),
    lanes: new Map(
      named
        .filter(({ lane }) => lane.words.size > 0)
        .map(({ bank, bit, lane }) => {
          const inside = [...lane.chipWords];
          const rows = new Set(multiplexing ? inside.map((word) => gather(word, multiplexing.row)) : []);
          const columns = new Set(multiplexing ? inside.map((word) => gather(word, multiplexing.column)) : []);
          return [
            `${bank} ${bit}`,
            {
              bank,
              bit,
              readsOne: lane.readsOne,
              readsZero: lane.readsZero,
              alone: lane.alone,
              words: lane.words.size,
              rows: rows.size,
              columns: columns.size,
              ...(rows.size === 1 ? { row: [...rows][0] } : {}),
              ...(columns.size === 1 ? { column: [...columns][0] } : {}),
              ones: everyBit(inside, 1),
              zeros: everyBit(inside, 0),
              first: lane.first,
              last: lane.last,
            },
          ];
        }),
    ),
    right: new Map(
      named
        .filter(({ lane }) => lane.ones + lane.zeros > 0)
        .map(({ bank, bit, lane }) => [`${bank} ${bit}`, { bank, bit, zeros: lane.zeros, ones: lane.ones }]),
    ),
  };
}
