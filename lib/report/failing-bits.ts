import { classifySyndrome } from '../ecc/code';
import { bitName } from '../layout/words';
import type { SpanPlace } from '../place/address';
import type { Convention } from './conventions';
import { type FieldPart, type FormatContext, bitsOfField } from './format-context';
import type { FieldMatch, Match } from './match-types';
import type { FailingLane } from './meaning';
import { numberOf, onesOfNumber } from './numerals';
import type { FailingBits, Refusal } from './outcome';
import { maskReason, numberReason, oneHotReason, syndromeReason } from './reasons';
import { countOf, placesOf } from './values';

interface Setting {
  readonly convention: Convention;
  readonly place: SpanPlace | null;
}

interface Word {
  readonly ones: ReadonlySet<number>;
  /** The bits shown, the one at the lowest place first. */
  readonly shows: readonly number[];
  readonly at: number;
}

/** A field's list of bits, the one at the end that the convention calls low first. */
function fromLow(listed: readonly number[], part: FieldPart, convention: Convention): readonly number[] {
  return convention.highFirst(part) ? [...listed].reverse() : listed;
}

function wordOfField(context: FormatContext, match: FieldMatch, { convention, place }: Setting): Word | Refusal {
  const bits = fromLow(bitsOfField(context, match.part, place), match.part, convention);
  const places = placesOf(match);
  if (match.part.field.notation === 'one-hot' && places.length !== 1)
    return { reason: oneHotReason(match.text), at: match.start };
  const ones = new Set<number>();
  for (const one of places) {
    const bit = bits[one];
    if (bit === undefined) return { reason: maskReason(match, bits.length), at: match.start };
    ones.add(bit);
  }
  return { ones, shows: bits, at: match.start };
}

/** The word that all fields of one meaning show between them; null where there is none. */
function wordOf(
  context: FormatContext,
  { match, name }: { match: Match; name: FieldPart['field']['field'] },
  setting: Setting,
): Word | Refusal | null {
  const fields = match.fields.filter(
    ({ part, entry }) => part.field.field === name && (entry === null || entry.value !== undefined),
  );
  if (fields.length === 0) return null;
  const words = fields.map((field) => wordOfField(context, field, setting));
  const refusal = words.find((word) => 'reason' in word);
  if (refusal !== undefined) return refusal;
  const fine = words.filter((word): word is Word => !('reason' in word));
  return {
    ones: new Set(fine.flatMap(({ ones }) => [...ones])),
    shows: fine.flatMap(({ shows }) => shows),
    at: fine[0]!.at,
  };
}

/** What the test wrote where the format says so once for all, laid out as the given word is. */
function constantWord({ format }: FormatContext, like: Word): Word | null {
  if (format.written === undefined) return null;
  const { shows, at } = like;
  return { ones: new Set(onesOfNumber(format.written).flatMap((place) => shows[place] ?? [])), shows, at };
}

function readsOf(bit: number, written: Word | null, read: Word | null): FailingLane['reads'] {
  if (read !== null) return read.ones.has(bit) ? 'one' : 'zero';
  if (written !== null && written.shows.includes(bit)) return written.ones.has(bit) ? 'zero' : 'one';
  return 'unknown';
}

function fromTable(match: Match): FailingBits | null {
  const named = match.fields.find(({ entry }) => entry?.bits !== undefined);
  const bits = named?.entry?.bits;
  return named === undefined || bits === undefined || bits.length === 0
    ? null
    : { failing: bits.map((bit) => ({ bit, reads: 'unknown' })), shown: null, at: named.start };
}

