import type { AddressWindow } from '@/shared';
import {
  type BankIndex,
  type BitIndex,
  type CpuAddress,
  type WordNumber,
  bitIndex,
  cpuAddress,
  wordNumber,
} from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { closeUp, openUp, parityOfBits } from './address-bits';

type Register = NonNullable<AddressWindow['register']>;

/** Where a CPU address leads. */
export interface WordPlace {
  readonly bank: BankIndex;
  readonly word: WordNumber;
  /** The bits of the word that this address carries, in the order in which the address shows them, lowest first. */
  readonly bits: readonly BitIndex[];
  /** The register value under which the window is there; null where it always is. */
  readonly register: Register | null;
}

/** An address that leads to a word, and the register value that it needs. */
export interface AddressOf {
  readonly address: CpuAddress;
  readonly register: Register | null;
}

interface PreparedWindow {
  readonly window: AddressWindow;
  readonly steps: number;
  /** Which bits of the offset, counted in words, the bank number takes away. Ascending. */
  readonly removed: readonly number[];
  /** Index of each named bank; undefined where the layout has none of that name. */
  readonly banks: readonly (BankIndex | undefined)[];
  /** The bits that each step carries, by the place of the bank in the window's list. */
  readonly carried: readonly (readonly (readonly BitIndex[])[])[];
}

/** The windows of a layout made ready for look-up. */
export interface AddressMap {
  readonly index: LayoutIndex;
  /** By first address. */
  readonly windows: readonly PreparedWindow[];
  /** The highest last address of this window and those before it, so that a search can stop. */
  readonly reach: readonly number[];
  /** The windows behind which each bank lies. */
  readonly byBank: ReadonlyMap<number, readonly PreparedWindow[]>;
}

function carriedBits(index: LayoutIndex, window: AddressWindow, bank: BankIndex | undefined): BitIndex[][] {
  if (bank === undefined) return [];
  const has = (bit: number) => bit < index.bitCount && index.laneExists[bank * index.bitCount + bit] === 1;
  const all = Array.from({ length: index.bitCount }, (_, bit) => bit);
  return (window.lanes ?? [all]).map((bits) => bits.filter(has).map(bitIndex));
}

/** Null where the interleave cannot be worked out: bits below the byte lanes, or lanes that are no power of two. */
function removedBits(window: AddressWindow, steps: number): number[] | null {
  if (window.interleave.length === 0) return [];
  const laneBits = Math.log2(steps);
  if (!Number.isInteger(laneBits)) return null;
  const removed = window.interleave.map((bits) => bits[0]! - laneBits).sort((a, b) => a - b);
  const usable = removed.every((bit, at) => bit >= 0 && bit !== removed[at - 1]);
  return usable ? removed : null;
}

const mapOf = new WeakMap<LayoutIndex, AddressMap>();

/**
 * The address windows of a layout made ready, once a layout. Windows that make no sense are left out; validateLayout
 * names them.
 */
export function addressMapOf(index: LayoutIndex): AddressMap {
  let map = mapOf.get(index);
  if (!map) mapOf.set(index, (map = buildAddressMap(index)));
  return map;
}

function buildAddressMap(index: LayoutIndex): AddressMap {
  const windows = index.document.addressMap.windows
    .flatMap((window): PreparedWindow[] => {
      const steps = window.lanes?.length ?? 1;
      const removed = removedBits(window, steps);
      if (removed === null) return [];
      const banks = window.banks.map((name) => index.bankByName.get(name));
      return [{ window, steps, removed, banks, carried: banks.map((bank) => carriedBits(index, window, bank)) }];
    })
    .sort((a, b) => a.window.range.from - b.window.range.from);
  let furthest = -1;
  const reach = windows.map(({ window }) => (furthest = Math.max(furthest, window.range.to)));
  const byBank = new Map<number, PreparedWindow[]>();
  for (const window of windows) {
    for (const bank of new Set(window.banks)) {
      if (bank !== undefined) byBank.set(bank, [...(byBank.get(bank) ?? []), window]);
    }
  }
  return { index, windows, reach, byBank };
}

