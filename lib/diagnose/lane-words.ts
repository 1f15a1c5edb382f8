import { rollup, sort } from 'd3-array';
import { bankIndex, type Lane } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { bankWords, bitName, bitWords, listWords, numbersWords, rangeWords } from '../layout/words';

/**
 * Lanes in the fewest words: "bit 3 of bank B", "bits 0 to 4 of bank C, and banks A and B", "bit 3 of every
 * bank", "every bank". Empty for no lanes.
 */
export function lanesWords(index: LayoutIndex, lanes: Iterable<Lane>): string {
  const perBank = rollup(
    sort(lanes),
    (own) => own.map((lane): number => index.bitOf(lane)),
    (lane): number => index.bankOf(lane),
  );
  if (perBank.size === 0) return '';
  const whole: number[] = [];
  const partly = new Map<string, number[]>();
  for (const [bank, bits] of perBank) {
    if (bits.length === bitsOf(index, bank).length) whole.push(bank);
    else partly.set(bits.join(' '), [...(partly.get(bits.join(' ')) ?? []), bank]);
  }
  const parts = [...partly].map(([key, banks]) => {
    const bits = key.split(' ').map(Number);
    return `${bitsWords(index, bits)} of ${banksOf(index, banks)}`;
  });
  if (whole.length > 0) parts.push(banksOf(index, whole));
  return parts.length === 2 ? `${parts[0]}, and ${parts[1]}` : listWords(parts);
}

/** True where `lanesWords` gives a singular: "bit 3 of bank B", "bank B", "every bank". */
export function saidAsOne(index: LayoutIndex, lanes: Iterable<Lane>): boolean {
  const words = lanesWords(index, lanes);
  return !/ and |^bits |^banks /.test(words);
}

/** "bit 3", "bits 0 to 4 and 6", "bits 2 and 3 and the parity bit". */
function bitsWords(index: LayoutIndex, bits: readonly number[]): string {
  const { memory } = index.document;
  const plain = bits.filter((bit) => !index.isCheckBit[bit]);
  const checks = bits.filter((bit) => index.isCheckBit[bit]).map((bit) => bitWords(memory, bit));
  const names = plain.map((bit) => bitName(memory, bit));
  const counted = names.every((name) => /^\d+$/.test(name)) ? numbersWords(names.map(Number)) : listWords(names);
  return listWords([...(plain.length === 0 ? [] : [`${plain.length === 1 ? 'bit' : 'bits'} ${counted}`]), ...checks]);
}

/** "bank B", "banks A to D", "every bank". */
export function banksOf(index: LayoutIndex, banks: readonly number[]): string {
  const ids = banks.map((bank) => index.document.memory.banks[bank]?.id ?? '');
  if (ids.length === 1) return bankWords(ids[0] as string);
  if (ids.length === index.bankCount) return 'every bank';
  return `banks ${ids.every((id) => /^\d{1,9}$/.test(id)) ? numbersWords(ids.map(Number)) : rangeWords(ids)}`;
}

function bitsOf(index: LayoutIndex, bank: number): number[] {
  const first = index.laneOf(bankIndex(bank), 0 as never);
  return Array.from({ length: index.bitCount }, (_, bit) => bit).filter((bit) => index.laneExists[first + bit]);
}
