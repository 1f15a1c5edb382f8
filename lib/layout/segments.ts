import type { Held } from '@/shared';
import type { Lane, SocketIndex } from '../brand';
import type { LayoutIndex } from './layout-index';

/** One chip's part of a lane: which words of the bank it holds, and where they begin inside the chip. */
export interface Segment {
  readonly socket: SocketIndex;
  readonly from: number;
  readonly to: number;
  /** The word inside the chip that holds word `from` of the bank. */
  readonly at: number;
}

const known = new WeakMap<LayoutIndex, Map<Lane, readonly Segment[]>>();

/**
 * The chips behind a lane by the words that they hold, in the order of the sockets: one where the bank is one chip
 * deep, several where it is deeper. Number n of the list is bit n of a segment mask; no more than 30 are told apart.
 */
export function segmentsOf(index: LayoutIndex, lane: Lane): readonly Segment[] {
  let lanes = known.get(index);
  if (!lanes) known.set(index, (lanes = new Map()));
  const before = lanes.get(lane);
  if (before) return before;
  const bank = index.document.memory.banks[index.bankOf(lane)];
  const bit = index.bitOf(lane) as number;
  const found: Segment[] = [];
  for (let at = index.laneSocketStart[lane] as number; at < (index.laneSocketStart[lane + 1] as number); at++) {
    const socket = index.laneSockets[at] as SocketIndex;
    for (const held of index.document.sockets[socket]?.holds ?? []) {
      if (held.bank === bank?.id && held.bit === bit) found.push(segmentOf(socket, held, bank.words));
    }
  }
  const list = found.slice(0, 30);
  lanes.set(lane, list);
  return list;
}

function segmentOf(socket: SocketIndex, held: Held, words: number): Segment {
  return { socket, from: held.words?.from ?? 0, to: held.words?.to ?? words - 1, at: held.at };
}

/** Mask of the segments of a lane that lie in a socket. */
export function segmentsInSocket(index: LayoutIndex, lane: Lane, socket: SocketIndex): number {
  return segmentsOf(index, lane).reduce((mask, segment, n) => (segment.socket === socket ? mask | (1 << n) : mask), 0);
}

/** Where a word of a bank lies behind one of its lanes: which segment, and which word inside that chip; null for nowhere. */
export function chipWordOf(index: LayoutIndex, lane: Lane, word: number): { segment: number; inChip: number } | null {
  const segments = segmentsOf(index, lane);
  const segment = segments.findIndex(({ from, to }) => word >= from && word <= to);
  const found = segments[segment];
  return found ? { segment, inChip: word - found.from + found.at } : null;
}
