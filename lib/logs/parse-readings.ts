import type { Evidence, PlainEvidence, Reading } from '@/shared';
import type { LayoutIndex } from '../layout/layout-index';
import { type AddressMap, addressMapOf } from '../place/address';
import { placeValue } from '../place/place-value';
import { ColumnReader } from './column-reader';
import { findLinePatterns } from './find-pattern';
import {
  type ColumnPattern,
  type FormatPattern,
  type LinePattern,
  isFormatPattern,
  patternWords,
} from './line-pattern';
import { openLogImport } from './log-import';
import { bytesOfText } from './numbers';
import { readLine } from './read-line';
import { cleanParity, goesOn, saysAllPassed, saysRestPassed } from './statements';

/** A line that could not be read, with its number from 1 and why. */
export interface UnreadLine {
  readonly line: number;
  readonly text: string;
  readonly reason: string;
}

export interface ParsedReadings {
  /** Readings; `either` where two patterns remain; null where no line was read. */
  readonly evidence: Evidence | null;
  /** Lines of the text that are not blank. */
  readonly lines: number;
  readonly unread: UnreadLine[];
  /** The pattern that most lines were read by; null where none fits. */
  readonly pattern: LinePattern | null;
  /** What was taken for granted, in words. */
  readonly notes: string[];
  /** The patterns that the text can have, the likeliest first. */
  readonly candidates: LinePattern[];
}

/** Most readings of one piece of evidence; the same figure as the limit that requests are held to. */
const mostReadings = 1024;
/** A pattern this much less likely than the best is not asked about. */
const rivalShare = 0.25;
const mostRivals = 4;

interface Line {
  readonly line: number;
  readonly text: string;
}

interface Parsed {
  readonly readings: { readonly line: number; readonly reading: Reading }[];
  readonly unread: UnreadLine[];
}

function readAll(map: AddressMap, lines: readonly Line[], pattern: ColumnPattern): Parsed {
  const using = { map, pattern, reader: new ColumnReader(pattern) };
  const parsed: Parsed = { readings: [], unread: [] };
  for (const { line, text } of lines) {
    const read = readLine(using, text);
    if (read === null) continue;
    if (read.ok) parsed.readings.push({ line, reading: read.reading });
    else parsed.unread.push({ line, text, reason: read.reason });
  }
  return parsed;
}

/** Patterns of columns that lines can have, the likeliest first. */
function columnPatterns(index: LayoutIndex, lines: readonly Line[]): ColumnPattern[] {
  const texts = lines.map(({ text }) => text);
  return findLinePatterns(index, texts).filter((pattern): pattern is ColumnPattern => !isFormatPattern(pattern));
}

/** Whether lines of another order can stand among those of a pattern: their words say so, and the numbers are alike. */
function standsBeside(other: ColumnPattern, pattern: ColumnPattern): boolean {
  if (other.unit !== pattern.unit || other.shows !== pattern.shows) return false;
  const { written, read, mask } = other;
  const labelled = typeof mask === 'string' || (typeof written === 'string' && typeof read === 'string');
  return labelled && other.notation === pattern.notation && other.values === pattern.values;
}

/** Lines of another order than most: each group of them by a pattern of its own, in the notation and unit of the first. */
function readOthers(map: AddressMap, parsed: Parsed, pattern: ColumnPattern): Parsed {
  let current = parsed;
  for (let round = 0; round < 4 && current.unread.length > 0; round++) {
    const like = columnPatterns(map.index, current.unread).find((other) => standsBeside(other, pattern));
    if (like === undefined) return current;
    const more = readAll(map, current.unread, like);
    if (more.readings.length === 0) return current;
    const kept = new Map(current.unread.map((line) => [line.line, line]));
    current = {
      readings: [...current.readings, ...more.readings].sort((a, b) => a.line - b.line),
      unread: more.unread.map((line) => kept.get(line.line) ?? line),
    };
  }
  return current;
}

/** Remarks among the lines that say something of the memory as a whole, or go on from the line before. */
function readRemarks(map: AddressMap, parsed: Parsed, pattern: ColumnPattern): Parsed {
  const readings = [...parsed.readings];
  const unread: UnreadLine[] = [];
  for (const each of parsed.unread) {
    const before = readings.filter(({ line }) => line < each.line).at(-1);
    const on = before === undefined ? null : goesOn(each.text, before.reading, pattern.notation);
    const parity = cleanParity(each.text);
    const clean = parity === null || pattern.unit === 'word' ? null : wholeSpan(map, parity);
    const reading = on ?? clean;
    if (reading !== null) readings.push({ line: each.line, reading });
    else if (!saysRestPassed(each.text)) unread.push(each);
  }
  return { readings: readings.sort((a, b) => a.line - b.line), unread };
}