function fromBitField(context: FormatContext, match: Match, { convention }: Setting): FailingBits | Refusal | null {
  const field = match.fields.find(
    ({ part, entry }) => part.field.field === 'bit' && (entry === null || entry.value !== undefined),
  );
  if (field === undefined) return null;
  const { part, start, text } = field;
  if (part.field.notation === 'names' && field.entry === null) {
    const bit = context.allBits.find((n) => bitName(context.index.document.memory, n) === text) ?? 0;
    return { failing: [{ bit, reads: 'unknown' }], shown: null, at: start };
  }
  const bits = part.field.bits ?? context.dataBits;
  const count = countOf(field, convention);
  if (typeof count === 'string') return { reason: count, at: start };
  const bit = fromLow(bits, part, convention)[count];
  if (bit === undefined) return { reason: numberReason(context, field, bits.length), at: start };
  return { failing: [{ bit, reads: 'unknown' }], shown: null, at: start };
}

function valueOf({ ones }: Word): number {
  let value = 0;
  for (const bit of ones) if (bit < 40) value += 2 ** bit;
  return value;
}

function differing(written: Word, read: Word): number[] {
  return read.shows.filter((bit) => written.shows.includes(bit) && written.ones.has(bit) !== read.ones.has(bit));
}

function fromWords(context: FormatContext, match: Match, setting: Setting): FailingBits | Refusal | null {
  const mask = wordOf(context, { match, name: 'mask' }, setting);
  if (mask !== null && 'reason' in mask) return mask;
  const read = wordOf(context, { match, name: 'read' }, setting);
  if (read !== null && 'reason' in read) return read;
  const told = wordOf(context, { match, name: 'written' }, setting);
  if (told !== null && 'reason' in told) return told;
  const like = mask ?? read;
  const written = told ?? (like === null ? null : constantWord(context, like));

  if (mask !== null) {
    if (mask.ones.size === 0) return { reason: 'The mask names no bit: nothing failed in it.', at: mask.at };
    if (read !== null && told !== null && differing(told, read).some((bit) => !mask.ones.has(bit))) {
      return { reason: 'The mask is not what was written against what was read.', at: mask.at };
    }
    return {
      failing: [...mask.ones].map((bit) => ({ bit, reads: readsOf(bit, written, read) })),
      shown: mask.shows,
      at: mask.at,
    };
  }
  if (read === null || written === null) return null;
  const failing = differing(written, read);
  // A word that read what was written is no failure, but it tells a test of both values from one of one value.
  if (failing.length === 0 && told === null) {
    return { reason: 'What was read is what was written: nothing failed here.', at: read.at };
  }
  return {
    ...(told === null ? {} : { values: { written: valueOf(told), read: valueOf(read) } }),
    failing: failing.map((bit) => ({ bit, reads: readsOf(bit, written, read) })),
    shown: read.shows,
    at: read.at,
  };
}

function fromSyndrome(context: FormatContext, match: Match): FailingBits | Refusal | null {
  const field = match.fields.find(({ part, entry }) => part.field.code !== undefined && entry === null);
  const code = field?.part.field.code;
  if (field === undefined || code === undefined || field.part.radix === null) return null;
  const { part, text, start } = field;
  const bits = bitsOfField(context, part, null);
  const meaning = classifySyndrome(code, numberOf(text, part.radix ?? 16));
  if (meaning.kind === 'single' || meaning.kind === 'check-bit')
    return {
      failing: [{ bit: bits[meaning.bit]!, reads: 'unknown' }],
      // Only where two wrong bits would have shown as two are the others known to be right.
      shown: code.kind === 'sec-ded' ? bits : null,
      at: start,
    };
  return { reason: syndromeReason(field, meaning.kind), at: start, known: meaning.kind !== 'out-of-range' };
}

/**
 * The failing bits that a code names, from its table, a mask, what was written and read, the number of a bit or a
 * syndrome.
 */
export function failingBits(context: FormatContext, match: Match, setting: Setting): FailingBits | Refusal {
  return (
    fromTable(match) ??
    fromWords(context, match, setting) ??
    fromBitField(context, match, setting) ??
    fromSyndrome(context, match) ?? { failing: null, shown: null, at: 0 }
  );
}