function placeIn(prepared: PreparedWindow, index: LayoutIndex, address: number): WordPlace | null {
  const { window, steps, removed, banks, carried } = prepared;
  const number = window.interleave.reduce((sum, bits, at) => sum + parityOfBits(address, bits) * 2 ** at, 0);
  const bank = banks[number];
  if (bank === undefined) return null;
  const offset = address - window.range.from;
  const word = window.firstWord + closeUp(Math.floor(offset / steps), removed);
  if (word >= index.document.memory.banks[bank]!.words) return null;
  return { bank, word: wordNumber(word), bits: carried[number]![offset % steps]!, register: window.register ?? null };
}

/** The windows that touch a span of addresses. */
function windowsAt({ windows, reach }: AddressMap, from: number, to: number): PreparedWindow[] {
  let low = 0;
  let high = windows.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if (windows[middle]!.window.range.from <= to) low = middle + 1;
    else high = middle;
  }
  const found: PreparedWindow[] = [];
  for (let at = low - 1; at >= 0 && reach[at]! >= from; at--) {
    if (windows[at]!.window.range.to >= from) found.push(windows[at]!);
  }
  return found.reverse();
}

/**
 * The words that a CPU address can mean: none outside every window, one as a rule, several where a page or bank
 * register decides and its value is not known.
 */
export function decodeAddress(map: AddressMap, address: number): WordPlace[] {
  return windowsAt(map, address, address).flatMap((window) => placeIn(window, map.index, address) ?? []);
}

/** A bank that a shortened address can mean. */
export interface SpanPlace extends Omit<WordPlace, 'word'> {
  /** Null where the span covers more than one word. */
  readonly word: WordNumber | null;
}

const mostSamples = 1024;

/** Addresses of a span that between them meet every bank and every byte lane there. */
function samples({ window, steps }: PreparedWindow, from: number, to: number): number[] {
  if (to - from < 64) return Array.from({ length: to - from + 1 }, (_, n) => from + n);
  const span = to - from + 1;
  const vary = [...new Set(window.interleave.flat())].filter((bit) => 2 ** bit < span);
  const combinations = Math.min(mostSamples, 2 ** vary.length);
  const found: number[] = [];
  for (let n = 0; n < combinations; n++) {
    const moved = vary.reduce((sum, bit, at) => sum + (Math.floor(n / 2 ** at) % 2) * 2 ** bit, from);
    for (let step = 0; step < steps; step++) if (moved + step <= to) found.push(moved + step);
  }
  return [...found, to];
}

/**
 * The banks that the addresses of a span lead to, both ends included, with the bits that they carry between them.
 * For codes that leave out the low bits of an address.
 */
export function decodeSpan(map: AddressMap, from: number, to: number): SpanPlace[] {
  if (from === to) return decodeAddress(map, from);
  return windowsAt(map, from, to).flatMap((prepared) => {
    const byBank = new Map<BankIndex, SpanPlace>();
    const { range } = prepared.window;
    for (const address of samples(prepared, Math.max(from, range.from), Math.min(to, range.to))) {
      const place = placeIn(prepared, map.index, address);
      if (place === null) continue;
      const before = byBank.get(place.bank);
      const bits =
        before === undefined ? place.bits : [...new Set([...before.bits, ...place.bits])].sort((a, b) => a - b);
      byBank.set(place.bank, {
        ...place,
        bits,
        word: before === undefined || before.word === place.word ? place.word : null,
      });
    }
    return [...byBank.values()];
  });
}

function addressIn(
  prepared: PreparedWindow,
  map: AddressMap,
  target: { bank: BankIndex; word: number; bit: number },
): number[] {
  const { window, steps, removed, banks, carried } = prepared;
  const number = banks.indexOf(target.bank);
  const closed = target.word - window.firstWord;
  if (number < 0 || closed < 0) return [];
  const step = carried[number]!.findIndex((bits) => bits.some((bit) => bit === target.bit));
  if (step < 0) return [];
  return openUp(closed, removed)
    .map((unit) => window.range.from + unit * steps + step)
    .filter((address) => {
      if (address > window.range.to) return false;
      const place = placeIn(prepared, map.index, address);
      return place?.bank === target.bank && place.word === target.word;
    });
}

/** The CPU addresses at which one bit of a word is read: none where no window shows it. */
export function encodeAddress(map: AddressMap, target: { bank: BankIndex; word: number; bit: number }): AddressOf[] {
  return (map.byBank.get(target.bank) ?? []).flatMap((prepared) =>
    addressIn(prepared, map, target).map((address) => ({
      address: cpuAddress(address),
      register: prepared.window.register ?? null,
    })),
  );
}
