import type { LogNotation } from './line-pattern';

/** A run of letters and digits in a line, and what stands between it and the one before. */
export interface LineWord {
  readonly text: string;
  readonly before: string;
}

/** The words of a line, as the readers of lines count them: letters, digits and underscores of ASCII. */
export function wordsOfLine(line: string): LineWord[] {
  const words: LineWord[] = [];
  let end = 0;
  for (const { 0: text, index } of line.matchAll(/[0-9A-Za-z_]+/g)) {
    words.push({ text, before: line.slice(end, index) });
    end = index + text.length;
  }
  return words;
}

const digits: Readonly<Record<LogNotation | 'binary', RegExp>> = {
  hexadecimal: /^[0-9a-f]+$/i,
  octal: /^[0-7]+$/,
  decimal: /^[0-9]+$/,
  binary: /^[01]+$/,
};

/** Whether a word is a number of a notation, or says another one by a mark of its own: 0x1A, 1Ah, 377q. */
export function isNumber(word: string, notation: LogNotation | 'binary'): boolean {
  return digits[notation].test(word) || /^0x[0-9a-f]+$|^[0-9a-f]+h$|^[0-7]+[oq]$/i.test(word);
}

/** What the words of a log call a field. */
export type LabelledField = 'address' | 'written' | 'read' | 'mask' | 'register';

const labels: Readonly<Record<Exclude<LabelledField, 'register'>, readonly string[]>> = {
  address: [
    'ADDR',
    'ADDRESS',
    'ADDRESSES',
    'ADR',
    'ADRS',
    'ADD',
    'AT',
    'LOC',
    'LOCATION',
    'CELL',
    'OFFSET',
    'FROM',
    'A',
  ],
  written: [
    ...['WROTE', 'WRITTEN', 'WRITE', 'WRT', 'WR', 'W', 'EXPECTED', 'EXPECT', 'EXPECTING', 'EXPD', 'EXP', 'WANT'],
    ...['WANTED', 'BE', 'SHOULD', 'SB', 'GOOD', 'RIGHT', 'CORRECT', 'PATTERN', 'PATT', 'SENT', 'PUT', 'OUT', 'STORED'],
  ],
  read: [
    ...['READ', 'RD', 'R', 'ACTUAL', 'ACT', 'GOT', 'IS', 'WAS', 'FOUND', 'RECEIVED', 'RECD', 'RCVD', 'RECV', 'SAW'],
    ...['BAD', 'WRONG', 'SEEN', 'GIVES', 'GAVE', 'RETURNED', 'BACK', 'IN', 'CONTAINS', 'HAS', 'HAD'],
  ],
  mask: ['MASK', 'XOR', 'DIFF', 'DIFFERENCE', 'DIFFERS', 'BITS', 'ERR', 'ERROR', 'FAILS', 'FAILING', 'FAULT', 'SYND'],
};

const fieldOfLabel = new Map<string, LabelledField>(
  Object.entries(labels).flatMap(([field, words]) =>
    words.map((word): [string, LabelledField] => [word, field as LabelledField]),
  ),
);

/** The field that a word names, whatever the case of its letters; null for most words. */
export function labelledField(word: string): LabelledField | null {
  return fieldOfLabel.get(word.toUpperCase()) ?? null;
}

/** Words between the two ends of a run of addresses. */
const joins = new Set(['TO', 'THRU', 'THROUGH', 'UNTIL']);

/** Whether a word with a number after it goes on from the address before it, so that neither counts as a column. */
export function joinsRun(word: LineWord): boolean {
  return joins.has(word.text.toUpperCase());
}
