import { highestSyndrome } from '../ecc/code';
import { decodeSpan } from '../place/address';
import type { Convention } from './conventions';
import { type FieldPart, type FormatContext, bitsOfField } from './format-context';
import { type FieldText, countsOrNames, fieldTexts } from './field-texts';
import type { LaneSet } from './lane-set';
import { digitsOfOnes, numberOf, onesOf } from './numerals';

/** A field with all that can be typed into it. */
export interface TypedField {
  readonly part: FieldPart;
  readonly texts: readonly FieldText[];
  /** Digits at least and at most, as the keypad takes them. */
  readonly width: { readonly min: number; readonly max: number };
  /** Lanes that a field still names: with the text as it is, or with at least one more character after it. */
  readonly lanes: (text: string, state: 'whole' | 'more') => LaneSet | null;
}

interface Setting {
  readonly context: FormatContext;
  readonly conventions: readonly Convention[];
  readonly part: FieldPart;
}

function widthOf({ context, part }: Setting, texts: readonly FieldText[]): TypedField['width'] {
  if (part.field.digits !== undefined) return part.field.digits;
  const { radix } = part;
  if (countsOrNames(part)) return { min: 1, max: Math.max(1, ...texts.map(({ text }) => text.length)) };
  const { digits, windows } = context.index.document.addressMap;
  if (part.field.field === 'address') {
    const top = Math.max(0, ...windows.map(({ range }) => Math.floor(range.to / 2 ** part.field.shift)));
    return { min: 1, max: Math.max(digits ?? 1, top.toString(radix ?? 16).length) };
  }
  if (part.field.code !== undefined)
    return { min: 1, max: highestSyndrome(part.field.code).toString(radix ?? 16).length };
  const shown = bitsOfField(context, part, null).length;
  return {
    min: 1,
    max: digitsOfOnes(
      Array.from({ length: shown }, (_, n) => n),
      radix ?? 2,
    ).length,
  };
}

/** Whether a listed text, with zeros before it where it is a number, is the typed text or goes on from it. */
function fits(
  { text, padded }: FieldText,
  typed: string,
  { width, state }: { width: TypedField['width']; state: 'whole' | 'more' },
): boolean {
  if (!padded) return state === 'whole' ? text === typed : text.length > typed.length && text.startsWith(typed);
  const shortest = Math.max(text.length, width.min);
  if (state === 'whole')
    return (
      typed.length >= shortest &&
      typed.length <= width.max &&
      text === typed.slice(-text.length) &&
      /^0*$/.test(typed.slice(0, -text.length))
    );
  for (let length = Math.max(shortest, typed.length + 1); length <= width.max; length++) {
    if (text.padStart(length, '0').startsWith(typed)) return true;
  }
  return false;
}

function setOf(context: FormatContext, { lanes, speaks }: { lanes: Iterable<number>; speaks: boolean }): LaneSet {
  const has = new Uint8Array(context.index.laneCount);
  for (const at of lanes) has[at] = 1;
  return { has, speaks };
}

function listedLanes(
  { context }: Setting,
  texts: readonly FieldText[],
  fitting: (text: FieldText) => boolean,
): LaneSet {
  const found = texts.filter(fitting);
  return setOf(context, {
    lanes: found.flatMap(({ lanes }) => lanes),
    speaks: found.some(({ speaks }) => speaks),
  });
}

function lanesOfBits({ context }: Setting, bits: ReadonlySet<number>): number[] {
  return Array.from(context.index.lanes).filter((at) => bits.has(at % context.index.bitCount));
}

/** How many digits can follow a number of which some are typed. */
function more(typed: string, { min, max }: TypedField['width'], state: 'whole' | 'more'): [from: number, to: number] {
  if (state === 'whole') return typed.length >= min && typed.length <= max ? [0, 0] : [0, -1];
  return [Math.max(1, min - typed.length), max - typed.length];
}

