/** Where a number stands in a line: the nth word of the line, counted from 1, or the word that stands before it. */
export type Column = number | string;

export type LogNotation = 'hexadecimal' | 'octal' | 'decimal';

interface Meaning {
  /** What the addresses count. word: whole words of the memory. */
  readonly unit: 'address' | 'word';
  /** What one value holds: the bits that the address carries, or the whole word. */
  readonly shows: 'address' | 'word';
  /** How well it fits the lines that it was found from, as a share: the candidates add up to 1. */
  readonly score?: number;
  /** Why it was chosen, in words. */
  readonly reason?: string;
}

/** A line whose numbers stand at fixed words or after fixed words. Words are runs of letters and digits. */
export interface ColumnPattern extends Meaning {
  readonly address: Column;
  readonly written?: Column;
  readonly read?: Column;
  /** The failing bits, where the line shows those. Written and read count more where the line has all three. */
  readonly mask?: Column;
  /** The page or bank register at the time: its name in the layout, and where its value stands. */
  readonly register?: { readonly name: string; readonly column: Column };
  readonly notation: LogNotation;
  /** Notation of written, read and mask where it is not that of the address. */
  readonly values?: LogNotation | 'binary';
}

/** A line as one of the report formats of the layout words it. */
export interface FormatPattern extends Meaning {
  /** Id of the report format. */
  readonly format: string;
}

/** How the lines of a log are read. Plain data, so that it can be sent to a worker. */
export type LinePattern = ColumnPattern | FormatPattern;

export function isFormatPattern(pattern: LinePattern): pattern is FormatPattern {
  return 'format' in pattern;
}

const columnWords = (column: Column) => (typeof column === 'number' ? `word ${column}` : `after ${column}`);

/** The pattern in words, such as "address word 1, written after W, read after R, hexadecimal". */
export function patternWords(pattern: LinePattern): string {
  if (isFormatPattern(pattern)) return `as the board's own report “${pattern.format}”`;
  const { address, written, read, mask, register, notation, values = notation } = pattern;
  const fields = [
    `address ${columnWords(address)}`,
    ...(written === undefined ? [] : [`written ${columnWords(written)}`]),
    ...(read === undefined ? [] : [`read ${columnWords(read)}`]),
    ...(mask === undefined ? [] : [`failing bits ${columnWords(mask)}`]),
    ...(register === undefined ? [] : [`${register.name} ${columnWords(register.column)}`]),
  ];
  const counts = pattern.unit === 'word' ? ', addresses count words' : '';
  return `${fields.join(', ')}; ${values === notation ? notation : `addresses ${notation}, values ${values}`}${counts}`;
}
