import type { AddressMap } from '../place/address';
import { placeValue } from '../place/place-value';
import { ColumnReader } from './column-reader';
import type { FormatHint } from './format-hints';
import type { ColumnPattern, LogNotation } from './line-pattern';
import { type LineReader, marks, outcomes, slots } from './line-reader';
import type { LineShape } from './line-shapes';
import { wordsOfLine } from './line-words';
import { bytesOfText, numberOfLimbs } from './numbers';

const bitsPerDigit = { hexadecimal: 4, octal: 3, decimal: Math.log2(10), binary: 1 } as const;

/** How much a fact about the sample makes a pattern less likely. Estimates; common practice, no source. */
const weights = {
  /** Another notation than the layout states for its addresses. */
  otherNotation: 0.15,
  /** Decimal numbers on a machine that counts otherwise. */
  decimal: 0.04,
  /** For each digit that an address or a value has more or less than the notation needs on this board. */
  otherDigits: 0.4,
  /** No word tells which value was written, and it stands after the value read. */
  readFirst: 0.2,
  /** Values in another notation than the addresses. */
  mixed: 0.1,
  /** Addresses that count words on a machine whose addresses count bytes. */
  wordUnit: 0.4,
  /** Two numbers only, of which the second is taken for the failing bits. */
  maskOnly: 0.3,
  /** For each number of the line that stands before the one taken for the address. */
  passedOver: 0.4,
  /** A further column that is the exclusive-or of the two values in every line. */
  exclusiveOr: 4,
  /** A report format of the board words all the lines and says the same of their numbers. */
  ownFormat: 40,
} as const;

/** What a sample of lines showed under one pattern. */
export interface Sample {
  readonly lines: number;
  readonly read: number;
  readonly placed: number;
  readonly fits: number;
  readonly differ: number;
  readonly addresses: ReadonlySet<number>;
  readonly writtens: ReadonlySet<string>;
  readonly reads: ReadonlySet<string>;
  readonly wholeSteps: number;
  /** Lines in which the mask is the exclusive-or of what was written and read. */
  readonly agrees: number;
  /** All that was read, to know patterns that read the same. */
  readonly content: string;
  /** The most bits that a value has at the addresses of the sample. */
  readonly bits: number;
}

/** Lines of a log, ready to be tried with one pattern after the other. */
export interface PatternTrial {
  readonly map: AddressMap;
  readonly hints: readonly FormatHint[];
  readonly lines: readonly Uint8Array[];
  /** The words of each line. */
  readonly words: readonly (readonly string[])[];
}

/** Makes lines ready to be tried. */
export function openTrial(map: AddressMap, texts: readonly string[], hints: readonly FormatHint[]): PatternTrial {
  return {
    map,
    hints,
    lines: texts.map((text) => bytesOfText(`${text}\n`)),
    words: texts.map((text) => wordsOfLine(text).map((word) => word.text)),
  };
}

function topBit(values: Int32Array, slot: number): number {
  for (let limb = 2; limb >= 0; limb--) {
    const part = values[slot + limb]!;
    if (part !== 0) return limb * 32 + 32 - Math.clz32(part);
  }
  return 0;
}

function exclusiveOr(values: Int32Array): boolean {
  for (let limb = 0; limb < 3; limb++) {
    const difference = values[slots.written + limb]! ^ values[slots.read + limb]!;
    if (difference !== values[slots.mask + limb]!) return false;
  }
  return true;
}

const textOf = (values: Int32Array, slot: number) => values.subarray(slot, slot + 3).join();

