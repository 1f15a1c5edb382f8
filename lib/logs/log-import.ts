import type { LogEvidence } from '@/shared';
import type { LayoutIndex } from '../layout/layout-index';
import { bankWords } from '../layout/words';
import { type AddressMap, buildAddressMap } from '../place/address';
import { nearestWords } from '../place/nearest-window';
import { AddressFinder } from './address-finder';
import { FormatLines } from './format-lines';
import { LaneCounts } from './lane-counts';
import { LineFeed, longestLine } from './line-feed';
import { type LinePattern, isFormatPattern } from './line-pattern';
import { type LineReader, marks, outcomes, slots } from './line-reader';
import { type LogSummary, evidenceOf, summaryOf } from './log-evidence';
import { openLineReader } from './open-line-reader';
import { PairTable, pairKey } from './pair-table';
import type { UnreadLine } from './parse-readings';

/** How far an import is. */
export interface LogCounts {
  /** Bytes that were pushed. */
  readonly bytes: number;
  readonly lines: number;
  /** Lines that were read as a reading, those outside the board's memory among them. */
  readonly readings: number;
  /** Readings in which at least one bit was wrong. */
  readonly failing: number;
  readonly unread: number;
  readonly blank: number;
  readonly outside: number;
}

/** A log that is being read. Its memory depends on the board and not on the length of the log. */
export interface LogImport {
  /** Takes the next bytes of the log, cut anywhere. They are not kept. */
  readonly push: (bytes: Uint8Array) => void;
  readonly counts: () => LogCounts;
  /** Ends the log and draws it together. Nothing can be pushed afterwards. */
  readonly finish: () => LogEvidence;
  /** What the evidence has no room for. After `finish`. */
  readonly summary: () => LogSummary;
}

export interface LogOptions {
  /** What the log is called. */
  readonly name?: string;
  /** Whether the whole memory was tested, so that what is not in the log passed. */
  readonly rest?: 'unknown' | 'passed';
}

// Bundlers turn what is imported into look-ups in another module; this file is run for every line of a log.
const { read: isRead, blank: isBlank } = outcomes;
const { written: writtenMark, read: readMark } = marks;
const { written: writtenSlot, mask: maskSlot } = slots;
const longest = longestLine;

/** Lines that are listed with their number and reason. */
const mostListed = 100;
const mostCharacters = 120;
/** Addresses of one run that are followed one by one; of a longer run as many, spread evenly. */
const mostOfRun = 2 ** 22;

class Import implements LogImport {
  readonly unreadLines: UnreadLine[] = [];
  readonly outsideLines: UnreadLine[] = [];
  readonly lanes: LaneCounts;
  readonly map: AddressMap;
  private reader: LineReader | null;
  private readonly format: FormatLines | null;
  private readonly finder: AddressFinder;
  private readonly pairs: PairTable;
  private readonly feed: LineFeed;
  /** For each site the bits that a value must not have, three limbs each. */
  private readonly denied: Int32Array[] = [];
  private readonly scratch = new Int32Array(6);
  private readonly register: { name: string; value: number };
  private newline = 10;
  private done = false;
  private bytes = 0;
  private line = 0;
  private readings = 0;
  private failing = 0;
  private unread = 0;
  private blank = 0;
  private outside = 0;
  private open = 0;

  constructor(
    readonly index: LayoutIndex,
    private readonly pattern: LinePattern,
    private readonly options: LogOptions,
  ) {
    this.map = buildAddressMap(index);
    this.format = isFormatPattern(pattern) ? new FormatLines(this.map, pattern.format) : null;
    this.reader = isFormatPattern(pattern) ? null : openLineReader(pattern);
    this.finder = new AddressFinder(this.map, pattern);
    this.lanes = new LaneCounts(index);
    this.pairs = new PairTable((pair) => this.lanes.spread(pair, this.finder.sites[pair.site]!));
    this.register = { name: isFormatPattern(pattern) ? '' : (pattern.register?.name ?? ''), value: 0 };
    this.feed = new LineFeed({
      lines: (bytes, end) => this.takeLines(bytes, end),
      tooLong: () => {
        this.line++;
        this.refuse(new Uint8Array(0), `The line is longer than ${longestLine} characters.`);
      },
    });
  }

  push = (bytes: Uint8Array): void => {
    if (this.done) throw new RangeError('The log is finished; open a new one.');
    this.bytes += bytes.length;
    this.feed.push(bytes);
  };

  counts = (): LogCounts => {
    const { bytes, line, readings, failing, unread, blank, outside } = this;
    return { bytes, lines: line, readings, failing, unread, blank, outside };
  };

