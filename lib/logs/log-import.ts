import type { LogEvidence } from '@/shared';
import type { LayoutIndex } from '../layout/layout-index';
import { ColumnLines } from './column-lines';
import { FormatLines } from './format-lines';
import { LineFeed, tooLongWords } from './line-feed';
import { type LinePattern, isFormatPattern } from './line-pattern';
import { LogBook, type LogCounts, type LogOptions } from './log-book';
import type { LogSummary } from './log-evidence';

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

/**
 * Opens a log of any length to be read line by line by a pattern. Lines that cannot be read are counted and the first
 * 100 of them listed; nothing in a log makes it throw. Throws RangeError for a report format that the layout has not,
 * and where bytes are pushed after the end.
 */
export function openLogImport(index: LayoutIndex, pattern: LinePattern, options: LogOptions = {}): LogImport {
  const book = new LogBook(index, options);
  const taker = isFormatPattern(pattern)
    ? new FormatLines(index, pattern.format, book)
    : new ColumnLines(index, pattern, book);
  const feed: LineFeed = new LineFeed({
    lines: (bytes, end) => taker.lines(bytes, end, feed.newline),
    tooLong: () => {
      book.line++;
      book.refuse(new Uint8Array(0), tooLongWords);
    },
  });
  let done = false;
  return {
    push: (bytes) => {
      if (done) throw new RangeError('The log is finished; open a new one.');
      book.bytes += bytes.length;
      feed.push(bytes);
    },
    counts: () => book.counts(),
    finish: () => {
      if (!done) {
        feed.finish();
        taker.finish();
        done = true;
      }
      return book.evidence();
    },
    summary: () => {
      if (!done) throw new RangeError('The log is not finished.');
      return book.summary();
    },
  };
}
