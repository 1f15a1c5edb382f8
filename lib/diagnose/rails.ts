import type { Measurement } from '@/shared';
import type { LayoutIndex } from '../layout/layout-index';
import { railsAtSocket } from '../chips/fit';

/** A supply measured at a pin, beside what it should be. */
export interface RailReading {
  /** "-5 V" or the rail's own name. */
  readonly name: string;
  readonly socket: string;
  readonly pin: number;
  readonly volts: number;
  readonly expected: number;
  /** Lowest and highest allowed, in volts. */
  readonly limits: readonly [number, number];
  readonly good: boolean;
  /** Label of the shared part that makes or carries it. */
  readonly sharedPart: string | null;
}

/** A pin of a socket where a supply can be measured. */
export interface SupplyPin {
  readonly pin: number;
  readonly name: string;
  /** What should be there, in volts, and its limits. */
  readonly volts: number;
  readonly least: number;
  readonly most: number;
  /** Who says so: the rails of the board, or what the chip family wants. */
  readonly by: 'board' | 'chip';
  /** Label of the shared part that makes or carries it. */
  readonly sharedPart: string | null;
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
export function supplyPins(index: LayoutIndex, label: string): SupplyPin[] {
  const socket = index.socketByLabel.get(label);
  if (socket === undefined) return [];
  const found = new Map<number, SupplyPin>();
  for (const each of index.familyOfSocket[socket]?.pins ?? []) {
    const { pin, name, does, volts = 0, tolerancePercent = usualTolerance } = each;
    if (does !== 'supply' && does !== 'ground') continue;
    found.set(pin, { pin, name, volts, ...limits(volts, tolerancePercent), by: 'chip', sharedPart: null });
  }
  for (const { name, volts, tolerancePercent, pins, sharedPart = null } of railsAtSocket(index.document.rails, label)) {
    for (const pin of pins) {
      if (found.get(pin)?.by === 'board') continue;
      found.set(pin, { pin, name, volts, ...limits(volts, tolerancePercent), by: 'board', sharedPart });
    }
  }
  return [...found.values()].sort((a, b) => a.pin - b.pin);
}

/** Whether a measured value lies within the limits of a pin, the limits included. */
export function withinLimits({ least, most }: Pick<SupplyPin, 'least' | 'most'>, volts: number): boolean {
  return volts >= least - 1e-9 && volts <= most + 1e-9;
}

/** What a measurement says of a rail. Null where nobody knows what the pin should carry. */
export function railReading(index: LayoutIndex, at: Pick<Measurement, 'socket' | 'pin' | 'volts'>): RailReading | null {
  const found = supplyPins(index, at.socket).find(({ pin }) => pin === at.pin);
  if (!found) return null;
  const { volts: expected, least, most, sharedPart } = found;
  return {
    name: found.by === 'board' ? found.name : expected > 0 ? `+${expected} V` : `${expected} V`,
    socket: at.socket,
    pin: at.pin,
    volts: at.volts,
    expected,
    limits: [least, most],
    good: withinLimits(found, at.volts),
    sharedPart,
  };
}
