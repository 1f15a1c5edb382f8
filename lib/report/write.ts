import { type BankIndex, type Lane } from '../brand';
import { highestSyndrome, syndromeOf } from '../ecc/code';
import { bitName, sentenceCase } from '../layout/words';
import { decodeAddress, encodeAddress, type WordPlace } from '../place/address';
import type { Result } from '../result';
import type { Convention } from './conventions';
import { type FieldPart, type FormatContext, type TableEntry, bitsOfField } from './format-context';
import { digitsOfOnes, lettersOf, onesOfNumber } from './numerals';

/** What writing needs beside the lanes. */
export interface Writer {
  readonly context: FormatContext;
  /** The first answer to every open question. */
  readonly convention: Convention;
}

/** What is to be said: the failing bits of one bank, or one socket. */
interface Saying {
  readonly lanes: readonly Lane[];
  readonly bank: BankIndex | null;
  readonly bits: readonly number[];
  /** The address that the code shows, and the bits that it carries. */
  readonly place: WordPlace | null;
  readonly address: number | null;
}

type Written = { readonly ok: true; readonly text: string } | { readonly ok: false; readonly reason: string };

const wrote = (text: string): Written => ({ ok: true, text });
const cannot = (reason: string): Written => ({ ok: false, reason });

function padded(part: FieldPart, digits: string, usual: number): string {
  const { min, max } = part.field.digits ?? { min: usual, max: Infinity };
  return digits.padStart(Math.min(max, Math.max(min, part.field.digits === undefined ? usual : min)), '0');
}

function ownWords({ table }: FieldPart, fits: (entry: TableEntry) => boolean): string | null {
  for (const [text, entry] of table) if (fits(entry)) return text;
  return null;
}

/** A number in the notation of a field; refused where the table gives the same digits another meaning. */
function counted(
  part: FieldPart,
  count: number,
  { convention, width }: { convention: Convention; width: number },
): Written {
  const { field, radix, table } = part;
  const value = count + convention.first(part);
  const listed = ownWords(part, (entry) => entry.value === value);
  if (listed !== null) return wrote(listed);
  if (field.notation === 'letter') return wrote(lettersOf(count));
  if (radix === null) return cannot('the field lists no word for it');
  const text =
    field.notation === 'one-hot'
      ? padded(part, digitsOfOnes([count], 2), width)
      : padded(part, value.toString(radix).toUpperCase(), 1);
  if (field.digits !== undefined && text.length > field.digits.max)
    return cannot('it needs more digits than the code has');
  return table.has(text) ? cannot(`"${text}" means something else here`) : wrote(text);
}

function writeBank({ context, convention }: Writer, part: FieldPart, { bank }: Saying): Written {
  const { index } = context;
  if (bank === null) return cannot('the bits lie in several banks');
  const id = index.document.memory.banks[bank]!.id;
  const listed = ownWords(part, (entry) => entry.bank === id && entry.bits === undefined);
  if (listed !== null) return wrote(listed);
  if (part.field.notation === 'names') return wrote(id);
  return counted(part, bank, { convention, width: index.bankCount });
}

/** The place of a bit in a field's list, counted from the end that the convention calls low; -1 where it is not there. */
function placeOfBit(
  bits: readonly number[],
  bit: number,
  { convention, part }: { convention: Convention; part: FieldPart },
): number {
  const at = bits.indexOf(bit);
  return at < 0 || !convention.highFirst(part) ? at : bits.length - 1 - at;
}

const sameBits = (entry: TableEntry, bits: readonly number[]) =>
  entry.bits !== undefined && entry.bits.length === bits.length && bits.every((bit) => entry.bits!.includes(bit));

function writeBit({ context, convention }: Writer, part: FieldPart, { bits }: Saying): Written {
  const [bit] = bits;
  if (bit === undefined || bits.length > 1) return cannot('the code shows one bit at a time');
  if (part.field.notation === 'names') return wrote(bitName(context.index.document.memory, bit));
  const domain = part.field.bits ?? context.dataBits;
  const place = placeOfBit(domain, bit, { convention, part });
  return place < 0
    ? cannot('the code does not count that bit')
    : counted(part, place, { convention, width: domain.length });
}

