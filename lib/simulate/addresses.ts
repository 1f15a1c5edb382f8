import type { AddressWindow } from '@/shared';
import { bitOf, type Wiring } from './wiring';

/** Where the machine finds a word, or the part of it that one address carries. */
export interface CpuPlace {
  readonly address: number;
  readonly register: { readonly name: string; readonly value: number } | null;
  /** The bits of the word at this address, lowest first. */
  readonly bits: readonly number[];
}

/** Which bits of the offset, in words, the number of the bank takes away, ascending. */
function takenBits({ interleave, lanes }: AddressWindow): number[] {
  const below = Math.log2(lanes?.length ?? 1);
  return interleave.map(([first]) => (first as number) - below).sort((a, b) => a - b);
}

/** The offset of a word in a window where the bits of the bank's number are still 0. */
function spreadOut(word: number, taken: readonly number[]): number {
  let at = word;
  for (const bit of taken) {
    const low = at % 2 ** bit;
    at = (at - low) * 2 + low;
  }
  return at;
}

function bankAt({ interleave }: AddressWindow, address: number): number {
  return interleave.reduce(
    (number, bits, n) => number + (bits.reduce((odd, bit) => odd + bitOf(address, bit), 0) % 2) * 2 ** n,
    0,
  );
}

/**
 * The addresses at which the processor sees a word of a bank: one for each address step of the word and each window
 * that shows it. Windows whose interleave cannot be worked out are passed over.
 */
export const addressesOf = (wiring: Wiring, bank: number, word: number): CpuPlace[] =>
  wiring.document.addressMap.windows.flatMap((window) => addressesIn(wiring, window, { bank, word }));

/** The same in one window, ascending. */
export function addressesIn(
  wiring: Wiring,
  window: AddressWindow,
  { bank, word }: { bank: number; word: number },
): CpuPlace[] {
  const number = window.banks.indexOf(wiring.banks[bank] ?? '');
  const inside = word - window.firstWord;
  const steps = window.lanes?.length ?? 1;
  const taken = takenBits(window);
  if (number < 0 || inside < 0 || taken.some((bit) => !Number.isInteger(bit) || bit < 0)) return [];
  const start = spreadOut(inside, taken);
  const all = Array.from({ length: 2 ** taken.length }, (_, choice) =>
    taken.reduce((at, bit, n) => at + bitOf(choice, n) * 2 ** bit, start),
  );
  const register = window.register ?? null;
  return all.flatMap((unit) => {
    const first = window.range.from + unit * steps;
    if (first > window.range.to || (window.interleave.length > 0 && bankAt(window, first) !== number)) return [];
    return Array.from({ length: steps }, (_, step): CpuPlace => {
      const bits = window.lanes?.[step] ?? Array.from({ length: wiring.bits }, (__, bit) => bit);
      return {
        address: first + step,
        register,
        bits: bits.filter((bit) => wiring.portsOfLane.has(bank * wiring.bits + bit)),
      };
    });
  });
}

/** Addresses that lie evenly: first, the last, and how far apart. */
export interface AddressRun {
  readonly first: number;
  readonly last: number;
  /** 0 for a single address. */
  readonly step: number;
  readonly count: number;
}

/** Puts ascending addresses together into runs of even steps, each address in one run. */
export function runsOfAddresses(addresses: readonly number[]): AddressRun[] {
  const runs: AddressRun[] = [];
  let at = 0;
  while (at < addresses.length) {
    const first = addresses[at] as number;
    const step = (addresses[at + 1] ?? first) - first;
    let end = at + 1;
    while (end < addresses.length && (addresses[end] as number) - (addresses[end - 1] as number) === step) end++;
    // Two that are far apart are the ends of two runs as a rule.
    const pair = end - at === 2 && end < addresses.length;
    if (pair) end = at + 1;
    runs.push({ first, last: addresses[end - 1] as number, step: end - at === 1 ? 0 : step, count: end - at });
    at = end;
  }
  return runs;
}
