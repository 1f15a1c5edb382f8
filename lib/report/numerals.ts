import type { FormatField } from '@/shared';

type Notation = FormatField['notation'];

const allDigits = '0123456789ABCDEF';

/** Base of the notations that are digits; null for the others. */
export function radixOf(notation: Notation): number | null {
  switch (notation) {
    case 'hexadecimal':
      return 16;
    case 'octal':
      return 8;
    case 'binary':
    case 'one-hot':
      return 2;
    case 'decimal':
    case 'flashes':
      return 10;
    case 'letter':
    case 'names':
    case 'words':
      return null;
  }
}

/** The digits of a base from 2 to 16. */
export function digitsOf(radix: number): string {
  return allDigits.slice(0, radix);
}

/** The number that digits mean; beyond 2^53 only near it, which is beyond every limit of a layout anyway. */
export function numberOf(text: string, radix: number): number {
  let sum = 0;
  for (let at = 0; at < text.length; at++) sum = sum * radix + allDigits.indexOf(text[at]!);
  return sum;
}

/** Places of the ones of a number, lowest first, exact at any length. */
export function onesOf(text: string, radix: number): number[] {
  const ones: number[] = [];
  const perDigit = Math.log2(radix);
  if (Number.isInteger(perDigit)) {
    for (let at = text.length - 1; at >= 0; at--) {
      const digit = allDigits.indexOf(text[at]!);
      const base = (text.length - 1 - at) * perDigit;
      for (let n = 0; n < perDigit; n++) if (((digit >> n) & 1) === 1) ones.push(base + n);
    }
    return ones;
  }
  return onesOfNumber(BigInt(text));
}

/** Places of the ones of a whole number of at least 0. */
export function onesOfNumber(value: number | bigint): number[] {
  const ones: number[] = [];
  let rest = BigInt(value);
  for (let place = 0; rest > 0n; place++, rest >>= 1n) if ((rest & 1n) === 1n) ones.push(place);
  return ones;
}

/** Digits of a number given by the places of its ones. */
export function digitsOfOnes(ones: readonly number[], radix: number): string {
  return ones
    .reduce((sum, place) => sum | (1n << BigInt(place)), 0n)
    .toString(radix)
    .toUpperCase();
}

/** A, B ... Z, AA, AB ...: 0 is A. */
export function lettersOf(n: number): string {
  return n < 26 ? String.fromCharCode(65 + n) : lettersOf(Math.floor(n / 26) - 1) + lettersOf(n % 26);
}

/** What letters count, A as 0. */
export function numberOfLetters(text: string): number {
  return [...text].reduce((sum, letter) => sum * 26 + letter.charCodeAt(0) - 64, 0) - 1;
}
