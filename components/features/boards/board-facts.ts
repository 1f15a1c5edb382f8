import { findFamily } from '@/lib/chips/families';
import { bankWords, listWords } from '@/lib/layout/words';
import type { LayoutDocument } from '@/shared';

type Rail = LayoutDocument['rails'][number];

const plural = (count: number, one: string) => `${count} ${one}${count === 1 ? '' : 's'}`;

/** "16K", "1M", "300": a number of words as the trade writes it. */
export function wordsCount(words: number): string {
  if (words % 2 ** 20 === 0) return `${words / 2 ** 20}M`;
  return words % 1024 === 0 ? `${words / 1024}K` : String(words);
}

/** "4 banks of 16K words, 18 bits (2 check bits)": the array in one line. */
export function arrayWords({ memory }: LayoutDocument): string {
  const sizes = [...new Set(memory.banks.map(({ words }) => words))];
  const of = sizes.length === 1 ? ` of ${wordsCount(sizes[0] ?? 0)} words` : '';
  const checks = memory.checkBits.length;
  return `${plural(memory.banks.length, 'bank')}${of}, ${plural(memory.dataBits, 'bit')}${
    checks === 0 ? '' : ` (${plural(checks, 'check bit')})`
  }`;
}

/** Names of the chip families in the sockets, each with how many sockets take it. */
export function familyCounts(document: LayoutDocument): { id: string; name: string; sockets: number }[] {
  const counts = new Map<string, number>();
  for (const { family } of document.sockets) counts.set(family, (counts.get(family) ?? 0) + 1);
  return [...counts].map(([id, sockets]) => ({ id, name: findFamily(document, id)?.name ?? id, sockets }));
}

/** What a board is, in the one line under its title. */
export function factsLine(document: LayoutDocument, version: string): string {
  const { kind, year } = document.board;
  const what = kind === 'other' ? 'Board' : kind.charAt(0).toUpperCase() + kind.slice(1);
  const families = familyCounts(document);
  const chips = listWords(families.map(({ name }) => name));
  return `${what}${year === undefined ? '' : `, ${year}`}. ${arrayWords(document)}, ${plural(
    document.sockets.length,
    'socket',
  )} for ${chips}. ${version}.`;
}

/** "+5 V ± 5 %": a supply as it is measured. A name that says its voltage is not said twice. */
export function railWords({ name, volts, tolerancePercent }: Rail): string {
  const measured = `${volts > 0 ? '+' : volts < 0 ? '−' : ''}${Math.abs(volts)} V`;
  const named = name.replaceAll(' ', '') === measured.replaceAll(' ', '') ? measured : `${name}, ${measured}`;
  return tolerancePercent === 0 ? named : `${named} ± ${tolerancePercent} %`;
}

/** "U31 to U38" would need an order that labels do not have: the labels themselves, or "every socket". */
export function socketListWords(document: LayoutDocument, labels: readonly string[] | undefined): string {
  if (labels === undefined || labels.length === document.sockets.length) return 'every socket';
  return listWords(labels, 24);
}

/** "bank A", for the table of banks with the name that stands beside the id. */
export function bankTitle({ id, name }: { id: string; name?: string }): string {
  return name === undefined ? bankWords(id) : `${bankWords(id)}, ${name}`;
}
