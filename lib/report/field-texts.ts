import { bitName } from '../layout/words';
import type { Convention } from './conventions';
import { type FieldPart, type FormatContext, type TableEntry, bitsOfField } from './format-context';
import { lettersOf } from './numerals';

/** A text of a field that counts or names, and the lanes that it can mean. */
export interface FieldText {
  readonly text: string;
  readonly lanes: readonly number[];
  /** It can be written with zeros before it. */
  readonly padded: boolean;
  /** Words that name no lane. */
  readonly speaks: boolean;
}

const exists =
  ({ index }: FormatContext) =>
  (at: number) =>
    index.laneExists[at] === 1;

const lanesOfBank = ({ index }: FormatContext, bank: number) =>
  Array.from({ length: index.bitCount }, (_, bit) => bank * index.bitCount + bit);

const lanesOfBit = ({ index }: FormatContext, bit: number) =>
  Array.from({ length: index.bankCount }, (_, bank) => bank * index.bitCount + bit);

function lanesOfSocket({ index }: FormatContext, label: string): number[] {
  const at = index.socketByLabel.get(label)!;
  return Array.from(index.socketLanes.subarray(index.socketLaneStart[at], index.socketLaneStart[at + 1]));
}

/** Lanes of each thing that a field counts, in the order of counting. */
function countedLanes(context: FormatContext, part: FieldPart, convention: Convention): number[][] {
  const { index } = context;
  const banks = Array.from({ length: index.bankCount }, (_, bank) => bank);
  if (part.field.field === 'bank') return banks.map((bank) => lanesOfBank(context, bank));
  const listed = bitsOfField(context, part, null);
  const bits = convention.highFirst(part) ? [...listed].reverse() : listed;
  if (part.field.field === 'bit') return bits.map((bit) => lanesOfBit(context, bit));
  return part.field.order === 'bank-first'
    ? banks.flatMap((bank) => bits.map((bit) => [bank * index.bitCount + bit]))
    : bits.flatMap((bit) => banks.map((bank) => [bank * index.bitCount + bit]));
}

function countedTexts(context: FormatContext, part: FieldPart, convention: Convention): FieldText[] {
  const counted = countedLanes(context, part, convention);
  const { notation } = part.field;
  const text = (count: number) =>
    notation === 'letter'
      ? lettersOf(count)
      : notation === 'one-hot'
        ? '1'.padEnd(count + 1, '0')
        : (count + convention.first(part)).toString(part.radix ?? 10).toUpperCase();
  return counted.map((lanes, count) => ({ text: text(count), lanes, padded: notation !== 'letter', speaks: false }));
}

function namedTexts(context: FormatContext, part: FieldPart): FieldText[] {
  const { memory, sockets } = context.index.document;
  const named = (text: string, lanes: number[]): FieldText => ({ text, lanes, padded: false, speaks: false });
  if (part.field.field === 'bank') return memory.banks.map((bank, at) => named(bank.id, lanesOfBank(context, at)));
  if (part.field.field === 'bit')
    return context.allBits.map((bit) => named(bitName(memory, bit), lanesOfBit(context, bit)));
  if (part.field.field === 'socket') return sockets.map(({ label }) => named(label, lanesOfSocket(context, label)));
  return [];
}

function entryLanes(context: FormatContext, entry: TableEntry): number[] | null {
  const { index } = context;
  if (entry.bank === undefined && entry.bits === undefined) return entry.means === undefined ? null : [];
  const bank = entry.bank === undefined ? undefined : index.bankByName.get(entry.bank);
  const banks =
    entry.bank === undefined ? Array.from({ length: index.bankCount }, (_, n) => n) : bank === undefined ? [] : [bank];
  const bits = entry.bits ?? context.allBits;
  return banks.flatMap((at) => bits.filter((bit) => bit < index.bitCount).map((bit) => at * index.bitCount + bit));
}

function tableTexts(context: FormatContext, part: FieldPart, conventions: readonly Convention[]): FieldText[] {
  return part.field.table.map((entry) => {
    const speaks = entry.value === undefined && entry.bank === undefined && entry.bits === undefined;
    const byValue =
      entry.value === undefined
        ? []
        : conventions.flatMap(
            (convention) => countedLanes(context, part, convention)[entry.value! - convention.first(part)] ?? [],
          );
    return { text: entry.text, lanes: entryLanes(context, entry) ?? byValue, padded: false, speaks };
  });
}

/** True for the fields whose every text can be listed. */
export function countsOrNames({ field }: FieldPart): boolean {
  return field.field === 'bank' || field.field === 'bit' || field.field === 'lane' || field.field === 'socket';
}

/**
 * Every text that a field which counts or names can show, under any convention that is open, with the lanes that each
 * can mean. For other fields only the lines of their table.
 */
export function fieldTexts(context: FormatContext, part: FieldPart, conventions: readonly Convention[]): FieldText[] {
  const listed = tableTexts(context, part, countsOrNames(part) ? conventions : []);
  const own = new Set(listed.map(({ text }) => text));
  const byText = new Map<string, FieldText>();
  const texts =
    !countsOrNames(part) || part.field.notation === 'words'
      ? []
      : part.field.notation === 'names'
        ? namedTexts(context, part)
        : conventions.flatMap((convention) => countedTexts(context, part, convention));
  for (const entry of texts) {
    if (own.has(entry.text)) continue;
    const before = byText.get(entry.text);
    byText.set(entry.text, before === undefined ? entry : { ...entry, lanes: [...before.lanes, ...entry.lanes] });
  }
  const there = exists(context);
  return [...byText.values(), ...listed].map((entry) => ({ ...entry, lanes: [...new Set(entry.lanes)].filter(there) }));
}
