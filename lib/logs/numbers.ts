/**
 * Numbers in the bytes of a log. A value has up to 96 bits, in three limbs of 32 bits, the lowest first, so that
 * words of 72 bits need no strings.
 */
export const limbs = 3;

/** What a byte counts as: 0 to 35 for digits and letters of either case, 36 for the underscore, this for the rest. */
export const separator = 255;

export const codeOf: Uint8Array = (() => {
  const codes = new Uint8Array(256).fill(separator);
  for (let n = 0; n < 10; n++) codes[48 + n] = n;
  for (let n = 0; n < 26; n++) codes[65 + n] = codes[97 + n] = 10 + n;
  codes[95] = 36;
  return codes;
})();

const bitsPerDigit: Readonly<Record<number, number>> = { 2: 1, 8: 3, 16: 4 };
const [letterH, letterO, letterQ, letterX] = [17, 24, 26, 33];

function clear(into: Int32Array, at: number) {
  into[at] = into[at + 1] = into[at + 2] = 0;
}

/** Digits of a base that is a power of two. False where they need more than 96 bits. */
function readBits(
  bytes: Uint8Array,
  [from, to]: [number, number],
  into: { limbs: Int32Array; at: number; bits: number },
) {
  let place = 0;
  for (let p = to - 1; p >= from; p--, place += into.bits) {
    const digit = codeOf[bytes[p]!]!;
    if (digit >> into.bits !== 0) return false;
    if (digit === 0) continue;
    if (place + 32 - Math.clz32(digit) > limbs * 32) return false;
    const limb = into.at + (place >> 5);
    into.limbs[limb]! |= digit << (place & 31);
    const spill = (place & 31) + into.bits - 32;
    if (spill > 0 && limb + 1 < into.at + limbs) into.limbs[limb + 1]! |= digit >> (into.bits - spill);
  }
  return true;
}

function readDecimal(bytes: Uint8Array, [from, to]: [number, number], into: { limbs: Int32Array; at: number }) {
  let value = 0;
  for (let p = from; p < to; p++) {
    const digit = codeOf[bytes[p]!]!;
    if (digit > 9) return false;
    value = value * 10 + digit;
    if (value > Number.MAX_SAFE_INTEGER) return false;
  }
  into.limbs[into.at] = value | 0;
  into.limbs[into.at + 1] = Math.floor(value / 2 ** 32) | 0;
  return true;
}

/** A span of bytes, both ends as usual: the first in, the last out. */
export interface Span {
  readonly bytes: Uint8Array;
  readonly from: number;
  readonly to: number;
}

/**
 * Reads a number in a base, with the marks that say another base: 0x1A, 1Ah, 377q, 377o. Writes its limbs and tells
 * how many digits it had; 0 where the span is no number of that base or has more than 96 bits.
 */
export function readNumber({ bytes, from, to }: Span, radix: number, into: { limbs: Int32Array; at: number }): number {
  let [first, last, base] = [from, to, radix];
  const end = codeOf[bytes[to - 1]!]!;
  if (to - from > 2 && codeOf[bytes[from]!] === 0 && codeOf[bytes[from + 1]!] === letterX)
    [first, base] = [from + 2, 16];
  else if (to - from > 1 && end === letterH) [last, base] = [to - 1, 16];
  else if (to - from > 1 && (end === letterQ || end === letterO)) [last, base] = [to - 1, 8];
  clear(into.limbs, into.at);
  if (last <= first) return 0;
  const bits = bitsPerDigit[base];
  const read =
    bits === undefined ? readDecimal(bytes, [first, last], into) : readBits(bytes, [first, last], { ...into, bits });
  return read ? last - first : 0;
}

/** The number in the limbs; Infinity from 2^53 up. */
export function numberOfLimbs(from: Int32Array, at: number): number {
  const value = (from[at]! >>> 0) + (from[at + 1]! >>> 0) * 2 ** 32;
  return from[at + 2] !== 0 || value > Number.MAX_SAFE_INTEGER ? Infinity : value;
}

/** A text as bytes; what is not ASCII becomes a byte that separates words, one for each unit of the text. */
export function bytesOfText(text: string): Uint8Array {
  const bytes = new Uint8Array(text.length);
  for (let at = 0; at < text.length; at++) {
    const code = text.charCodeAt(at);
    bytes[at] = code < 128 ? code : code >= 0x2010 && code <= 0x2015 ? 45 : code === 0x2026 ? 46 : 0x80;
  }
  return bytes;
}
