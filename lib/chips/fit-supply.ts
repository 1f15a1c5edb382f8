import type { ChipFamily } from '@/shared';
import type { RailAtPins } from './fit-types';

export type ChipPin = ChipFamily['pins'][number];

/** What the socket has at a pin. Volts are null where a supply is not described. */
export type Given =
  | { readonly kind: 'nothing' }
  | { readonly kind: 'unknown' }
  | { readonly kind: 'volts'; readonly volts: number | null; readonly name: string }
  | { readonly kind: 'signal'; readonly does: ChipPin['does']; readonly index: number | null; readonly name: string };

const usualTolerancePercent = 10;
/** An input may lie this far outside the supplies: the usual limit of data sheets (from memory). */
const inputMarginVolts = 0.5;
const usualLogicVolts = 5;

/** Volts as the trade writes them: "+12 V", "−5 V", "0 V". */
export function voltsWords(volts: number): string {
  if (volts === 0) return '0 V';
  return `${volts > 0 ? '+' : '−'}${Math.abs(volts)} V`;
}

/** The supply that a pin wants, 0 for ground; null where it is no supply or its volts are not described. */
export function wantedVolts(pin: ChipPin): number | null {
  if (pin.does === 'ground') return 0;
  return pin.does === 'supply' ? (pin.volts ?? null) : null;
}

/** What a socket wired for a family gives a pin; a rail that the layout states there counts first. */
export function givenAt(pin: ChipPin | undefined, rail: RailAtPins | undefined): Given {
  if (rail !== undefined) return { kind: 'volts', volts: rail.volts, name: voltsWords(rail.volts) };
  if (pin === undefined) return { kind: 'unknown' };
  if (pin.does === 'none') return { kind: 'nothing' };
  if (pin.does === 'supply' || pin.does === 'ground') {
    const volts = wantedVolts(pin);
    return { kind: 'volts', volts, name: volts === null ? pin.name : voltsWords(volts) };
  }
  return { kind: 'signal', does: pin.does, index: pin.index ?? null, name: pin.name };
}

/** Whether a supply lies within what a pin tolerates of its own voltage. */
export function withinTolerance(pin: ChipPin, volts: number): boolean {
  const wanted = wantedVolts(pin);
  if (wanted === null) return false;
  const tolerance = (Math.abs(wanted) * (pin.tolerancePercent ?? usualTolerancePercent)) / 100;
  return Math.abs(volts - wanted) <= tolerance + 1e-9;
}

/** Highest level in volts that a signal pin of the family bears: its lowest positive supply and what that tolerates. */
function highestInput(family: ChipFamily): number {
  const supplies = family.pins.flatMap((pin) => {
    const volts = wantedVolts(pin);
    return volts !== null && volts > 0 ? [volts * (1 + (pin.tolerancePercent ?? usualTolerancePercent) / 100)] : [];
  });
  return (supplies.length === 0 ? usualLogicVolts * 1.1 : Math.min(...supplies)) + inputMarginVolts;
}

/** Whether a signal pin of the family bears a steady voltage. */
export function bearsAsSignal(family: ChipFamily, volts: number): boolean {
  return volts >= -inputMarginVolts && volts <= highestInput(family);
}
