import type { BankIndex, BitIndex } from '../brand';
import type { AddressMap } from '../place/address';
import { type ReadingForm, type ValuePlace, placeValue } from '../place/place-value';

/** A bank together with the bits that the values of an address show: what all addresses of one kind share. */
export interface Site {
  readonly bank: BankIndex;
  /** The data bit of each bit of a value, lowest first. */
  readonly bits: readonly BitIndex[];
}

interface Register {
  readonly name: string;
  readonly value: number;
}

/** A window whose places are worked out in 32 bits. */
interface QuickWindow {
  readonly from: number;
  readonly to: number;
  /** Binary logarithm of the addresses of a word. */
  readonly shift: number;
  readonly firstWord: number;
  /** Masks of the address bits whose exclusive-or is each bit of the bank number. */
  readonly masks: Int32Array;
  /** Bits that the bank number takes out of the word number, ascending. */
  readonly removed: Int32Array;
  /** Words of each bank of the window. */
  readonly words: Float64Array;
  /** Site of each bank and step; -1 where not met yet. */
  readonly sites: Int32Array;
}

const quickLimit = 2 ** 31;

function parity(bits: number): number {
  let x = bits ^ (bits >>> 16);
  x ^= x >>> 8;
  x ^= x >>> 4;
  return (0x6996 >>> (x & 15)) & 1;
}

function maskOf(bits: readonly number[]): number {
  return bits.reduce((mask, bit) => mask | (1 << bit), 0);
}

/**
 * Follows the addresses of a log, one after the other, to their words. Keeps the window of the last address, where
 * the next one lies as a rule.
 */
export class AddressFinder {
  readonly sites: Site[] = [];
  /** Word of the bank that the last address led to. */
  word = 0;
  /** Whether the last address could mean words of several pages and no register told which. */
  open = false;
  private readonly quick: readonly (QuickWindow | null)[];
  private readonly scale: number;
  private readonly siteByKey = new Map<BankIndex, { bits: readonly BitIndex[]; site: number }[]>();
  private last: QuickWindow | null = null;

  constructor(
    private readonly map: AddressMap,
    private readonly form: ReadingForm,
  ) {
    const steps = new Set(map.windows.map((window) => window.steps));
    // Words are counted through all windows alike only where these have the same number of addresses to a word.
    this.scale = form.unit === 'word' ? (steps.size === 1 ? [...steps][0]! : 0) : 1;
    this.quick = map.windows.map((_, at) => (this.scale === 0 ? null : this.prepare(at)));
  }

  /** The site of an address, and its word in `word`; -1 where the address leads nowhere. */
  find(address: number, register: Register | null): number {
    this.open = false;
    const scaled = address * this.scale;
    const last = this.last;
    if (last !== null && scaled >= last.from && scaled <= last.to) return this.findIn(last, scaled);
    for (const window of this.quick) {
      if (window === null || scaled < window.from || scaled > window.to) continue;
      this.last = window;
      return this.findIn(window, scaled);
    }
    return this.findSlowly(address, register);
  }

  private prepare(at: number): QuickWindow | null {
    const { windows } = this.map;
    const prepared = windows[at]!;
    const { window, steps, removed, banks } = prepared;
    const { from, to } = window.range;
    const overlaps = windows.some(
      (other, n) => n !== at && other.window.range.from <= to && other.window.range.to >= from,
    );
    const shift = Math.log2(steps);
    const { memory } = this.map.index.document;
    if (overlaps || to >= quickLimit || !Number.isInteger(shift) || window.register !== undefined) return null;
    if (window.firstWord + to - from >= quickLimit) return null;
    const words = banks.map((bank) => (bank === undefined ? 0 : memory.banks[bank]!.words));
    return {
      from,
      to,
      shift,
      firstWord: window.firstWord,
      // Address bits from 31 up are 0 in such a window.
      masks: Int32Array.from(window.interleave, (bits) => maskOf(bits.filter((bit) => bit < 31))),
      removed: Int32Array.from(removed),
      words: Float64Array.from({ length: 2 ** window.interleave.length }, (_, n) => words[n] ?? 0),
      sites: new Int32Array(2 ** window.interleave.length * steps).fill(-1),
    };
  }

  private findIn(window: QuickWindow, address: number): number {
    const { masks, removed, shift, sites } = window;
    let number = 0;
    for (let n = 0; n < masks.length; n++) number |= parity(address & masks[n]!) << n;
    const offset = (address - window.from) | 0;
    let word = offset >> shift;
    for (let n = removed.length - 1; n >= 0; n--) {
      const bit = removed[n]!;
      word = bit > 29 ? word & 0x3fffffff : ((word >> (bit + 1)) << bit) | (word & ((1 << bit) - 1));
    }
    word += window.firstWord;
    if (word >= window.words[number]!) return -1;
    this.word = word;
    const step = offset & ((1 << shift) - 1);
    const known = sites[(number << shift) | step]!;
    if (known >= 0) return known;
    const [place] = placeValue(this.map, this.form.unit === 'word' ? address >> shift : address, this.form);
    if (place === undefined) return -1;
    return (sites[(number << shift) | step] = this.siteOf(place));
  }

  private findSlowly(address: number, register: Register | null): number {
    const places = placeValue(this.map, address, this.form);
    const fitting = places.filter(
      (place) =>
        register === null ||
        place.register === null ||
        (place.register.name === register.name && place.register.value === register.value),
    );
    const [place] = fitting;
    if (place === undefined) return -1;
    this.open = fitting.length > 1;
    this.word = place.word;
    return this.siteOf(place);
  }

  private siteOf({ bank, bits }: ValuePlace): number {
    let ofBank = this.siteByKey.get(bank);
    if (ofBank === undefined) this.siteByKey.set(bank, (ofBank = []));
    const known = ofBank.find((each) => each.bits === bits || each.bits.join() === bits.join());
    if (known !== undefined) return known.site;
    const site = this.sites.push({ bank, bits }) - 1;
    ofBank.push({ bits, site });
    return site;
  }
}