/** Every other address of the memory, none of which failed. */
function wholeSpan({ windows }: AddressMap, parity: 0 | 1): Reading | null {
  if (windows.length === 0) return null;
  const from = Math.min(...windows.map(({ window }) => window.range.from));
  const to = Math.max(...windows.map(({ window }) => window.range.to));
  const address = from + ((from + parity) % 2);
  return { address, to, step: 2, mask: 0 };
}

interface Read {
  readonly pattern: ColumnPattern;
  readonly parsed: Parsed;
}

/** What the readings say of lanes, to see whether two patterns come to the same. */
function meaning(map: AddressMap, { pattern, parsed }: Read): string {
  return parsed.readings
    .map(({ reading }) => {
      const [place] = placeValue(map, reading.address, pattern);
      if (place === undefined) return '-';
      const bits = place.bits.map((bit, at) => {
        const of = (value: number | undefined) => (value === undefined ? '' : Math.floor(value / 2 ** at) % 2);
        return of(reading.mask) === 0 || (reading.mask === undefined && of(reading.written) === of(reading.read))
          ? ''
          : `${bit}${of(reading.read)}`;
      });
      return `${place.bank}/${bits.join(' ')}`;
    })
    .join('|');
}

function readingsEvidence(
  { pattern, parsed }: Read,
  { index, lines, rest }: { index: LayoutIndex; lines: readonly Line[]; rest: 'unknown' | 'passed' },
): PlainEvidence {
  if (parsed.readings.length > mostReadings) {
    const log = openLogImport(index, pattern, { name: 'Pasted lines', rest });
    for (const { text } of lines) log.push(bytesOfText(`${text}\n`));
    return log.finish();
  }
  return {
    kind: 'readings',
    lines: parsed.readings.map(({ reading }) => reading),
    unit: pattern.unit,
    shows: pattern.shows,
    rest,
  };
}

/** In what the way of reading differs: "the log is octal". */
function takesWords({ notation, values = notation, unit }: ColumnPattern): string {
  const numbers = values === notation ? `the log is ${notation}` : `addresses ${notation}, values ${values}`;
  return unit === 'word' ? `${numbers} and counts words` : numbers;
}

function distinctTakes(ways: readonly Read[]): string[] {
  const plain = ways.map(({ pattern }) => takesWords(pattern));
  if (new Set(plain).size === plain.length) return plain;
  return ways.map(({ pattern }) => patternWords(pattern).slice(0, 80).trim());
}

/** One way as it is; several that remain as `either`. */
function evidenceOf(ways: readonly Read[], of: Parameters<typeof readingsEvidence>[1]): Evidence | null {
  const held = ways.filter(({ parsed }) => parsed.readings.length > 0);
  if (held.length === 0) return null;
  if (held.length === 1) return readingsEvidence(held[0]!, of);
  const takes = distinctTakes(held);
  return {
    kind: 'either',
    ways: held.map((way, at) => ({ takes: takes[at]!, evidence: readingsEvidence(way, of) })),
  };
}

function linesOf(text: string): Line[] {
  return text
    .split(/\r\n|\n|\r/)
    .map((line, at) => ({ line: at + 1, text: line }))
    .filter(({ text: line }) => line.trim() !== '');
}

function readBy(
  map: AddressMap,
  lines: readonly Line[],
  { pattern, fixed }: { pattern: ColumnPattern; fixed: boolean },
): Read {
  const plain = readAll(map, lines, pattern);
  const all = fixed ? plain : readOthers(map, plain, pattern);
  return { pattern, parsed: readRemarks(map, all, pattern) };
}

/**
 * The evidence of a text under several patterns at once, for a technician who does not know which is true: `either`,
 * or plain readings where they come to the same. Null where no line can be read.
 */
