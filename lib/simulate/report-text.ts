import type { FormatField, ReportFormat } from '@/shared';
import type { CpuPlace } from './addresses';
import type { Wiring } from './wiring';

/** What the machine has to say: the failing bits of one word, bank or chip. */
export interface Saying {
  readonly bank: number;
  /** Failing bits, ascending. */
  readonly bits: readonly number[];
  /** Where it was, for formats with an address. */
  readonly place: CpuPlace | null;
  /** What was written into a bit of the word; 0 where nobody knows. */
  readonly written: (bit: number) => 0 | 1;
}

interface Speaker extends Saying {
  readonly wiring: Wiring;
  readonly format: ReportFormat;
}

/** What a field of the format would show; null where it cannot say it. */
type Said = string | null;

const radixOf: Partial<Record<FormatField['notation'], number>> = {
  decimal: 10,
  flashes: 10,
  hexadecimal: 16,
  octal: 8,
  binary: 2,
  'one-hot': 2,
};

/**
 * The text that a machine shows in one of its formats, or null where the format cannot say it. Conventions that the
 * layout leaves open are taken as counted from 0 with bit 0 lowest.
 */
export function reportText(wiring: Wiring, format: ReportFormat, saying: Saying): string | null {
  const speaker: Speaker = { ...saying, wiring, format };
  let text = '';
  for (const part of format.parts) {
    const said: Said = 'field' in part ? field(speaker, part) : part.text;
    if (said === null) return null;
    text += said;
  }
  return text;
}

function field(speaker: Speaker, part: FormatField): Said {
  const { bank, bits, wiring } = speaker;
  const same = part.table.find(
    (entry) =>
      entry.bits?.length === bits.length &&
      bits.every((bit) => entry.bits?.includes(bit)) &&
      (entry.bank === undefined || entry.bank === wiring.banks[bank]),
  );
  if (same) return same.text;
  switch (part.field) {
    case 'bank': {
      const listed = part.table.find((entry) => entry.bank === wiring.banks[bank] && entry.bits === undefined);
      if (listed) return listed.text;
      return part.notation === 'names' ? (wiring.banks[bank] ?? null) : counted(part, bank, wiring.banks.length);
    }
    case 'bit':
      return oneBit(speaker, part);
    case 'lane': {
      const domain = countedBits(speaker, part);
      const place = placeOf(part, domain, bits[0] ?? -1);
      if (bits.length !== 1 || place < 0) return null;
      const count = part.order === 'bit-first' ? place * wiring.banks.length + bank : bank * domain.length + place;
      return counted(part, count, wiring.banks.length * domain.length);
    }
    case 'socket': {
      const sockets = bits.map(
        (bit) =>
          new Set((wiring.portsOfLane.get(bank * wiring.bits + bit) ?? []).map((at) => wiring.ports[at]?.position)),
      );
      const common = [...(sockets[0] ?? [])].find((position) => sockets.every((set) => set.has(position)));
      return common === undefined ? null : (wiring.labels[common] ?? null);
    }
    case 'address':
      return address(speaker, part);
    case 'mask':
    case 'read':
    case 'written':
      return word(speaker, part);
    case 'count':
      return '1'.padStart(part.digits?.min ?? 1, '0');
    case 'syndrome':
      return syndrome(speaker, part);
    case 'ignored':
      return part.table[0]?.text ?? '0'.repeat(part.digits?.min ?? 1);
  }
}

/** What the check equations of the machine's own code say of the failing bits, one equation after the other. */
function syndrome({ bits, wiring }: Speaker, part: FormatField): Said {
  const radix = radixOf[part.notation];
  if (part.code === undefined || radix === undefined) return null;
  const { columns } = part.code;
  const covered = part.bits ?? Array.from({ length: wiring.bits }, (_, bit) => bit);
  if (!bits.every((bit) => covered.includes(bit))) return null;
  let value = 0;
  for (let row = 1; columns.some((column) => column >= row); row *= 2) {
    const wrong = bits.filter((bit) => Math.floor((columns[covered.indexOf(bit)] ?? 0) / row) % 2 === 1);
    if (wrong.length % 2 === 1) value += row;
  }
  const highest = Math.max(...columns).toString(radix).length;
  const text = fitted(part, value.toString(radix).toUpperCase(), radix === 10 ? 1 : highest);
  return text !== null && part.table.some((entry) => entry.text === text) ? null : text;
}