function sampleOf({ map, lines }: PatternTrial, pattern: ColumnPattern, reader: LineReader): Sample {
  let [read, placed, fits, differ, wholeSteps, bits] = [0, 0, 0, 0, 0, 0];
  const addresses = new Set<number>();
  const writtens = new Set<string>();
  const reads = new Set<string>();
  const steps = Math.max(1, ...map.windows.map((window) => window.steps));
  let agrees = 0;
  let content = `${pattern.unit} ${pattern.shows}`;
  for (const bytes of lines) {
    if (reader.line(bytes, 0) !== outcomes.read) continue;
    read++;
    addresses.add(reader.address);
    const pair = (reader.has & marks.read) !== 0 && (reader.has & marks.written) !== 0;
    content += `|${reader.address} ${reader.to} ${pair} ${reader.values.subarray(pair ? 0 : 6, pair ? 6 : 9).join()}`;
    if (exclusiveOr(reader.values)) agrees++;
    if (reader.address % steps === 0) wholeSteps++;
    const { values } = reader;
    if (pair) {
      writtens.add(textOf(values, slots.written));
      reads.add(textOf(values, slots.read));
      if (textOf(values, slots.written) !== textOf(values, slots.read)) differ++;
    } else if (numberOfLimbs(values, slots.mask) !== 0) differ++;
    const [place] = placeValue(map, reader.address, pattern);
    if (place === undefined) continue;
    placed++;
    bits = Math.max(bits, place.bits.length);
    const top = pair ? Math.max(topBit(values, slots.written), topBit(values, slots.read)) : topBit(values, slots.mask);
    if (top <= place.bits.length) fits++;
  }
  return {
    lines: lines.length,
    read,
    placed,
    fits,
    differ,
    addresses,
    writtens,
    reads,
    wholeSteps,
    agrees,
    content,
    bits,
  };
}

/** Words of the sample at the places of a field, to see how many digits they have. */
interface Digits {
  readonly address: readonly string[];
  readonly values: readonly string[];
}

function plainDigits(word: string): string {
  return word.replace(/^0x/i, '').replace(/[hqo]$/i, '');
}

function digitsOf(lines: PatternTrial['words'], pattern: ColumnPattern): Digits {
  const address: string[] = [];
  const values: string[] = [];
  const take = (words: readonly string[], column: number | string | undefined): string | undefined => {
    if (column === undefined) return undefined;
    if (typeof column === 'number') return words[column - 1];
    const at = words.findIndex((word) => word.toUpperCase() === column.toUpperCase());
    return at < 0 ? undefined : words.slice(at + 1).find((word) => /^(0x)?[0-9a-f]+[hqo]?$/i.test(word));
  };
  for (const words of lines) {
    const found = take(words, pattern.address);
    if (found !== undefined) address.push(plainDigits(found));
    for (const column of [pattern.written, pattern.read, pattern.mask]) {
      const value = take(words, column);
      if (value !== undefined) values.push(plainDigits(value));
    }
  }
  return { address, values };
}

/** How many digits the greatest number has in a notation. */
function widthOf(greatest: number, notation: LogNotation | 'binary'): number {
  if (notation === 'decimal') return String(greatest).length;
  return Math.max(1, Math.ceil(Math.log2(greatest + 1) / bitsPerDigit[notation]));
}

/**
 * How near the numbers come to the digits that the greatest needs, from 0 to 1: most machines write leading zeros.
 * Decimal numbers may be shorter.
 */
function digitsNear(words: readonly string[], most: number, notation: LogNotation | 'binary'): number {
  if (words.length === 0) return 1;
  const near = words.map((word) => {
    const lacking = most - word.length;
    if (notation === 'decimal' && lacking >= 0 && (word[0] !== '0' || word === '0')) return 1;
    return Math.max(0.05, weights.otherDigits ** Math.abs(lacking));
  });
  return near.reduce((sum, each) => sum + each, 0) / near.length;
}

/** How likely it is that numbers of a notation never have an 8 or a digit above it; the less, the more digits change. */
function neverAboveSeven(words: readonly string[], notation: LogNotation): number {
  if (notation === 'octal' || words.some((word) => /[89a-f]/i.test(word))) return 1;
  const width = Math.max(0, ...words.map((word) => word.length));
  let chances = 0;
  for (let place = 1; place <= width; place++) {
    chances += new Set(words.map((word) => word.at(-place) ?? '0')).size - 1;
  }
  return (notation === 'decimal' ? 0.8 : 0.5) ** Math.min(12, chances);
}

