import type { AddressWindow } from '@/shared';
import type { BankIndex, Lane } from '../brand';
import { type SyndromeMeaning, highestSyndrome } from '../ecc/code';
import { bankWords, bitName, bitWords, listWords, numbersWords, rangeWords, sentenceCase } from '../layout/words';
import type { FieldPart, FormatContext } from './format-context';
import { bitsOfField } from './format-context';
import type { FieldMatch, Stop } from './match-types';
import { digitsOfOnes, lettersOf } from './numerals';

/** A sentence of its own: capital at the start, full stop at the end. */
export function sentence(text: string): string {
  return sentenceCase(/[.!?]$/.test(text) ? text : `${text}.`);
}

function fromTo(from: number | string, to: number | string): string {
  return from === to ? String(from) : `${from} to ${to}`;
}

const countsInDigits = ({ field, radix }: FieldPart) => radix !== null && field.notation !== 'one-hot';

/** "0 to 7", as the machine counts; "0 to 7 or 1 to 8" where it is not known from where. */
function countedWords(part: FieldPart, total: number): string {
  if (part.field.notation === 'letter') return total === 1 ? 'A' : `A to ${lettersOf(total - 1)}`;
  if (!countsInDigits(part)) return fromTo(0, total - 1);
  const radix = part.radix ?? 10;
  const written = (first: number) => {
    const [from, to] = [first, first + total - 1].map((n) => n.toString(radix).toUpperCase());
    return from === to ? from! : `${from} to ${to}`;
  };
  return part.field.first === 'unknown' ? `${written(0)} or ${written(1)}` : written(part.field.first);
}

/** The banks as a field writes them: "A to D". */
function bankRange({ index }: FormatContext, part: FieldPart): string {
  if (part.field.notation === 'words') return tableWords(part);
  if (part.field.notation === 'names') return rangeWords(index.document.memory.banks.map((bank) => bank.id));
  return countedWords(part, index.bankCount);
}

function bitRange(context: FormatContext, part: FieldPart): string {
  const { memory } = context.index.document;
  if (part.field.notation === 'words') return tableWords(part);
  const bits = bitsOfField(context, part, null);
  if (part.field.notation === 'names') return rangeWords(context.allBits.map((bit) => bitName(memory, bit)));
  const counted = countedWords(part, bits.length);
  return part.table.size === 0 ? counted : `${counted}, or ${listWords([...part.table.keys()])}`;
}

function tableWords(part: FieldPart): string {
  return listWords([...part.table.keys()]);
}

function digitRange(context: FormatContext, part: FieldPart): string {
  const bits = bitsOfField(context, part, null);
  const radix = part.radix ?? 2;
  const top = digitsOfOnes(
    bits.map((_, place) => place),
    radix,
  );
  const { digits } = part.field;
  const shown = digits === undefined || radix === 10 ? top : top.slice(-digits.max).padStart(digits.min, '0');
  return `${'0'.repeat(radix === 10 ? 1 : shown.length)} to ${shown}`;
}

function addressRange({ index }: FormatContext, part: FieldPart): string {
  const { windows } = index.document.addressMap;
  const from = Math.min(...windows.map(({ range }) => range.from));
  return spanWords(part, { from, to: Math.max(...windows.map(({ range }) => range.to)) });
}

/** What a field takes, without its noun: "A to D", "0 to 7". Empty where nothing short can be said. */
export function rangeOfField(context: FormatContext, part: FieldPart): string {
  if (part.field.notation === 'words') return tableWords(part);
  switch (part.field.field) {
    case 'bank':
      return bankRange(context, part);
    case 'bit':
      return bitRange(context, part);
    case 'lane':
      return countedWords(part, bitsOfField(context, part, null).length * context.index.bankCount);
    case 'mask':
    case 'written':
    case 'read':
      return digitRange(context, part);
    case 'address':
      return context.map.windows.length === 0 ? '' : addressRange(context, part);
    case 'socket': {
      const labels = context.index.document.sockets.map((socket) => socket.label);
      return labels.length > 2 ? `such as ${labels[0]}` : labels.join(' or ');
    }
    case 'syndrome':
      return syndromeRange(part);
    case 'count':
    case 'ignored':
      return '';
  }
}

/** "00 to 7F": the syndromes that the code of a field has. Empty where it has none. */
function syndromeRange({ field, radix }: FieldPart): string {
  if (field.code === undefined || radix === null) return '';
  const top = highestSyndrome(field.code).toString(radix).toUpperCase();
  const least = field.digits?.min ?? (radix === 10 ? 1 : top.length);
  return fromTo('0'.padStart(least, '0'), top.padStart(least, '0'));
}

/** Why a syndrome names no bit: "Syndrome 05 means two wrong bits; the code cannot say which." */
export function syndromeReason(
  { part, text }: Pick<FieldMatch, 'part' | 'text'>,
  kind: Exclude<SyndromeMeaning['kind'], 'single' | 'check-bit'>,
): string {
  switch (kind) {
    case 'none':
      return `Syndrome ${text} means that no bit is wrong.`;
    case 'double':
      return `Syndrome ${text} means two wrong bits; the code cannot say which.`;
    case 'not-correctable':
      return `Syndrome ${text} means more wrong bits than the code can tell.`;
    case 'out-of-range':
      return `Syndrome ${text}: this code has ${syndromeRange(part)}.`;
  }
}

/** The noun of a field. */
export function nounOfField(part: FieldPart): string {
  const nouns: Record<FieldPart['field']['field'], string> = {
    bank: 'bank',
    bit: 'bit',
    mask: 'mask',
    address: 'address',
    written: 'value written',
    read: 'value read',
    lane: 'number',
    socket: 'socket',
    count: 'count',
    syndrome: 'syndrome',
    ignored: part.radix === null ? 'word' : 'number',
  };
  return nouns[part.field.field];
}

