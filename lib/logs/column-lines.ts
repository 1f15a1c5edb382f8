import type { LayoutIndex } from '../layout/layout-index';
import { bankWords } from '../layout/words';
import { type AddressMap, addressMapOf } from '../place/address';
import { nearestWords } from '../place/nearest-window';
import { AddressFinder } from './address-finder';
import { longestLine, tooLongWords } from './line-feed';
import type { ColumnPattern } from './line-pattern';
import { marks, outcomes, slots } from './line-reader';
import type { LineTaker } from './line-taker';
import type { LogBook } from './log-book';
import { MouldedReader } from './moulded-reader';
import { PairTable, pairKey } from './pair-table';

// Bundlers turn what is imported into look-ups in another module; this file is run for every line of a log.
const { read: isRead, blank: isBlank } = outcomes;
const { written: writtenMark, read: readMark } = marks;
const { written: writtenSlot, mask: maskSlot } = slots;
const longest = longestLine;

/** Addresses of one run that are followed one by one; of a longer run as many, spread evenly. */
const mostOfRun = 2 ** 22;

/** Takes lines by their columns, from the bytes, without making anything for a line. */
export class ColumnLines implements LineTaker {
  private reader: MouldedReader;
  private newline = 10;
  private readonly map: AddressMap;
  private readonly finder: AddressFinder;
  private readonly pairs: PairTable;
  /** For each site the bits that a value must not have, three limbs each. */
  private readonly denied: Int32Array[] = [];
  private readonly scratch = new Int32Array(6);
  private readonly register: { name: string; value: number };

  constructor(
    private readonly index: LayoutIndex,
    private readonly pattern: ColumnPattern,
    private readonly book: LogBook,
  ) {
    this.map = addressMapOf(index);
    this.reader = new MouldedReader(pattern);
    this.finder = new AddressFinder(this.map, pattern);
    this.pairs = new PairTable((pair) => book.lanes.spread(pair, this.finder.sites[pair.site]!));
    this.register = { name: pattern.register?.name ?? '', value: 0 };
  }

  finish = (): void => this.pairs.flush();

  lines = (bytes: Uint8Array, end: number, newline: number): void => {
    if (this.newline !== newline) {
      this.newline = newline;
      this.reader = new MouldedReader(this.pattern, newline);
    }
    const { reader, book } = this;
    let at = 0;
    while (at < end) {
      const outcome = reader.line(bytes, at);
      const next = reader.next;
      book.line++;
      if (next - at > longest + 1) book.refuse(bytes.subarray(at, next - 1), tooLongWords);
      else if (outcome === isRead) this.takeReading(bytes, at, next);
      else if (outcome === isBlank) book.blank++;
      else this.refuse(bytes.subarray(at, next - 1));
      at = next;
    }
  };

  private takeReading(bytes: Uint8Array, at: number, next: number): void {
    const { reader } = this;
    const site = this.find(reader.address);
    if (site < 0 && reader.to < 0) return this.leadsNowhere(bytes.subarray(at, next - 1));
    const mask = this.valuesOf();
    const values = mask || (reader.has & readMark) === 0 ? this.scratch : reader.values;
    if (reader.to >= 0) return this.takeRun({ values, kind: mask ? 'mask' : 'pair' }, bytes.subarray(at, next - 1));
    if (!this.fits(site, values)) {
      this.book.refuse(bytes.subarray(at, next - 1), () => this.widthReason(site));
      return;
    }
    this.book.readings++;
    if (this.finder.open) this.book.open++;
    this.pairs.add(values, mask ? site * 2 + 1 : site * 2, 1);
    if (this.fails(site, values)) this.book.failing++;
  }

  private find(address: number): number {
    const { register } = this.reader;
    if (register < 0) return this.finder.find(address, null);
    this.register.value = register;
    return this.finder.find(address, this.register);
  }

  /** Prepares the values where the line has a mask in place of what was read. True: what was written is not known. */
  private valuesOf(): boolean {
    const { has, values } = this.reader;
    const written = (has & writtenMark) !== 0;
    if (written && (has & readMark) !== 0) return false;
    for (let n = 0; n < 3; n++) {
      const wrote = written ? values[writtenSlot + n]! : 0;
      this.scratch[n] = wrote;
      this.scratch[n + 3] = wrote ^ values[maskSlot + n]!;
    }
    return !written;
  }

  private fits(site: number, values: Int32Array): boolean {
    let denied = this.denied[site];
    if (denied === undefined) {
      denied = new Int32Array(3).fill(-1);
      const { bits } = this.finder.sites[site]!;
      for (let n = 0; n < bits.length; n++) denied[n >> 5]! ^= 1 << (n & 31);
      this.denied[site] = denied;
    }
    if (((values[0]! | values[3]!) & denied[0]!) !== 0) return false;
    return (((values[1]! | values[4]!) & denied[1]!) | ((values[2]! | values[5]!) & denied[2]!)) === 0;
  }

  /** Notes the failing bits of the word found last. False where the word was right. */
  private fails(site: number, values: Int32Array): boolean {
    const { bank, bits } = this.finder.sites[site]!;
    const base = bank * this.index.bitCount;
    const { word } = this.finder;
    const { lanes, line } = this.book;
    let any = false;
    for (let limb = 0; limb < 3; limb++) {
      let rest = values[limb]! ^ values[limb + 3]!;
      while (rest !== 0) {
        const bit = 31 - Math.clz32(rest & -rest);
        lanes.fails(base + bits[limb * 32 + bit]!, word, line);
        rest &= rest - 1;
        any = true;
      }
    }
    return any;
  }

  /** A line that stands for a run of addresses: each of them is a reading of the same values. */
  private takeRun({ values, kind }: { values: Int32Array; kind: 'pair' | 'mask' }, text: Uint8Array): void {
    const { address, to, step } = this.reader;
    const count = Math.floor((to - address) / step) + 1;
    const looked = Math.min(count, mostOfRun);
    let [placed, failed] = [false, false];
    for (let n = 0; n < looked; n++) {
      const nth = looked === count ? n : Math.floor((n * (count - 1)) / (looked - 1));
      const site = this.find(address + nth * step);
      if (site < 0) continue;
      if (!this.fits(site, values)) {
        if (!placed) return this.book.refuse(text, () => this.widthReason(site));
        continue;
      }
      placed = true;
      this.pairs.add(values, pairKey(site, kind), Math.round(count / looked));
      if (this.fails(site, values)) failed = true;
    }
    if (!placed) return this.leadsNowhere(text);
    this.book.readings++;
    if (failed) this.book.failing++;
  }

  private leadsNowhere(text: Uint8Array): void {
    const { address } = this.reader;
    this.book.leadsNowhere(text, () => nearestWords(this.map, address, this.pattern.unit));
  }

  private refuse(text: Uint8Array): void {
    this.book.refuse(text, () => this.reader.reason());
  }

  private widthReason(site: number): string {
    const { bank, bits } = this.finder.sites[site]!;
    const words = bankWords(this.index.document.memory.banks[bank]!.id);
    return `A value does not fit: ${words} shows ${bits.length} bits at an address.`;
  }
}
