import { escapeField, readField } from './link-text';

/** How one kind of thing is written as a statement of a link, and read back. */
export interface Statement<Kind> {
  readonly write: (value: Kind) => string;
  /** What the fields say, before the schema has checked it. */
  readonly read: (fields: readonly string[]) => unknown;
}

/** A letter with words as its fields. */
export const statement = (letter: string, ...fields: readonly string[]): string =>
  [letter, ...fields.map(escapeField)].join('.');

/** A number of at least 0 in hexadecimal, as short as it gets. */
export const hex = (value: number): string => value.toString(16).toUpperCase();

/** A hexadecimal number as the schema reads it; what is none is left to the schema to refuse. */
export const fromHex = (text: string): string => `0x${text}`;

/** A whole number in decimal; -1, which no schema takes, where it is none. */
export const whole = (text: string | undefined): number =>
  text !== undefined && /^\d{1,16}$/.test(text) ? Number(text) : -1;

/** Any number without a sign that a link would have to escape: `n5-01` is -5.01. */
export const decimal = (value: number): string => String(value).replaceAll('-', 'n').replace('.', '-');

/** The number of such a text; NaN where it is none. */
export const fromDecimal = (text: string | undefined): number =>
  text === undefined || text === '' ? NaN : Number(text.replace('-', '.').replaceAll('n', '-'));

/**
 * Numbers in hexadecimal, each after a small letter that says which it is: `wFFrF7`. Letters beyond f only, so that no
 * digit is taken for one.
 */
export function tagged(values: Readonly<Record<string, number | undefined>>): string {
  return Object.entries(values)
    .map(([letter, value]) => (value === undefined ? '' : `${letter}${hex(value)}`))
    .join('');
}

/** The tagged numbers of a text as the schema reads them, by letter; what stands before the first tag under ''. Null where the text is none. */
export function fromTagged(text: string): Record<string, string> | null {
  if (!/^[0-9A-Fa-f]*([g-z][0-9A-Fa-f]+)*$/.test(text)) return null;
  const found: Record<string, string> = {};
  for (const [, letter = '', digits = ''] of text.matchAll(/([g-z]?)([0-9A-Fa-f]+)/g)) found[letter] = fromHex(digits);
  return found;
}

/** Parts of a field between dashes, the words of each read back. */
export const dashed = (field: string): string[] => field.split('-').map(readField);
