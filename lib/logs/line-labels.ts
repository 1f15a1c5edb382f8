import { codeOf, separator } from './numbers';

/** A word that says what the number after it is. */
export interface Label {
  readonly codes: readonly number[];
  readonly hash: number;
  /** What the number after it is; the numbers are those of the reader. */
  readonly role: number;
}

/** Makes a label ready. */
export function labelOf(word: string, role: number): Label {
  const codes = Array.from(word, (letter) => codeOf[letter.charCodeAt(0)] ?? separator);
  return { codes, hash: codes.reduce((hash, code) => (Math.imul(hash, 37) + code) | 0, 0), role };
}

/** Words that join the two ends of a run. */
export const joiningWords = ['to', 'thru', 'through', 'until'].map((word) => labelOf(word, 0));
/** Words before the distance of the addresses of a run. */
export const stepWords = ['step', 'every'].map((word) => labelOf(word, 0));

/** Whether the word at a place begins with the letters of a label. */
export function isLabel(bytes: Uint8Array, from: number, { codes }: Label): boolean {
  for (let n = 0; n < codes.length; n++) if (codeOf[bytes[from + n]!] !== codes[n]) return false;
  return true;
}

/** A hyphen, a tilde, two dots, or a dash of UTF-8. */
export function hasDash(bytes: Uint8Array, from: number, to: number): boolean {
  for (let p = from; p < to; p++) {
    const byte = bytes[p]!;
    if (byte === 0x2d || byte === 0x7e) return true;
    if (byte === 0x2e && bytes[p + 1] === 0x2e) return true;
    if (byte === 0xe2 && bytes[p + 1] === 0x80 && bytes[p + 2]! >= 0x90 && bytes[p + 2]! <= 0x95) return true;
  }
  return false;
}

/** Digits after a label that touches them: with a decimal digit among them, or one letter several times, as FF. */
export function looksLikeNumber(bytes: Uint8Array, from: number, to: number): boolean {
  let same = to - from > 1;
  for (let p = from; p < to; p++) {
    if (codeOf[bytes[p]!]! < 10) return true;
    if (codeOf[bytes[p]!] !== codeOf[bytes[from]!]) same = false;
  }
  return same;
}