function writeWord(writer: Writer, part: FieldPart, saying: Saying): Written {
  const { context, convention } = writer;
  if (part.field.notation === 'one-hot' && saying.bits.length > 1) return cannot('the code shows one bit at a time');
  const domain = bitsOfField(context, part, saying.place);
  const places = new Set(
    saying.bits.flatMap((bit) => (domain.includes(bit) ? [placeOfBit(domain, bit, { convention, part })] : [])),
  );
  const same = context.fields.filter(({ field }) => field.field === part.field.field);
  const shown = new Set(same.flatMap((other) => bitsOfField(context, other, saying.place)));
  // Whatever was written, it is the value read or the mask that has to show the failing bit.
  if (part.field.field !== 'written' && saying.bits.some((bit) => !shown.has(bit)))
    return cannot('the code does not show that bit');
  const constant = context.format.written;
  const start =
    constant === undefined || part.field.field === 'mask'
      ? []
      : onesOfNumber(constant).filter((place) => place < domain.length);
  const flipped = part.field.field === 'written' ? new Set<number>() : places;
  const ones = [...new Set([...start, ...flipped])].filter((place) => start.includes(place) !== flipped.has(place));
  const radix = part.radix ?? 2;
  const usual =
    radix === 10
      ? 1
      : digitsOfOnes(
          domain.map((_, place) => place),
          radix,
        ).length;
  const text = padded(part, digitsOfOnes(ones, radix), usual);
  if (part.field.digits !== undefined && text.length > part.field.digits.max)
    return cannot('it needs more digits than the code has');
  return part.table.has(text) ? cannot(`"${text}" means something else here`) : wrote(text);
}

function writeAddress({ context }: Writer, part: FieldPart, { address }: Saying): Written {
  if (address === null) return cannot('no address leads to it');
  const { digits } = context.index.document.addressMap;
  const size = 2 ** part.field.shift;
  const radix = part.radix ?? 16;
  const top = Math.floor((context.map.reach[context.map.reach.length - 1] ?? 0) / size);
  const usual = part.field.shift === 0 && digits !== undefined ? digits : radix === 10 ? 1 : top.toString(radix).length;
  const text = padded(
    part,
    Math.floor(address / size)
      .toString(radix)
      .toUpperCase(),
    usual,
  );
  if (part.field.digits !== undefined && text.length > part.field.digits.max)
    return cannot('it needs more digits than the code has');
  return wrote(text);
}

function writeLane({ context, convention }: Writer, part: FieldPart, { bits, bank }: Saying): Written {
  const [bit] = bits;
  if (bit === undefined || bits.length > 1 || bank === null) return cannot('the code shows one bit at a time');
  const domain = part.field.bits ?? context.dataBits;
  const place = placeOfBit(domain, bit, { convention, part });
  if (place < 0) return cannot('the code does not count that bit');
  const { bankCount } = context.index;
  const count = part.field.order === 'bank-first' ? bank * domain.length + place : place * bankCount + bank;
  return counted(part, count, { convention, width: bankCount * domain.length });
}

function writeSocket({ context }: Writer, { lanes }: Saying): Written {
  const { index } = context;
  const holders = lanes.map(
    (lane) => new Set(index.laneSockets.subarray(index.laneSocketStart[lane], index.laneSocketStart[lane + 1])),
  );
  const [first, ...others] = holders;
  const common = [...(first ?? [])].find((socket) => others.every((set) => set.has(socket)));
  return common === undefined ? cannot('no one socket holds it') : wrote(index.document.sockets[common]!.label);
}

function writeSyndrome({ context }: Writer, part: FieldPart, { bits }: Saying): Written {
  const { code } = part.field;
  const { radix } = part;
  if (code === undefined || radix === null) return cannot('the table of syndromes does not list it');
  const [bit] = bits;
  if (bit === undefined || bits.length > 1) return cannot('a syndrome names one wrong bit');
  const place = bitsOfField(context, part, null).indexOf(bit);
  if (place < 0) return cannot('the code has no column for that bit');
  const digits = (value: number) => value.toString(radix).toUpperCase();
  const usual = radix === 10 ? 1 : digits(highestSyndrome(code)).length;
  const text = padded(part, digits(syndromeOf(code, [place])), usual);
  return part.table.has(text) ? cannot(`"${text}" means something else here`) : wrote(text);
}

