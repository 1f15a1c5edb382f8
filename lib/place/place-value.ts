import type { LayoutIndex } from '../layout/layout-index';
import { bankIndex, type BankIndex, type BitIndex } from '../brand';
import { decodeAddress, type AddressMap, type WordPlace } from './address';

/** Where a reading leads, and which data bit each bit of its value is, the lowest first. */
export interface ValuePlace {
  readonly bank: BankIndex;
  readonly word: number;
  readonly bits: readonly BitIndex[];
  /** The same with the check bits, for values that are too wide without them. */
  readonly withChecks: readonly BitIndex[];
  readonly register: WordPlace['register'];
}

/** What the numbers of a reading count and hold. */
export interface ReadingForm {
  readonly unit: 'address' | 'word';
  readonly shows: 'address' | 'word';
}

/**
 * The words that the address of a reading can mean: several only where a page or bank register decides. Addresses
 * that count words are turned into those of the window's first byte lane. Values leave check bits out, unless the
 * machine can show nothing else there.
 */
export function placeValue(map: AddressMap, address: number, form: ReadingForm): ValuePlace[] {
  const places = form.unit === 'word' ? wordPlaces(map, address) : decodeAddress(map, address);
  const words = form.unit === 'word' || form.shows === 'word';
  return places.map(({ bank, word, bits, register }) => {
    const withChecks = words ? bitsOf(map.index, bank) : bits;
    return { bank, word, bits: withoutChecks(map.index, withChecks), withChecks, register };
  });
}

function wordPlaces(map: AddressMap, number: number): WordPlace[] {
  for (const { window, steps } of map.windows) {
    const address = number * steps;
    if (address < window.range.from || address > window.range.to) continue;
    const places = decodeAddress(map, address);
    if (places.length > 0) return places;
  }
  return [];
}

const everyBit = new WeakMap<LayoutIndex, BitIndex[][]>();

function bitsOf(index: LayoutIndex, bank: BankIndex): readonly BitIndex[] {
  let banks = everyBit.get(index);
  if (!banks) {
    banks = Array.from({ length: index.bankCount }, (_, b) =>
      Array.from({ length: index.bitCount }, (_, bit) => bit as BitIndex).filter(
        (bit) => index.laneExists[index.laneOf(bankIndex(b), bit)] === 1,
      ),
    );
    everyBit.set(index, banks);
  }
  return banks[bank] ?? [];
}

const filtered = new WeakMap<readonly BitIndex[], BitIndex[]>();

function withoutChecks(index: LayoutIndex, bits: readonly BitIndex[]): BitIndex[] {
  const before = filtered.get(bits);
  if (before) return before;
  const plain = bits.filter((bit) => !index.isCheckBit[bit]);
  const kept = plain.length > 0 ? plain : [...bits];
  filtered.set(bits, kept);
  return kept;
}
