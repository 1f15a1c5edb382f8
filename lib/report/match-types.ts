import type { FieldPart, TableEntry } from './format-context';
import type { TypedText } from './typed-text';

/** How far a typed text may differ from the machine's own form. */
export interface Tolerance {
  /** Small letters, full-width forms, other signs between the fields. */
  readonly fold: boolean;
  /** Characters that look alike. */
  readonly alike: boolean;
  /** Signs between the fields left out or added. */
  readonly loose: boolean;
  /** Spaces inside a number. */
  readonly spaced: boolean;
  /** Fixed words left out. */
  readonly dropped: boolean;
}

/** A place in a typed text, and how freely it is read there. */
export interface Spot {
  readonly typed: TypedText;
  readonly at: number;
  readonly tolerance: Tolerance;
}

/** A piece of text that one part of a format takes. */
export interface Piece {
  readonly end: number;
  /** In the machine's own form. */
  readonly text: string;
  readonly notes: readonly string[];
  readonly entry?: TableEntry | null;
}

/** A field as it was found in a text. */
export interface FieldMatch {
  readonly part: FieldPart;
  /** In the machine's own form. */
  readonly text: string;
  /** Where it begins in the typed text. */
  readonly start: number;
  /** The line of the field's table that it is; null where its digits, letters or names count. */
  readonly entry: TableEntry | null;
}

/** One way to understand a whole text as the parts of a format. */
export interface Match {
  readonly fields: readonly FieldMatch[];
  readonly text: string;
  readonly notes: readonly string[];
}

/** How far a text could be followed. */
export interface Stop {
  readonly part: number;
  readonly at: number;
}