function writePlain(part: FieldPart): string {
  const [listed] = part.table.keys();
  if (listed !== undefined && part.radix === null) return listed;
  return part.field.field === 'count'
    ? '1'.padStart(part.field.digits?.min ?? 1, '0')
    : '0'.repeat(part.field.digits?.min ?? 1);
}

function writeField(writer: Writer, part: FieldPart, saying: Saying): Written {
  const { memory } = writer.context.index.document;
  const bankId = saying.bank === null ? undefined : memory.banks[saying.bank]!.id;
  const whole = ownWords(
    part,
    (entry) => sameBits(entry, saying.bits) && (entry.bank === undefined || entry.bank === bankId),
  );
  if (whole !== null) return wrote(whole);
  switch (part.field.field) {
    case 'bank':
      return writeBank(writer, part, saying);
    case 'bit':
      return writeBit(writer, part, saying);
    case 'mask':
    case 'written':
    case 'read':
      return writeWord(writer, part, saying);
    case 'address':
      return writeAddress(writer, part, saying);
    case 'lane':
      return writeLane(writer, part, saying);
    case 'socket':
      return writeSocket(writer, saying);
    case 'syndrome':
      return writeSyndrome(writer, part, saying);
    case 'count':
    case 'ignored':
      return wrote(writePlain(part));
  }
}

/** Ways to say it, by address where the code has one: an address that carries all the bits comes first. */
function sayings({ context }: Writer, lanes: readonly Lane[]): Saying[] {
  const { index } = context;
  const banks = [...new Set(lanes.map((lane) => index.bankOf(lane)))];
  const bits = lanes.map((lane): number => index.bitOf(lane));
  const plain: Saying = { lanes, bank: banks.length === 1 ? banks[0]! : null, bits, place: null, address: null };
  const hasAddress = context.fields.some(({ field }) => field.field === 'address') && context.map.windows.length > 0;
  const { bank } = plain;
  if (!hasAddress || bank === null) return [plain];
  const firstWords = new Set([0, ...(context.map.byBank.get(bank) ?? []).map(({ window }) => window.firstWord)]);
  const found = [...firstWords].flatMap((word) =>
    bits.flatMap((bit) =>
      encodeAddress(context.map, { bank, word, bit }).flatMap(({ address }) => {
        const place = decodeAddress(context.map, address).find((candidate) => candidate.bank === bank);
        return place === undefined ? [] : [{ ...plain, place, address }];
      }),
    ),
  );
  // A check bit may lie on no byte lane: the word's first address stands for it where the code shows the whole word.
  const other =
    found.length > 0
      ? []
      : context.dataBits.slice(0, 1).flatMap((bit) =>
          encodeAddress(context.map, { bank, word: 0, bit }).map(({ address }) => ({
            ...plain,
            address,
            place: decodeAddress(context.map, address)[0] ?? null,
          })),
        );
  const all = [...found, ...other];
  return all.length === 0 ? [plain] : all;
}

function writeSaying(writer: Writer, saying: Saying): Written {
  let text = '';
  for (const part of writer.context.parts) {
    const written = part.kind === 'text' ? wrote(part.text) : writeField(writer, part, saying);
    if (!written.ok) return written;
    text += written.text;
  }
  return wrote(text);
}

/**
 * The text that the machine would show for failing lanes of one bank or socket. An address is that of the first word
 * that shows them; a value read is what stands where nothing but zeros, or the format's constant, was written.
 */
export function writeText(writer: Writer, lanes: readonly Lane[]): Result<{ text: string }> {
  const { index } = writer.context;
  const unique = [...new Set(lanes)].filter((lane) => index.laneExists[lane] === 1);
  const [first] = unique;
  if (first === undefined) return { ok: false, reason: 'No lane of this board is named.' };
  let reason = '';
  for (const saying of sayings(writer, unique)) {
    const written = writeSaying(writer, saying);
    if (written.ok) return written;
    reason ||= written.reason;
  }
  const what = unique.length === 1 ? index.laneWords(first) : `${unique.length} lanes at once`;
  return { ok: false, reason: sentenceCase(`This code cannot say ${what}: ${reason}.`) };
}
