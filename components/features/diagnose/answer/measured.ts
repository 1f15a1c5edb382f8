import { supplyPins } from '@/lib';
import type { Run } from '@/shared';
import type { Bench } from '../bench';
import { verdictOf } from '../entry/supply-words';
import { voltWords } from '../volt-words';

/** A supply as it was measured last at a pin, in words. */
export interface Measured {
  readonly pin: number;
  /** "Pin 8 of U31". */
  readonly place: string;
  readonly text: string;
  readonly verdict: string;
  readonly bad: boolean;
}

/** Every supply that was measured, the last value of each pin, those out of their limits first. */
export function measuredSupplies(bench: Bench, runs: readonly Run[]): Measured[] {
  const last = new Map<string, Measured>();
  for (const seen of runs.flatMap(({ evidence }) => evidence)) {
    if (seen.kind !== 'measurement') continue;
    const pin = supplyPins(bench.index, seen.socket).find((one) => one.pin === seen.pin);
    const { words, bad } = pin === undefined ? { words: '', bad: false } : verdictOf(pin, seen.volts);
    const name = pin === undefined ? '' : `, ${pin.name}`;
    last.set(`${seen.socket} ${seen.pin}`, {
      pin: seen.pin,
      place: `Pin ${seen.pin} of ${seen.socket}`,
      text: `${seen.socket} pin ${seen.pin}${name}: ${voltWords(seen.volts)}`,
      verdict: words,
      bad,
    });
  }
  return [...last.values()].sort((a, b) => Number(b.bad) - Number(a.bad));
}
