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

/** Limits of a supply where neither layout nor family says them: ten in a hundred, as data sheets of the time give. */
const usualTolerance = 10;

/**
 * What a measurement says of a rail: by the layout's rails at that pin, else by what the chip of the socket wants
 * there. Null where nobody knows what the pin should carry.
 */
export function railReading(index: LayoutIndex, at: Pick<Measurement, 'socket' | 'pin' | 'volts'>): RailReading | null {
  const socket = index.socketByLabel.get(at.socket);
  if (socket === undefined) return null;
  const rail = railsAtSocket(index.document.rails, at.socket).find(({ pins }) => pins.includes(at.pin));
  const pin = index.familyOfSocket[socket]?.pins.find((each) => each.pin === at.pin);
  const expected = rail?.volts ?? pin?.volts ?? (pin?.does === 'ground' ? 0 : undefined);
  if (expected === undefined) return null;
  const tolerance = rail?.tolerancePercent ?? pin?.tolerancePercent ?? usualTolerance;
  const room = expected === 0 ? 0.25 : (Math.abs(expected) * tolerance) / 100;
  return {
    name: rail?.name ?? (expected > 0 ? `+${expected} V` : `${expected} V`),
    socket: at.socket,
    pin: at.pin,
    volts: at.volts,
    expected,
    limits: [expected - room, expected + room],
    good: at.volts >= expected - room - 1e-9 && at.volts <= expected + room + 1e-9,
    sharedPart: rail?.sharedPart ?? null,
  };
}
