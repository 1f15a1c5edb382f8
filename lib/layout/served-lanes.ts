import type { SharedPart } from '@/shared';
import { bankIndex, bitIndex, lane, type Lane } from '../brand';
import type { LayoutIndex } from './layout-index';

/** What can fail alone in a shared part. */
export interface Channel {
  /** In words: "bit 3", "bank A", "address bit 5". */
  readonly name: string;
  /** For the channels of an address: which bit of the word number goes through it. */
  readonly addressBit?: number;
  readonly lanes: readonly Lane[];
}

type ChannelKind = 'bit' | 'bank' | 'address-bit' | 'none';

const usualChannels: Record<SharedPart['role'], ChannelKind> = {
  'data-buffer': 'bit',
  'shift-register': 'bit',
  connector: 'bit',
  multiplexer: 'address-bit',
  'strobe-driver': 'bank',
  decoder: 'bank',
  'write-driver': 'none',
  'refresh-counter': 'none',
  parity: 'none',
  supply: 'none',
  other: 'none',
};

/** The lanes that fail when the whole of a shared part fails, ascending. Names that the board does not have are skipped. */
export function servedLanes(index: LayoutIndex, part: SharedPart): readonly Lane[] {
  const { bits, banks, sockets } = part.serves;
  const bankWanted = new Uint8Array(index.bankCount).fill(banks ? 0 : 1);
  for (const name of banks ?? []) {
    const bank = index.bankByName.get(name);
    if (bank !== undefined) bankWanted[bank] = 1;
  }
  const bitWanted = new Uint8Array(index.bitCount).fill(bits ? 0 : 1);
  for (const bit of bits ?? []) bitWanted[bit] = 1;
  // A parity maker that names no bits serves the check bits, not the data.
  if (!bits && part.role === 'parity' && index.document.memory.checkBits.length > 0) bitWanted.set(index.isCheckBit);

  let inSockets: Uint8Array | null = null;
  if (sockets) {
    inSockets = new Uint8Array(index.laneCount);
    for (const name of sockets) {
      const socket = index.socketByLabel.get(name);
      if (socket === undefined) continue;
      const end = index.socketLaneStart[socket + 1] as number;
      for (let i = index.socketLaneStart[socket] as number; i < end; i++) inSockets[index.socketLanes[i] as number] = 1;
    }
  }
  const served: Lane[] = [];
  for (const n of index.lanes) {
    const at = lane(n);
    if (bankWanted[index.bankOf(at)] && bitWanted[index.bitOf(at)] && (!inSockets || inSockets[n])) served.push(at);
  }
  return served;
}

/** The channels of a shared part that can fail alone, by its own word or by what is usual for its role. */
export function channelsOf(index: LayoutIndex, part: SharedPart): readonly Channel[] {
  const kind = part.channels ?? usualChannels[part.role];
  if (kind === 'none') return [];
  const served = servedLanes(index, part);
  if (kind === 'address-bit') {
    // A lost address bit spoils words of every lane that the part serves.
    return (part.serves.addressBits ?? []).map((bit) => ({
      name: `address bit ${bit}`,
      addressBit: bit,
      lanes: served,
    }));
  }
  const groups = new Map<number, Lane[]>();
  for (const at of served) {
    const key = kind === 'bit' ? index.lineOfLane[at] : index.bankOf(at);
    const group = groups.get(key as number);
    if (group) group.push(at);
    else groups.set(key as number, [at]);
  }
  return [...groups].map(([key, lanes]) => ({
    name: kind === 'bit' ? index.lineName(key) : `bank ${index.document.memory.banks[key]?.id ?? key}`,
    lanes,
  }));
}

/** The lane of a bank and a bit by number, null where the board has no such lane. */
export function laneAt(index: LayoutIndex, bank: number, bit: number): Lane | null {
  if (!(bank >= 0 && bank < index.bankCount && bit >= 0 && bit < index.bitCount)) return null;
  const at = index.laneOf(bankIndex(bank), bitIndex(bit));
  return index.laneExists[at] ? at : null;
}
