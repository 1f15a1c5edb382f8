import { findFamily, railsAtSocket } from '@/lib';
import type { Bench } from '../bench';
import { voltWords } from '../volt-words';

/** A pin of a socket where a supply can be measured. */
export interface SupplyPin {
  readonly pin: number;
  readonly name: string;
  /** What should be there, in volts, and its limits. */
  readonly volts: number;
  readonly least: number;
  readonly most: number;
  /** Said of the pin beside its name: who says so. */
  readonly by: 'board' | 'chip';
}

/** Limits of a supply of which nobody says any, in per cent; common practice, no source. */
const usualTolerance = 10;
/** Between two ground pins more than this, in volts, is a bad joint; common practice, no source. */
const groundLimit = 0.2;

function limits(volts: number, tolerancePercent: number): { least: number; most: number } {
  const off = volts === 0 ? groundLimit : (Math.abs(volts) * tolerancePercent) / 100;
  return { least: volts - off, most: volts + off };
}

/** The supply pins of a socket: the rails of the board, and what else its chip family wants. By pin number. */
export function supplyPins({ document, index }: Bench, socket: string): SupplyPin[] {
  const at = index.socketByLabel.get(socket);
  const family = at === undefined ? null : findFamily(document, document.sockets[at]?.family ?? '');
  const found = new Map<number, SupplyPin>();
  for (const { pin, name, does, volts = 0, tolerancePercent = usualTolerance } of family?.pins ?? []) {
    if (does !== 'supply' && does !== 'ground') continue;
    found.set(pin, { pin, name, volts, ...limits(volts, tolerancePercent), by: 'chip' });
  }
  if (at !== undefined) {
    for (const { name, volts, tolerancePercent, pins } of railsAtSocket(document.rails, socket)) {
      for (const pin of pins) found.set(pin, { pin, name, volts, ...limits(volts, tolerancePercent), by: 'board' });
    }
  }
  return [...found.values()].sort((a, b) => a.pin - b.pin);
}

/** "4.75 V to 5.25 V": what is allowed at a pin. */
export const limitWords = ({ least, most }: SupplyPin): string => `${voltWords(least)} to ${voltWords(most)}`;

/** What a measured value says, in words; bad: it is out of the limits. */
export function verdictOf(pin: SupplyPin, volts: number): { words: string; bad: boolean } {
  // Half a hundredth of a volt is beyond the meter.
  const slack = 0.005;
  if (volts < pin.least - slack) return { bad: true, words: `Too low: pin ${pin.pin} wants ${limitWords(pin)}.` };
  if (volts > pin.most + slack) return { bad: true, words: `Too high: pin ${pin.pin} wants ${limitWords(pin)}.` };
  return { bad: false, words: `Within its limits, ${limitWords(pin)}.` };
}
