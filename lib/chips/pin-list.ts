import type { ChipFamily } from '@/shared';

type ChipPin = ChipFamily['pins'][number];

/** Supply limits of RAM chips are 10 % unless their family says otherwise. */
const usualTolerancePercent = 10;

const named: Record<string, Pick<ChipPin, 'does'>> = {
  '/W': { does: 'write-enable' },
  '/RAS': { does: 'row-strobe' },
  '/CAS': { does: 'column-strobe' },
  '/OE': { does: 'output-enable' },
  '/CS': { does: 'chip-select' },
  CS2: { does: 'chip-select' },
  D: { does: 'data-in' },
  Q: { does: 'data-out' },
  REF: { does: 'refresh' },
  NC: { does: 'none' },
};

function pinOf(pin: number, text: string): ChipPin {
  const volts = /^([+-]?\d+)V$/.exec(text)?.[1];
  if (volts !== undefined) {
    const value = Number(volts);
    if (value === 0) return { pin, name: '0 V', does: 'ground', volts: 0 };
    const name = `${value > 0 ? '+' : '−'}${Math.abs(value)} V`;
    return { pin, name, does: 'supply', volts: value, tolerancePercent: usualTolerancePercent };
  }
  const address = /^A(\d+)$/.exec(text)?.[1];
  if (address !== undefined) return { pin, name: text, does: 'address', index: Number(address) };
  const data = /^D(\d+)$/.exec(text)?.[1];
  if (data !== undefined) return { pin, name: text, does: 'data', index: Number(data) };
  const known = named[text];
  if (known === undefined) throw new RangeError(`A pin list names "${text}", which is no pin function.`);
  return { pin, name: text, ...known };
}

/**
 * The pins of a chip from pin 1 up, written as one line: A0 and D0 are address and data pins, D and Q a separate
 * input and output, +5V and the like supplies, /RAS, /CAS, /W, /OE, /CS strobes, NC nothing. Throws RangeError on
 * any other word.
 */
export function pinList(line: string): ChipPin[] {
  return line
    .trim()
    .split(/\s+/)
    .map((text, at) => pinOf(at + 1, text));
}
