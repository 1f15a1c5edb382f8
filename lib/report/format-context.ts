import type { FormatField, ReportFormat } from '@/shared';
import type { LayoutIndex } from '../layout/layout-index';
import { type AddressMap, type SpanPlace, addressMapOf } from '../place/address';
import { bitName } from '../layout/words';
import { digitsOf, lettersOf, radixOf } from './numerals';
import { type Question, questionsOf } from './conventions';

export type TableEntry = FormatField['table'][number];

/** A field made ready for reading and writing. */
export interface FieldPart {
  readonly kind: 'field';
  readonly field: FormatField;
  /** Place in the format's list of parts. */
  readonly at: number;
  readonly radix: number | null;
  /** Digits and how many; null where the field has none. */
  readonly digits: { readonly alphabet: string; readonly min: number; readonly max: number } | null;
  /** Most letters of a letter field; 0 for others. */
  readonly letters: number;
  /** Any text without a space. */
  readonly free: boolean;
  /** Names and table texts. */
  readonly words: readonly string[];
  readonly table: ReadonlyMap<string, TableEntry>;
}

export interface TextPart {
  readonly kind: 'text';
  readonly text: string;
}

export type Part = FieldPart | TextPart;

/** What reading, writing and the keypad of one format share. */
export interface FormatContext {
  readonly index: LayoutIndex;
  readonly format: ReportFormat;
  readonly map: AddressMap;
  readonly parts: readonly Part[];
  readonly fields: readonly FieldPart[];
  /** Conventions that the layout leaves open. */
  readonly questions: readonly Question[];
  /** The bits of a word that are no check bits, ascending. */
  readonly dataBits: readonly number[];
  readonly allBits: readonly number[];
}

/** Most digits that are read where a format does not say how many there are. */
const freeDigits = 24;
const mostDigits = 72;

function namesFor(field: FormatField, index: LayoutIndex): string[] {
  const { memory, sockets } = index.document;
  if (field.notation !== 'names') return [];
  if (field.field === 'bank') return memory.banks.map((bank) => bank.id);
  if (field.field === 'socket') return sockets.map((socket) => socket.label);
  if (field.field === 'bit') return Array.from({ length: index.bitCount }, (_, bit) => bitName(memory, bit));
  return [];
}

function fieldPart(field: FormatField, at: number, index: LayoutIndex): FieldPart {
  const radix = radixOf(field.notation);
  const table = new Map(field.table.map((entry) => [entry.text, entry]));
  const longest = radix === 2 ? mostDigits : freeDigits;
  const digits =
    radix === null
      ? null
      : { alphabet: digitsOf(radix), min: field.digits?.min ?? 1, max: field.digits?.max ?? longest };
  const letterCount = field.field === 'bank' ? index.bankCount : index.laneCount;
  return {
    kind: 'field',
    field,
    at,
    radix,
    digits,
    letters: field.notation === 'letter' ? lettersOf(Math.max(0, letterCount - 1)).length : 0,
    free: field.field === 'ignored' && field.notation === 'names',
    words: [...new Set([...namesFor(field, index), ...table.keys()])],
    table,
  };
}

/** Lays out a format for one layout. Total: whether it makes sense is asked separately. */
export function buildFormatContext(format: ReportFormat, index: LayoutIndex): FormatContext {
  const allBits = Array.from({ length: index.bitCount }, (_, bit) => bit);
  const dataBits = allBits.filter((bit) => index.isCheckBit[bit] === 0);
  const parts = format.parts.map((part, at): Part =>
    'text' in part ? { kind: 'text', text: part.text } : fieldPart(part, at, index),
  );
  const fields = parts.filter((part) => part.kind === 'field');
  return {
    index,
    format,
    map: addressMapOf(index),
    parts,
    fields,
    questions: questionsOf(fields.map(({ field, at }) => ({ field, at }))),
    dataBits: dataBits.length === 0 ? allBits : dataBits,
    allBits,
  };
}

/** How many bits a field of a fixed number of digits can show; null where the number of digits is free. */
function widthInBits({ field, radix }: FieldPart): number | null {
  return field.digits === undefined || radix === null ? null : Math.floor(field.digits.max * Math.log2(radix) + 1e-9);
}

/** The bits that a field for the bit, the lane, a mask or a value counts or shows, lowest first. */
export function bitsOfField(
  context: FormatContext,
  part: FieldPart,
  site: Pick<SpanPlace, 'bits'> | null,
): readonly number[] {
  if (part.field.bits !== undefined) return part.field.bits;
  if (part.field.code !== undefined) return context.allBits;
  const { field } = part.field;
  const width = widthInBits(part);
  const shows = field === 'mask' || field === 'written' || field === 'read';
  const { dataBits, allBits } = context;
  if (shows && site !== null && site.bits.length < dataBits.length && (width === null || width < dataBits.length))
    return width === null ? site.bits : site.bits.slice(0, width);
  return shows && width !== null && width >= allBits.length ? allBits : dataBits;
}
