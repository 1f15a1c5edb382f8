import type { LinePattern, LogCounts, LogSummary } from '@/lib';
import type { LayoutDocument, LogEvidence } from '@/shared';

/** A log to be read, as it is sent to the worker. */
export interface LogTask {
  readonly document: LayoutDocument;
  readonly pattern: LinePattern;
  /** The file, or pasted lines. Nothing of it leaves the device. */
  readonly source: Blob;
  readonly name: string;
  readonly rest: 'unknown' | 'passed';
}

/** How far the reading of a log is. */
export interface LogProgress {
  /** Bytes of the file that were read, of `total`. */
  readonly read: number;
  readonly total: number;
  readonly counts: LogCounts;
  /** Seconds since it began. */
  readonly seconds: number;
}

/** What became of it. */
export interface LogResult {
  readonly evidence: LogEvidence;
  readonly summary: LogSummary;
  readonly seconds: number;
}

/** What the worker says. */
export type LogMessage =
  | { readonly kind: 'progress'; readonly progress: LogProgress }
  | { readonly kind: 'done'; readonly result: LogResult }
  | { readonly kind: 'failed'; readonly reason: string };