function maskLanes(setting: Setting, typed: string, [from, to]: [number, number]): number[] {
  const { context, conventions, part } = setting;
  const radix = part.radix ?? 2;
  const bits = bitsOfField(context, part, null);
  const named = new Set<number>();
  const perDigit = Math.log2(radix);
  for (let after = from; after <= to; after++) {
    if (!Number.isInteger(perDigit) && after > 0) return Array.from(context.index.lanes);
    const known = onesOf(typed === '' ? '0' : typed, radix).map((place) => place + after * perDigit);
    if (known.some((place) => place >= bits.length)) continue;
    const open = Array.from({ length: Math.min(bits.length, after * perDigit) }, (_, place) => place);
    for (const convention of conventions) {
      for (const place of [...known, ...open])
        named.add(bits[convention.highFirst(part) ? bits.length - 1 - place : place]!);
    }
  }
  return lanesOfBits(setting, named);
}

function addressLanes({ context, part }: Setting, typed: string, [from, to]: [number, number]): LaneSet {
  const { index, map } = context;
  const lanes: number[] = [];
  let speaks = false;
  for (let after = from; after <= to; after++) {
    const size = 2 ** part.field.shift * (part.radix ?? 16) ** after;
    const start = numberOf(typed, part.radix ?? 16) * size;
    const end = start + size - 1;
    for (const { bank } of decodeSpan(map, start, end))
      for (let bit = 0; bit < index.bitCount; bit++) lanes.push(bank * index.bitCount + bit);
    speaks ||= index.document.addressMap.elsewhere.some(({ range }) => range.from <= end && range.to >= start);
  }
  return setOf(context, { lanes: lanes.filter((at) => index.laneExists[at] === 1), speaks });
}

function syndromeLanes(setting: Setting, typed: string, [from, to]: [number, number]): LaneSet {
  const { context, part } = setting;
  const { code } = part.field;
  if (code === undefined) return setOf(context, { lanes: [], speaks: false });
  const radix = part.radix ?? 16;
  const bits = bitsOfField(context, part, null);
  const named = new Set<number>();
  let speaks = false;
  for (let after = from; after <= to; after++) {
    const size = radix ** after;
    const start = numberOf(typed, radix) * size;
    const end = Math.min(start + size - 1, highestSyndrome(code));
    const columns = code.columns.filter((column) => column >= start && column <= end);
    for (const [at, column] of code.columns.entries()) if (column >= start && column <= end) named.add(bits[at]!);
    // What is no bit's syndrome still says something: no error, or too many.
    speaks ||= end - start + 1 > new Set(columns).size;
  }
  return setOf(context, { lanes: lanesOfBits(setting, named), speaks });
}

/** A mask that shows one byte of a wider word: which byte only the address tells. */
function dependsOnAddress({ context, part }: Setting): boolean {
  return (
    part.field.bits === undefined &&
    context.index.document.addressMap.windows.some((window) => (window.lanes?.length ?? 1) > 1)
  );
}

function union(a: LaneSet, b: LaneSet): LaneSet {
  return { has: a.has.map((value, at) => value | b.has[at]!), speaks: a.speaks || b.speaks };
}

function digitLanes(setting: Setting, typed: string, range: [number, number]): LaneSet | null {
  const { context, part } = setting;
  switch (part.field.field) {
    case 'mask':
      return dependsOnAddress(setting)
        ? null
        : setOf(context, { lanes: maskLanes(setting, typed, range), speaks: false });
    case 'address':
      return context.map.windows.length === 0 ? null : addressLanes(setting, typed, range);
    case 'syndrome':
      return syndromeLanes(setting, typed, range);
    case 'written':
    case 'read':
    case 'count':
    case 'ignored':
      return null;
    default:
      return setOf(context, { lanes: [], speaks: false });
  }
}

/** Prepares a field for the keypad. */
export function buildTypedField(setting: Setting): TypedField {
  const texts = fieldTexts(setting.context, setting.part, setting.conventions);
  const width = widthOf(setting, texts);
  const lanes = (typed: string, state: 'whole' | 'more'): LaneSet | null => {
    const listed = listedLanes(setting, texts, (text) => fits(text, typed, { width, state }));
    if (countsOrNames(setting.part)) return listed;
    const isListed = state === 'whole' && setting.part.table.has(typed);
    const range = more(typed, width, state);
    const possible = !isListed && setting.part.radix !== null && range[0] <= range[1];
    if (setting.part.free) return null;
    if (!possible) return listed;
    const digits = digitLanes(setting, typed, range);
    return digits === null ? null : union(listed, digits);
  };
  return { part: setting.part, texts, width, lanes };
}