function ratio(part: number, whole: number): number {
  return whole === 0 ? 1 : part / whole;
}

/** How well a pattern fits the lines: 0 where it reads none; comparable between patterns of the same lines only. */
export function scoreOf(
  trial: PatternTrial,
  { shape, pattern }: { shape: LineShape; pattern: ColumnPattern },
): { readonly score: number; readonly sample: Sample } {
  const sample = sampleOf(trial, pattern, new ColumnReader(pattern));
  if (sample.read === 0) return { score: 0, sample };
  const { document } = trial.map.index;
  const { windows, notation } = document.addressMap;
  const values = pattern.values ?? pattern.notation;
  const { read, lines, addresses, writtens, reads } = sample;
  const digits = digitsOf(trial.words, pattern);
  const top = Math.max(0, ...windows.map(({ range }) => range.to));
  let score = ratio(read, lines) * (0.2 + 0.8 * ratio(sample.differ, read));
  if (windows.length > 0) score *= 0.001 + 0.999 * ratio(sample.placed, read) ** 3;
  if (sample.placed > 0) score *= 0.001 + 0.999 * ratio(sample.fits, sample.placed) ** 3;
  if (pattern.notation !== notation) score *= pattern.notation === 'decimal' ? weights.decimal : weights.otherNotation;
  if (values !== pattern.notation) score *= weights.mixed;
  score *= weights.passedOver ** shape.passedOver;
  if (pattern.mask !== undefined && pattern.written !== undefined)
    score *= sample.agrees === read ? weights.exclusiveOr : 0;
  if (shape.told === 'other order') score *= weights.readFirst;
  if (pattern.written === undefined) score *= weights.maskOnly;
  if (top > 0) {
    const most = Math.max(
      widthOf(top, pattern.notation),
      pattern.notation === notation ? (document.addressMap.digits ?? 0) : 0,
    );
    score *= digitsNear(digits.address, most, pattern.notation);
  }
  if (sample.bits > 0) score *= digitsNear(digits.values, widthOf(2 ** sample.bits - 1, values), values);
  score *= neverAboveSeven(digits.address, pattern.notation);
  if (read > 2 && shape.told !== 'words') {
    score *= 0.2 + 0.8 * ratio(addresses.size, read);
    if (writtens.size > reads.size) score *= 0.6;
  }
  const hint = hintFor(trial.hints, pattern);
  if (hint !== undefined) score *= 1 + weights.ownFormat * hint.share;
  return { score: score * unitWeight(trial.map, pattern, sample), sample };
}

/** The report format of the board that says the same of the numbers. */
export function hintFor(hints: readonly FormatHint[], pattern: ColumnPattern): FormatHint | undefined {
  return hints.find(
    ({ numbers }) =>
      numbers !== null &&
      numbers.notation === pattern.notation &&
      numbers.values === pattern.values &&
      numbers.unit === pattern.unit &&
      numbers.shows === pattern.shows,
  );
}

/** Whether the addresses count words: then they need not be multiples of the addresses of a word. */
function unitWeight(map: AddressMap, pattern: ColumnPattern, sample: Sample): number {
  const steps = Math.max(1, ...map.windows.map((window) => window.steps));
  if (steps === 1 || pattern.shows === 'address') return 1;
  if (pattern.unit === 'word')
    return weights.wordUnit * steps ** -Math.min(6, sample.wholeSteps === sample.read ? sample.addresses.size : 0);
  return sample.wholeSteps === sample.read ? 1 : 0.05;
}

/** Bare numbers are only taken for a reading where they look like one: an address of some digits in every line. */
export function isPlausible({ words }: PatternTrial, { told, columns: { address } }: LineShape): boolean {
  if (told === 'words' || told === 'heading' || typeof address === 'string') return true;
  const found = words.flatMap((line) => line[address - 1] ?? []);
  return found.length > 0 && found.every((word) => plainDigits(word).length >= 3);
}
