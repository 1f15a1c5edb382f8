import { signKinds, type Measurement, type Sign } from '@/shared';
import type { Bench } from '../bench';
import { readVolts } from '../volt-words';
import { readAddress } from './read-address';

/** A sign as it is being said. */
export interface SignDraft {
  readonly sign: Sign['sign'] | null;
  readonly socket: string;
}

/** A measurement as it is being typed. */
export interface SupplyDraft {
  readonly socket: string;
  readonly pin: string;
  readonly volts: string;
}

/** Two addresses as they are being typed, and the bits in which they meet: null for all. */
export interface AliasDraft {
  readonly one: string;
  readonly other: string;
  readonly bits: readonly number[] | null;
}

const lines = (...parts: readonly string[]) => {
  const text = parts.map((part) => part.replaceAll('\n', ' ')).join('\n');
  return text.trim() === '' ? '' : text;
};

/** Drafts as text of the link, one part a line, and back. */
export const writeSign = ({ sign, socket }: SignDraft): string => lines(sign ?? '', socket);
export const writeSupply = ({ socket, pin, volts }: SupplyDraft): string => lines(socket, pin, volts);
export const writeAlias = ({ one, other, bits }: AliasDraft): string =>
  lines(one, other, bits === null ? '' : `:${bits.join(' ')}`);

export function readSign(text: string): SignDraft {
  const [sign = '', socket = ''] = text.split('\n');
  return { sign: signKinds.find((kind) => kind === sign) ?? null, socket };
}

export function readSupply(text: string): SupplyDraft {
  const [socket = '', pin = '', volts = ''] = text.split('\n');
  return { socket, pin, volts };
}

export function readAlias(text: string): AliasDraft {
  const [one = '', other = '', bits = ''] = text.split('\n');
  return {
    one,
    other,
    bits: bits.startsWith(':') ? bits.slice(1).split(' ').filter(Boolean).map(Number) : null,
  };
}

/** Why a socket that was written cannot be meant; null where it can, or nothing is written. */
export function socketProblem({ index }: Bench, socket: string): string | null {
  const label = socket.trim();
  return label === '' || index.socketByLabel.has(label) ? null : `This board has no socket ${label}.`;
}

/** The sign, once it is whole. */
export function signOf(bench: Bench, { sign, socket }: SignDraft): Sign | null {
  if (sign === null || socketProblem(bench, socket) !== null) return null;
  const label = socket.trim();
  return { kind: 'sign', sign, ...(label === '' || sign === 'dead' ? {} : { socket: label }) };
}

/** The measurement, once it is whole. */
export function measurementOf(bench: Bench, { socket, pin, volts }: SupplyDraft): Measurement | null {
  const label = socket.trim();
  const measured = readVolts(volts);
  const number = /^\d{1,2}$/.test(pin) ? Number(pin) : 0;
  if (!bench.index.socketByLabel.has(label) || measured === null || number < 1 || number > 64) return null;
  return { kind: 'measurement', socket: label, pin: number, volts: measured };
}

/** The two addresses, once they are whole. */
export function aliasOf({ index }: Bench, { one, other, bits }: AliasDraft) {
  const a = readAddress(index, one);
  const b = readAddress(index, other);
  if (a === null || b === null || a === b || bits?.length === 0) return null;
  const addresses: [number, number] = [a, b];
  return { kind: 'alias' as const, addresses, ...(bits === null ? {} : { bits: [...bits] }) };
}
