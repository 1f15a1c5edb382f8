import type { LogEvidence } from '@/shared';
import type { LayoutIndex } from '../layout/layout-index';
import { LaneCounts } from './lane-counts';
import { type LogSummary, evidenceOf, summaryOf } from './log-evidence';
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

export interface LogOptions {
  /** What the log is called. */
  readonly name?: string;
  /** Whether the whole memory was tested, so that what is not in the log passed. */
  readonly rest?: 'unknown' | 'passed';
}

/** Lines that are listed with their number and reason, and how much of each is shown. */
const mostListed = 100;
const mostCharacters = 120;

/** The beginning of a line as text; what is not printable ASCII becomes a dot. */
function shownText(bytes: Uint8Array): string {
  const shown = bytes.subarray(0, mostCharacters);
  const text = Array.from(shown, (byte) =>
    byte === 9 || byte === 13 ? ' ' : byte >= 32 && byte < 127 ? String.fromCharCode(byte) : '.',
  );
  return `${text.join('').trimEnd()}${bytes.length > mostCharacters ? ' ...' : ''}`;
}

/** What is kept of a log while it is read, however its lines are understood. */
export class LogBook {
  bytes = 0;
  /** Number of the line in hand, from 1. */
  line = 0;
  readings = 0;
  failing = 0;
  blank = 0;
  /** Readings that could lie in several pages. */
  open = 0;
  readonly lanes: LaneCounts;
  private unread = 0;
  private outside = 0;
  private readonly unreadLines: UnreadLine[] = [];
  private readonly outsideLines: UnreadLine[] = [];

  constructor(
    private readonly index: LayoutIndex,
    private readonly options: LogOptions,
  ) {
    this.lanes = new LaneCounts(index);
  }

  /** The line in hand cannot be read. */
  refuse(text: Uint8Array, reason: () => string): void {
    this.unread++;
    this.list(this.unreadLines, text, reason);
  }

  /** The line in hand is a reading of an address that leads to no word of the board. */
  leadsNowhere(text: Uint8Array, reason: () => string): void {
    this.readings++;
    this.outside++;
    this.list(this.outsideLines, text, reason);
  }

  counts(): LogCounts {
    const { bytes, line, readings, failing, unread, blank, outside } = this;
    return { bytes, lines: line, readings, failing, unread, blank, outside };
  }

  evidence(): LogEvidence {
    const { name = 'log', rest = 'unknown' } = this.options;
    return evidenceOf(this.index, this.lanes, { counts: this.counts(), name, rest });
  }

  summary(): LogSummary {
    const { unreadLines, outsideLines, open } = this;
    return summaryOf(this.index, this.lanes, { counts: this.counts(), unreadLines, outsideLines, open });
  }

  private list(lines: UnreadLine[], bytes: Uint8Array, reason: () => string): void {
    if (lines.length < mostListed) lines.push({ line: this.line, text: shownText(bytes), reason: reason() });
  }
}
