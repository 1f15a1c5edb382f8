import { createHash } from 'node:crypto';
import { limits } from '@/shared/limits';

interface BoardName {
  readonly maker: string;
  readonly name: string;
  readonly revision: string;
}

/** Letters that do not come apart into a plain letter and an accent. */
const plainLetters: Readonly<Record<string, string>> = {
  ß: 'ss',
  æ: 'ae',
  œ: 'oe',
  ø: 'o',
  ł: 'l',
  đ: 'd',
  ð: 'd',
  þ: 'th',
  ı: 'i',
};

const plain = (text: string): string =>
  text
    .normalize('NFKD')
    .replace(/\p{M}+/gu, '')
    .toLowerCase()
    .replace(/[ßæœøłđðþı]/g, (letter) => plainLetters[letter] ?? letter);

const partsOf = (text: string): string[] => text.split(/[^\p{L}\p{N}]+/u).filter((part) => part !== '');

/** Longest word that is kept for the search. */
const longestWord = 60;

const shorten = (word: string): string => [...word].slice(0, longestWord).join('');

/** The words of what somebody looks for: small letters and digits, without accents; "T-64" is "t" and "64". */
export const askedWords = (text: string): string[] => [...new Set(partsOf(plain(text)).map(shorten))].slice(0, 8);

/** The words by which a text is found: those of askedWords, and hyphenated ones also in one piece ("t64"). */
export const foundByWords = (texts: readonly string[]): string[] => {
  const words = texts.flatMap((text) =>
    plain(text)
      .split(/\s+/)
      .flatMap((chunk) => {
        const parts = partsOf(chunk);
        return parts.length > 1 ? [...parts, parts.join('')] : parts;
      }),
  );
  return [...new Set(words.map(shorten))];
};

/** One key a board: maker, name and revision without regard to case, accents and signs between words. SHA-256. */
export const boardKeyOf = ({ maker, name, revision }: BoardName): string =>
  createHash('sha256')
    .update([maker, name, revision].map((text) => partsOf(plain(text)).join(' ') || text.trim()).join('\n'))
    .digest('hex');

/** What the library is sorted by: maker, name, revision, with T-8 before T-64. */
export const sortKeyOf = ({ maker, name, revision }: BoardName): string =>
  [maker, name, revision]
    .map((text) => partsOf(plain(text)).join(' '))
    .join('\t')
    .replace(/\d+/g, (digits) => digits.padStart(6, '0'))
    .slice(0, 400);

/**
 * The address of a board that is new: maker, name and revision in a-z, 0-9 and dashes. `taken` says which ones
 * are in use; a number is put behind until one is free.
 */
export const slugOf = ({ maker, name, revision }: BoardName, taken: ReadonlySet<string>): string => {
  const ascii = plain(`${maker} ${name} ${revision}`).replace(/[^a-z0-9]+/g, '-');
  const base = ascii.slice(0, limits.slug - 8).replace(/^-+|-+$/g, '') || 'board';
  for (let number = 1; ; number++) {
    const slug = number === 1 ? base : `${base}-${number}`;
    if (!taken.has(slug)) return slug;
  }
};