const article = (noun: string) => `${/^[aeiou]/.test(noun) ? 'an' : 'a'} ${noun}`;

function partWords(context: FormatContext, at: number): string {
  const part = context.parts[at]!;
  if (part.kind === 'text') return part.text.trim() === '' ? 'a space' : `"${part.text.trim()}"`;
  const range = rangeOfField(context, part);
  return range === '' ? article(nounOfField(part)) : `${article(nounOfField(part))}, ${range}`;
}

function partBefore(context: FormatContext, at: number): string | null {
  const part = context.parts[at - 1];
  if (part === undefined) return null;
  return part.kind === 'text'
    ? part.text.trim() === ''
      ? partBefore(context, at - 1)
      : `"${part.text.trim()}"`
    : `the ${nounOfField(part)}`;
}

/** Why a text is no code: "After the bank comes a bit, 0 to 7." */
export function stopReason(context: FormatContext, stop: Stop, text: string): string {
  const before = partBefore(context, stop.part);
  if (stop.part >= context.parts.length)
    return `Nothing comes after ${before}: "${text.slice(stop.at, stop.at + 12)}" is too much.`;
  const next = partWords(context, stop.part);
  return before === null ? `The code begins with ${next}.` : `After ${before} comes ${next}.`;
}

/** "Bank E: this board has banks A to D." */
export function bankReason(context: FormatContext, match: Pick<FieldMatch, 'part' | 'text'>): string {
  return `Bank ${match.text}: this board has ${context.index.bankCount === 1 ? 'only bank' : 'banks'} ${bankRange(context, match.part)}.`;
}

/** "Bit 9: this board has bits 0 to 7.", or the like for a lane's number. */
export function numberReason(context: FormatContext, match: Pick<FieldMatch, 'part' | 'text'>, total: number): string {
  const range = countedWords(match.part, total);
  if (match.part.field.field !== 'bit') return `Number ${match.text}: on this board the numbers are ${range}.`;
  const others = match.part.table.size === 0 ? '' : `, and ${listWords([...match.part.table.keys()])}`;
  return `Bit ${match.text}: this board has bits ${range}${others}.`;
}

/** "Mask 1FF: it shows 8 bits, so 00 to FF is possible." */
export function maskReason({ part, text }: Pick<FieldMatch, 'part' | 'text'>, total: number): string {
  const radix = part.radix ?? 2;
  const top = digitsOfOnes(
    Array.from({ length: total }, (_, place) => place),
    radix,
  );
  const noun = part.field.field === 'mask' ? 'Mask' : 'Value';
  return `${noun} ${text}: it shows ${total} ${total === 1 ? 'bit' : 'bits'}, so ${'0'.repeat(radix === 10 ? 1 : top.length)} to ${top} is possible.`;
}

/** "Bit 5: bank B has bits 0 to 3." */
export function missingBitReason({ index, allBits }: FormatContext, bank: BankIndex, bit: number): string {
  const { memory } = index.document;
  const has = allBits.filter((n) => index.laneExists[bank * index.bitCount + n] === 1);
  const range = memory.bitNames === undefined ? numbersWords(has) : listWords(has.map((n) => bitName(memory, n)));
  return sentenceCase(`${bitWords(memory, bit)}: ${bankWords(memory.banks[bank]!.id)} has bits ${range}.`);
}

/** "Number 12: bank B has no bit 4." */
export function laneReason({ index }: FormatContext, lane: Lane, text: string): string {
  const { memory } = index.document;
  return `Number ${text}: ${bankWords(memory.banks[index.bankOf(lane)]!.id)} has no ${bitWords(memory, index.bitOf(lane))}.`;
}

/** "2C00: bank B does not answer there." */
export function noSuchBankHere({ index }: FormatContext, bank: BankIndex, text: string): string {
  return `${text}: ${bankWords(index.document.memory.banks[bank]!.id)} does not answer there.`;
}

/** What an address outside every window belongs to, or which window is nearest. */
export function addressReason(
  { index }: FormatContext,
  { part, text }: Pick<FieldMatch, 'part' | 'text'>,
  address: number,
): { readonly reason: string; readonly known: boolean } {
  const { addressMap } = index.document;
  const elsewhere = addressMap.elsewhere.find(({ range }) => address >= range.from && address <= range.to);
  if (elsewhere !== undefined) return { reason: sentence(`${text}: ${elsewhere.means}`), known: true };
  const away = ({ range }: AddressWindow) =>
    address < range.from ? range.from - address : Math.max(0, address - range.to);
  const nearest = [...addressMap.windows].sort((a, b) => away(a) - away(b))[0];
  if (nearest === undefined) return { reason: `${text}: this layout has no address windows.`, known: false };
  const where = `The nearest is ${spanWords(part, nearest.range)}, ${bankListWords(nearest.banks)}.`;
  return { reason: `${text} is outside this board's memory. ${where}`, known: false };
}

/** A span of addresses as the code writes them. */
function spanWords({ field, radix }: FieldPart, range: AddressWindow['range']): string {
  const written = [range.from, range.to].map((end) =>
    Math.floor(end / 2 ** field.shift)
      .toString(radix ?? 16)
      .toUpperCase(),
  );
  const width = field.digits?.min ?? (radix === 10 ? 1 : written[1]!.length);
  return written.map((end) => end.padStart(width, '0')).join(' to ');
}

function bankListWords(ids: readonly string[]): string {
  return ids.length === 1 ? bankWords(ids[0]!) : `banks ${rangeWords(ids)}`;
}

/** Why a one-hot number is none. */
export function oneHotReason(text: string): string {
  return `${text}: in this code just one of the digits is 1.`;
}
