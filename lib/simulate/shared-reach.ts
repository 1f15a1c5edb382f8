import type { SharedPart } from '@/shared';
import { grouped, type Wiring } from './wiring';

/** What can fail alone in a shared part, and the lanes behind it. */
export interface SharedChannel {
  readonly name: string;
  readonly lanes: readonly number[];
  /** For a channel that carries a bit of the word number. */
  readonly addressBit: number | null;
}

/** What the channels of a part carry where the layout does not say (common practice, no source). */
const usual: Readonly<Partial<Record<SharedPart['role'], NonNullable<SharedPart['channels']>>>> = {
  'data-buffer': 'bit',
  'shift-register': 'bit',
  connector: 'bit',
  multiplexer: 'address-bit',
  'strobe-driver': 'bank',
  decoder: 'bank',
};

/** The lanes that a shared part serves: each list of the document narrows them down. */
export function reachOf(wiring: Wiring, part: SharedPart): number[] {
  const { bits, banks, sockets } = part.serves;
  const { checkBits } = wiring.document.memory;
  const wanted = bits ?? (part.role === 'parity' && checkBits.length > 0 ? checkBits : undefined);
  const behind =
    sockets && new Set(wiring.ports.filter((port) => inList(wiring, port.position, sockets)).map((p) => p.lane));
  return wiring.lanes.filter((lane) => {
    const bank = wiring.banks[Math.floor(lane / wiring.bits)] ?? '';
    if (banks && !banks.includes(bank)) return false;
    if (wanted && !wanted.includes(lane % wiring.bits)) return false;
    return !behind || behind.has(lane);
  });
}

const inList = (wiring: Wiring, position: number, sockets: readonly string[]): boolean =>
  sockets.includes(wiring.labels[position] ?? '');

/** The channels of a shared part; none where it has only one. */
export function channelsOf(wiring: Wiring, part: SharedPart): SharedChannel[] {
  const carries = part.channels ?? usual[part.role] ?? 'none';
  const lanes = reachOf(wiring, part);
  switch (carries) {
    case 'none':
      return [];
    case 'address-bit': {
      const bits = part.serves.addressBits ?? [];
      return bits.length < 2 ? [] : bits.map((bit) => ({ name: `address bit ${bit}`, lanes, addressBit: bit }));
    }
    case 'bank':
    case 'bit': {
      const key = (lane: number) =>
        carries === 'bank' ? Math.floor(lane / wiring.bits) : (wiring.lineOfLane.get(lane) as number);
      const groups = [...grouped(lanes, key)];
      return groups.length < 2
        ? []
        : groups.map(([at, own]) => ({ name: `${carries} ${at}`, lanes: own, addressBit: null }));
    }
  }
}
