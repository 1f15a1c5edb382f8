import type { Lane } from '../brand';
import type { Result } from '../result';
import type { WordValues } from './outcome';

/** What a code says of one lane. */
export interface FailingLane {
  readonly lane: Lane;
  /** Known where the code shows what was written and read. */
  readonly reads: 'zero' | 'one' | 'unknown';
}

/** One way to understand a code. Several remain where the layout leaves a convention unknown. */
export interface ReportReading {
  readonly failing: readonly FailingLane[];
  /** Lanes that were tested before or together with them and passed. */
  readonly passed: readonly Lane[];
  /** CPU address of the failing word, where the code has one and it is not shortened. */
  readonly address: number | null;
  /** What was written and read, as words of the bank as far as bit 39; null where the code does not show both. */
  readonly values: WordValues | null;
  /** Which conventions this reading takes: "counted from 1", "bit 0 is the highest". Empty where none is open. */
  readonly takes: readonly string[];
}

export interface ReadReport {
  /** The text as understood, in the machine's own form. */
  readonly text: string;
  /** What was taken otherwise than typed: "O read as 0". Empty where nothing was. */
  readonly notes: readonly string[];
  /** At least one. */
  readonly readings: readonly ReportReading[];
}

export type ReadResult = Result<ReadReport> & { readonly at?: number };

/** A key that the format can take next. */
export interface ReportKey {
  /** What it adds to the text. */
  readonly text: string;
  readonly label: string;
  /** False: the format has such a key, but not at this place. */
  readonly enabled: boolean;
}

export interface Prefix {
  /** Keys to show, always the same ones for a format, in a steady order. */
  readonly keys: readonly ReportKey[];
  /** The text already is a whole code. */
  readonly complete: boolean;
  /** No code of this board begins so; the reason in words. Null while the text can still become one. */
  readonly reason: string | null;
  /** Lanes that a code beginning with the text can still name. */
  readonly possible: readonly Lane[];
  /** What the format waits for: "bank A to D, then bit 0 to 7". */
  readonly expects: string;
  /** Fixed text that follows by itself, to be filled in without a key. */
  readonly fills: string;
}

/** A report format made ready for one layout. */
export interface CompiledFormat {
  readonly id: string;
  readonly name: string;
  /** Text to evidence. Time grows with the length of the text only. */
  readonly read: (text: string) => ReadResult;
  /** Failing lanes to the text that the machine would show, the first convention taken where one is unknown. */
  readonly write: (lanes: readonly Lane[]) => Result<{ text: string }>;
  /** What can follow a text that is being typed. */
  readonly next: (text: string) => Prefix;
}