export function eitherReadings(index: LayoutIndex, text: string, patterns: readonly ColumnPattern[]): Evidence | null {
  const map = addressMapOf(index);
  const lines = linesOf(text);
  const ways = patterns.map((pattern) => readBy(map, lines, { pattern, fixed: true }));
  const seen = new Set<string>();
  const distinct = ways.filter((way) => {
    const key = meaning(map, way);
    return !seen.has(key) && seen.add(key);
  });
  return evidenceOf(distinct.slice(0, 8), { index, lines, rest: saysRestPassed(text) ? 'passed' : 'unknown' });
}

function rivalsOf(
  map: AddressMap,
  lines: readonly Line[],
  { candidates, best }: { candidates: readonly ColumnPattern[]; best: Read },
): Read[] {
  const least = (candidates[0]!.score ?? 1) * rivalShare;
  const seen = new Set([meaning(map, best)]);
  const rivals: Read[] = [];
  for (const pattern of candidates.slice(1)) {
    if ((pattern.score ?? 0) < least || rivals.length >= mostRivals) break;
    const way = readBy(map, lines, { pattern, fixed: false });
    const key = meaning(map, way);
    if (way.parsed.readings.length * 2 < best.parsed.readings.length || seen.has(key)) continue;
    seen.add(key);
    rivals.push(way);
  }
  return rivals;
}

function notesOf(
  { pattern, parsed }: Read,
  { rivals, rest }: { rivals: readonly Read[]; rest: 'unknown' | 'passed' },
): string[] {
  const notes = [`Read as ${patternWords(pattern)}.`];
  if (rivals.length > 0) {
    const [, ...others] = distinctTakes([{ pattern, parsed }, ...rivals]);
    notes.push(`Open: ${others.join('; or ')}. All are kept until something settles it.`);
  }
  if (rest === 'passed') notes.push('The text says that the rest passed.');
  if (parsed.readings.length > mostReadings)
    notes.push(
      `${parsed.readings.length} readings are more than are kept one by one; they are drawn together as a log.`,
    );
  return notes;
}

/** Lines as a report format words them: drawn together as a log, which holds bits in any order. */
function readByFormat(index: LayoutIndex, lines: readonly Line[], pattern: FormatPattern): ParsedReadings {
  const log = openLogImport(index, pattern, { name: 'Pasted lines' });
  for (const { text } of lines) log.push(bytesOfText(`${text}\n`));
  const evidence = log.finish();
  const unread = log.summary().unreadLines.map(({ line, reason }) => ({ ...lines[line - 1]!, reason }));
  return {
    evidence: evidence.readings === 0 ? null : evidence,
    lines: lines.length,
    unread,
    pattern,
    notes: [`Read ${patternWords(pattern)}.`],
    candidates: [pattern],
  };
}

/**
 * Reads typed or pasted lines of a memory test: addresses with what was written and read, or with the failing bits,
 * in any usual order, in the notation of the board or the one that fits. Lines that cannot be read come back with
 * their numbers and reasons; an address that leads nowhere names the nearest window. Never throws.
 */
export function parseReadings(
  index: LayoutIndex,
  text: string,
  options: { readonly pattern?: LinePattern } = {},
): ParsedReadings {
  const lines = linesOf(text);
  if (options.pattern !== undefined && isFormatPattern(options.pattern))
    return readByFormat(index, lines, options.pattern);
  const map = addressMapOf(index);
  const candidates = options.pattern === undefined ? columnPatterns(index, lines) : [options.pattern];
  const pattern = candidates[0] ?? null;
  if (pattern === null) {
    const passed = lines.length > 0 && saysAllPassed(text);
    return {
      evidence: passed ? { kind: 'pass' } : null,
      lines: lines.length,
      unread: passed
        ? []
        : lines.map((line) => ({ ...line, reason: 'There is no address with a value in this line.' })),
      pattern: null,
      notes: passed ? ['The text says that everything passed.'] : [],
      candidates: [],
    };
  }
  const best = readBy(map, lines, { pattern, fixed: options.pattern !== undefined });
  const rest = saysRestPassed(text) ? 'passed' : 'unknown';
  const rivals = best.parsed.readings.length === 0 ? [] : rivalsOf(map, lines, { candidates, best });
  return {
    evidence: evidenceOf([best, ...rivals], { index, lines, rest }),
    lines: lines.length,
    unread: best.parsed.unread,
    pattern,
    notes: best.parsed.readings.length === 0 ? [] : notesOf(best, { rivals, rest }),
    candidates,
  };
}
