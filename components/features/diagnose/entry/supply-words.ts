import { withinLimits, type SupplyPin } from '@/lib';
import { voltWords } from '../volt-words';

type Limits = Pick<SupplyPin, 'pin' | 'least' | 'most'>;

/** "4.75 V to 5.25 V": what is allowed at a pin. */
export const limitWords = ({ least, most }: Limits): string => `${voltWords(least)} to ${voltWords(most)}`;

/** What a measured value says, in words; bad: it is out of the limits. */
export function verdictOf(pin: Limits, volts: number): { words: string; bad: boolean } {
  if (withinLimits(pin, volts)) return { bad: false, words: `Within its limits, ${limitWords(pin)}.` };
  const off = volts < pin.least ? 'low' : 'high';
  return { bad: true, words: `Too ${off}: pin ${pin.pin} wants ${limitWords(pin)}.` };
}
