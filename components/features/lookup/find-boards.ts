import type { LayoutCard } from '@/shared/api/layouts';

/** A board of which one or several revisions are known. */
export interface BoardFamily {
  readonly key: string;
  readonly maker: string;
  readonly name: string;
  /** At least one, in the order of their revision. */
  readonly revisions: readonly LayoutCard[];
}

const plain = (text: string) => text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();

const wordsOf = (text: string) =>
  plain(text)
    .split(/[^\p{L}\p{N}]+/u)
    .filter((word) => word !== '');

/** Whether each word of a search begins a word of the board; the same rule as the server's. */
export function fits(card: LayoutCard, search: string): boolean {
  const has = wordsOf(`${card.maker} ${card.name} ${card.revision}`);
  return wordsOf(search).every((wanted) => has.some((word) => word.startsWith(wanted)));
}

/** Rows of a list with revisions of one board drawn together. Keeps the order in which the boards come. */
export function byBoard(cards: readonly LayoutCard[]): BoardFamily[] {
  const families = new Map<string, LayoutCard[]>();
  const seen = new Set<string>();
  for (const card of cards) {
    if (seen.has(card.slug)) continue;
    seen.add(card.slug);
    const key = plain(`${card.maker}\n${card.name}`);
    families.set(key, [...(families.get(key) ?? []), card]);
  }
  return [...families].map(([key, revisions]) => ({
    key,
    maker: revisions[0]?.maker ?? '',
    name: revisions[0]?.name ?? '',
    revisions: revisions.sort((a, b) => a.revision.localeCompare(b.revision, 'en', { numeric: true })),
  }));
}

/** "controller, 1981; 4 banks of 8 bits, 32 sockets": what a board is, under its name. */
export function boardFacts({ kind, year, banks, dataBits, sockets }: LayoutCard): string {
  const what = kind === 'other' ? 'board' : kind;
  const array = `${banks} ${banks === 1 ? 'bank' : 'banks'} of ${dataBits} ${dataBits === 1 ? 'bit' : 'bits'}`;
  return `${what}${year === null ? '' : `, ${year}`}; ${array}, ${sockets} sockets`;
}
