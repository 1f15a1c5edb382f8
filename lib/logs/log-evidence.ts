import type { LaneTally, LogEvidence } from '@/shared';
import type { BankIndex, Lane } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import type { LineCount } from './chip-places';
import type { LaneCounts } from './lane-counts';
import type { LogCounts } from './log-book';
import type { UnreadLine } from './parse-readings';

/** What a log showed of one lane, for a person. */
export interface LaneSummary {
  readonly lane: Lane;
  readonly bank: BankIndex;
  readonly bit: number;
  readonly readsOne: number;
  readonly readsZero: number;
  /** Different failing words; a lower bound where `atLeast` says so. */
  readonly words: number;
  readonly atLeast: boolean;
  /** Different rows and columns inside the chip; 0 where the layout does not say what a row is. */
  readonly rows: number;
  readonly columns: number;
  /** The rows and columns with the most failing words, the most first. */
  readonly worstRows: readonly LineCount[];
  readonly worstColumns: readonly LineCount[];
  /** Lines of the log, from 1. */
  readonly first: number;
  readonly last: number;
}

/** What an imported log showed, for a person. */
export interface LogSummary {
  readonly counts: LogCounts;
  /** Every lane that failed, those with the most failing words first. */
  readonly lanes: readonly LaneSummary[];
  /** The first lines that could not be read, and the first whose address leads nowhere. */
  readonly unreadLines: readonly UnreadLine[];
  readonly outsideLines: readonly UnreadLine[];
  /** What a reader must know to take the figures rightly, in words. */
  readonly notes: readonly string[];
}

/** The same figures as the limits that requests are held to. */
const mostLanes = 1024;
const mostValues = 256;
const mostName = 120;
const mostTally = 2 ** 40 - 1;
const mostWorst = 8;

const capped = (count: number) => Math.min(mostTally, Math.round(count));

/** Lanes that failed, those with the most failing words first. */
function failedLanes(index: LayoutIndex, lanes: LaneCounts): Lane[] {
  const failed = Array.from(index.lanes).filter((lane) => lanes.sets[lane] !== null) as Lane[];
  return failed.sort((a, b) => lanes.sets[b]!.count - lanes.sets[a]!.count || a - b);
}

function tallyOf(index: LayoutIndex, lanes: LaneCounts, lane: Lane): LaneTally {
  const places = lanes.placesOf(lane);
  const { rows, columns } = places;
  return {
    bank: index.document.memory.banks[index.bankOf(lane)]!.id,
    bit: index.bitOf(lane),
    readsOne: capped(lanes.readsOne[lane]!),
    readsZero: capped(lanes.readsZero[lane]!),
    alone: capped(lanes.alone[lane]!),
    words: lanes.sets[lane]!.count,
    rows: rows.length,
    columns: columns.length,
    ...(rows.length === 1 ? { row: rows[0]!.number } : {}),
    ...(columns.length === 1 ? { column: columns[0]!.number } : {}),
    ones: places.ones,
    zeros: places.zeros,
    first: lanes.first[lane]!,
    last: lanes.last[lane]!,
  };
}

/** The evidence of an imported log. */
export function evidenceOf(
  index: LayoutIndex,
  lanes: LaneCounts,
  about: { readonly counts: LogCounts; readonly name: string; readonly rest: 'unknown' | 'passed' },
): LogEvidence {
  const { counts, rest } = about;
  const bankName = (bank: number) => index.document.memory.banks[bank]!.id;
  const seenRight = Array.from(index.lanes).filter(
    (lane) => lanes.rightOnes[lane]! + lanes.rightZeros[lane]! > 0,
  ) as Lane[];
  return {
    kind: 'log',
    name:
      about.name
        .replace(/[\u0000-\u001f\u007f]/g, ' ')
        .trim()
        .slice(0, mostName)
        .trim() || 'log',
    lines: capped(counts.lines),
    readings: capped(counts.readings),
    unread: capped(counts.unread),
    outside: capped(counts.outside),
    rest,
    values: lanes.commonest(mostValues).map(({ bank, written, read, count }) => ({
      bank: bankName(bank),
      written,
      read,
      count: capped(count),
    })),
    lanes: failedLanes(index, lanes)
      .slice(0, mostLanes)
      .map((lane) => tallyOf(index, lanes, lane)),
    right: seenRight.slice(0, mostLanes).map((lane) => ({
      bank: bankName(index.bankOf(lane)),
      bit: index.bitOf(lane),
      zeros: capped(lanes.rightZeros[lane]!),
      ones: capped(lanes.rightOnes[lane]!),
    })),
  };
}

function worst(lines: readonly LineCount[]): LineCount[] {
  return [...lines].sort((a, b) => b.words - a.words || a.number - b.number).slice(0, mostWorst);
}

function laneSummary(index: LayoutIndex, lanes: LaneCounts, lane: Lane): LaneSummary {
  const places = lanes.placesOf(lane);
  const { rows, columns } = places;
  const set = lanes.sets[lane]!;
  return {
    lane,
    bank: index.bankOf(lane),
    bit: index.bitOf(lane),
    readsOne: lanes.readsOne[lane]!,
    readsZero: lanes.readsZero[lane]!,
    words: set.count,
    atLeast: !set.exact,
    rows: rows.length,
    columns: columns.length,
    worstRows: worst(rows),
    worstColumns: worst(columns),
    first: lanes.first[lane]!,
    last: lanes.last[lane]!,
  };
}

/** The summary of an imported log. */
export function summaryOf(
  index: LayoutIndex,
  lanes: LaneCounts,
  about: Pick<LogSummary, 'counts' | 'unreadLines' | 'outsideLines'> & { readonly open: number },
): LogSummary {
  const { counts, unreadLines, outsideLines, open } = about;
  const failed = failedLanes(index, lanes);
  const notes: string[] = [];
  if (open > 0)
    notes.push(
      `${open} readings can lie in several pages, and the log does not say in which; they are taken for the first.`,
    );
  if (failed.some((lane) => !lanes.sets[lane]!.exact))
    notes.push('The memory is so large that different failing words are counted as "at least".');
  if (failed.length > mostLanes)
    notes.push(`Of ${failed.length} failing lanes the answer uses the ${mostLanes} worst.`);
  if (lanes.valuesForgotten) notes.push('There are so many pairs of written and read that rare ones were left out.');
  return { counts, lanes: failed.map((lane) => laneSummary(index, lanes, lane)), unreadLines, outsideLines, notes };
}
