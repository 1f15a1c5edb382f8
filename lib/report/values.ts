import { type BankIndex, bankIndex } from '../brand';
import type { Convention } from './conventions';
import type { FormatContext, TableEntry } from './format-context';
import type { FieldMatch } from './match-types';
import { numberOf, numberOfLetters, onesOf, onesOfNumber } from './numerals';
import { oneHotReason } from './reasons';

/** Whether a line of a table stands for a lane or a part of one, and not for words alone. */
export function entryNamesLane(entry: TableEntry): boolean {
  return entry.value !== undefined || entry.bank !== undefined || entry.bits !== undefined;
}

/**
 * The number of a counted thing from 0, as a convention counts; below 0 or too high where it does not exist. Words
 * instead where a one-hot number has not just one 1.
 */
export function countOf({ part, text, entry }: FieldMatch, convention: Convention): number | string {
  const { field, radix } = part;
  if (entry?.value !== undefined) return entry.value - convention.first(part);
  if (field.notation === 'letter') return numberOfLetters(text);
  if (radix === null) return -1;
  if (field.notation !== 'one-hot') return numberOf(text, radix) - convention.first(part);
  const ones = onesOf(text, radix);
  return ones.length === 1 ? ones[0]! : oneHotReason(text);
}

/** Places of the ones of a mask or a value, lowest first. */
export function placesOf({ part, text, entry }: FieldMatch): number[] {
  return entry?.value !== undefined ? onesOfNumber(entry.value) : onesOf(text, part.radix ?? 2);
}

/** The bank that a field names: undefined where it says nothing of the bank, null where that bank does not exist. */
export function placedBank(
  { index }: FormatContext,
  match: FieldMatch,
  convention: Convention,
): BankIndex | null | undefined {
  const { entry, part, text } = match;
  if (entry?.bank !== undefined) return index.bankByName.get(entry.bank) ?? null;
  if (part.field.field !== 'bank') return undefined;
  if (entry !== null && entry.value === undefined) return undefined;
  if (part.field.notation === 'names' && entry === null) return index.bankByName.get(text) ?? null;
  const count = countOf(match, convention);
  return typeof count === 'number' && count >= 0 && count < index.bankCount ? bankIndex(count) : null;
}