/** Bits that a field counts where it does not say: those that are no check bits. */
function countedBits({ wiring }: Speaker, part: FormatField): number[] {
  const { checkBits, dataBits } = wiring.document.memory;
  return part.bits ?? Array.from({ length: dataBits }, (_, bit) => bit).filter((bit) => !checkBits.includes(bit));
}

function placeOf(part: FormatField, domain: readonly number[], bit: number): number {
  const at = domain.indexOf(bit);
  return at < 0 || part.bitOrder !== 'high-first' ? at : domain.length - 1 - at;
}

const first = ({ first: number }: FormatField): number => (number === 1 ? 1 : 0);

function counted(part: FormatField, count: number, width: number): Said {
  const value = count + first(part);
  const listed = part.table.find((entry) => entry.value === value);
  if (listed) return listed.text;
  if (part.notation === 'letter') return letters(count);
  const radix = radixOf[part.notation];
  if (radix === undefined) return null;
  if (part.notation === 'one-hot') return fitted(part, (2n ** BigInt(count)).toString(2), width);
  const text = fitted(part, value.toString(radix).toUpperCase(), 1);
  return text !== null && part.table.some((entry) => entry.text === text) ? null : text;
}

/** A, B, ... Z, AA, AB, as columns of a sheet are lettered. */
function letters(count: number): string {
  const before = Math.floor(count / 26);
  return (before === 0 ? '' : letters(before - 1)) + String.fromCharCode(65 + (count % 26));
}

function fitted(part: FormatField, digits: string, usual: number): Said {
  const text = digits.padStart(part.digits?.min ?? usual, '0');
  return part.digits && text.length > part.digits.max ? null : text;
}

function oneBit(speaker: Speaker, part: FormatField): Said {
  const [bit] = speaker.bits;
  if (bit === undefined || speaker.bits.length > 1) return null;
  if (part.notation === 'names') return speaker.wiring.document.memory.bitNames?.[bit] ?? String(bit);
  const domain = countedBits(speaker, part);
  const place = placeOf(part, domain, bit);
  return place < 0 ? null : counted(part, place, domain.length);
}

/** The bits of the word that a field shows, lowest first. */
function shownBits(speaker: Speaker, part: FormatField): number[] {
  if (part.bits) return part.bits;
  if (speaker.place) return [...speaker.place.bits].filter((bit) => fits(speaker, part, bit));
  return countedBits(speaker, part).length === speaker.wiring.bits || !wideEnough(speaker, part)
    ? countedBits(speaker, part)
    : Array.from({ length: speaker.wiring.bits }, (_, bit) => bit);
}

/** Check bits are in a value only where it has digits for them. */
function fits(speaker: Speaker, part: FormatField, bit: number): boolean {
  return !speaker.wiring.document.memory.checkBits.includes(bit) || wideEnough(speaker, part);
}

function wideEnough(speaker: Speaker, part: FormatField): boolean {
  const width = speaker.place?.bits.length ?? speaker.wiring.bits;
  const perDigit = Math.log2(radixOf[part.notation] ?? 2);
  return part.digits !== undefined && part.digits.max * perDigit >= width;
}

function word(speaker: Speaker, part: FormatField): Said {
  const shown = shownBits(speaker, part);
  if (part.field !== 'written' && speaker.bits.some((bit) => !shown.includes(bit))) return null;
  if (part.notation === 'one-hot' && speaker.bits.length > 1) return null;
  const { written: constant } = speaker.format;
  let value = 0n;
  for (const bit of shown) {
    const place = placeOf(part, shown, bit);
    const before =
      part.field === 'mask' ? 0 : constant === undefined ? speaker.written(bit) : Math.floor(constant / 2 ** place) % 2;
    const flipped = part.field !== 'written' && speaker.bits.includes(bit) ? 1 : 0;
    if (before !== flipped) value += 2n ** BigInt(place);
  }
  const radix = radixOf[part.notation] ?? 2;
  const all = 2n ** BigInt(shown.length) - 1n;
  return fitted(part, value.toString(radix).toUpperCase(), radix === 10 ? 1 : all.toString(radix).length);
}

function address({ wiring, place }: Speaker, part: FormatField): Said {
  if (place === null) return null;
  const { digits, windows } = wiring.document.addressMap;
  const size = 2 ** part.shift;
  const radix = radixOf[part.notation] ?? 16;
  const top = Math.floor(Math.max(0, ...windows.map(({ range }) => range.to)) / size);
  const usual = part.shift === 0 && digits !== undefined ? digits : radix === 10 ? 1 : top.toString(radix).length;
  return fitted(
    part,
    Math.floor(place.address / size)
      .toString(radix)
      .toUpperCase(),
    usual,
  );
}