  finish = (): LogEvidence => {
    if (!this.done) {
      this.feed.finish();
      this.pairs.flush();
      this.done = true;
    }
    return evidenceOf(this.index, this.lanes, {
      counts: this.counts(),
      name: this.options.name ?? 'log',
      rest: this.options.rest ?? 'unknown',
    });
  };

  summary = (): LogSummary => {
    if (!this.done) throw new RangeError('The log is not finished.');
    const { unreadLines, outsideLines, open } = this;
    return summaryOf(this.index, this.lanes, { counts: this.counts(), unreadLines, outsideLines, open });
  };

  private takeLines(bytes: Uint8Array, end: number): void {
    if (this.newline !== this.feed.newline) {
      this.newline = this.feed.newline;
      this.reader = openLineReader(this.index, this.pattern, this.newline);
    }
    const { reader } = this;
    let at = 0;
    while (at < end) {
      const outcome = reader.line(bytes, at);
      const next = reader.next;
      this.line++;
      if (next - at > longest + 1)
        this.refuse(bytes.subarray(at, at + mostCharacters), `The line is longer than ${longestLine} characters.`);
      else if (outcome === isRead) this.takeReading(bytes, at, next);
      else if (outcome === isBlank) this.blank++;
      else this.refuse(bytes.subarray(at, next - 1), null);
      at = next;
    }
  }

  private takeReading(bytes: Uint8Array, at: number, next: number): void {
    const { reader } = this;
    const site = this.find(reader.address);
    if (site < 0 && reader.to < 0) return this.leadsNowhere(bytes.subarray(at, next - 1));
    const mask = this.valuesOf();
    const values = mask || (reader.has & readMark) === 0 ? this.scratch : reader.values;
    if (reader.to >= 0) return this.takeRun({ values, kind: mask ? 'mask' : 'pair' }, bytes.subarray(at, next - 1));
    if (!this.fits(site, values)) {
      this.refuse(bytes.subarray(at, next - 1), this.widthReason(site));
      return;
    }
    this.readings++;
    if (this.finder.open) this.open++;
    this.pairs.add(values, mask ? site * 2 + 1 : site * 2, 1);
    if (this.fails(site, values)) this.failing++;
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
    let any = false;
    for (let limb = 0; limb < 3; limb++) {
      let rest = values[limb]! ^ values[limb + 3]!;
      while (rest !== 0) {
        const bit = 31 - Math.clz32(rest & -rest);
        this.lanes.fails(base + bits[limb * 32 + bit]!, word, this.line);
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
        if (!placed) return this.refuse(text, this.widthReason(site));
        continue;
      }
      placed = true;
      this.pairs.add(values, pairKey(site, kind), Math.round(count / looked));
      if (this.fails(site, values)) failed = true;
    }
    if (!placed) return this.leadsNowhere(text);
    this.readings++;
    if (failed) this.failing++;
  }

  private leadsNowhere(text: Uint8Array): void {
    const { address } = this.reader;
    this.readings++;
    this.outside++;
    this.list(this.outsideLines, text, () => nearestWords(this.map, address, this.pattern.unit));
  }

  private widthReason(site: number): string {
    const { bank, bits } = this.finder.sites[site]!;
    const words = bankWords(this.index.document.memory.banks[bank]!.id);
    return `A value does not fit: ${words} shows ${bits.length} bits at an address.`;
  }

  private refuse(text: Uint8Array, reason: string | null): void {
    this.unread++;
    this.list(this.unreadLines, text, () => reason ?? this.reader.reason());
  }

  private list(lines: UnreadLine[], bytes: Uint8Array, reason: () => string): void {
    if (lines.length >= mostListed) return;
    lines.push({ line: this.line, text: shownText(bytes), reason: reason() });
  }
}

/** The beginning of a line as text; what is not printable ASCII becomes a dot. */
function shownText(bytes: Uint8Array): string {
  const shown = bytes.subarray(0, mostCharacters);
  const text = Array.from(shown, (byte) =>
    byte === 9 ? ' ' : byte >= 32 && byte < 127 ? String.fromCharCode(byte) : '.',
  );
  return `${text.join('').trimEnd()}${bytes.length > mostCharacters ? ' ...' : ''}`;
}

/**
 * Opens a log of any length to be read line by line by a pattern. Lines that cannot be read are counted and the first
 * 100 of them listed; nothing in a log makes it throw. Throws RangeError for a report format that the layout has not.
 */
export function openLogImport(index: LayoutIndex, pattern: LinePattern, options: LogOptions = {}): LogImport {
  return new Import(index, pattern, options);
}
