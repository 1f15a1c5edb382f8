import type { Lane, SocketIndex } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import { labelOf } from '../timeline';
import { lanesOfSocket } from './moved-lanes';
import type { Beliefs } from './states';

/** Chips that can change places with the one of a socket. */
export interface Partners {
  /** Of the same bank, the nearest first in the order of the layout. */
  readonly beside: SocketIndex | null;
  /** Of another bank. */
  readonly across: SocketIndex | null;
}

/**
 * Partners for a swap: of the same family, none of whose lanes failed, tested ones before untested, and with no
 * lane in common, or the fault could not be seen to move. Soldered chips only where there is no other.
 */
export function partnersFor(beliefs: Beliefs, socket: SocketIndex): Partners {
  const known = found.get(beliefs) ?? new Map<SocketIndex, Partners>();
  found.set(beliefs, known);
  const before = known.get(socket);
  if (before) return before;
  const partners = search(beliefs, socket);
  known.set(socket, partners);
  return partners;
}

const found = new WeakMap<Beliefs, Map<SocketIndex, Partners>>();

function search({ findings: { index }, failing, passed }: Beliefs, socket: SocketIndex): Partners {
  const own = lanesOfSocket(index, socket);
  const banks = new Set(own.map((lane) => index.bankOf(lane)));
  const failed = new Set(failing);
  const family = index.document.sockets[socket]?.family;
  const best = {
    beside: { at: null as SocketIndex | null, score: -Infinity },
    across: { at: null as SocketIndex | null, score: -Infinity },
  };
  index.document.sockets.forEach((other, n) => {
    const at = n as SocketIndex;
    if (at === socket || other.family !== family) return;
    const lanes = lanesOfSocket(index, at);
    if (lanes.length !== own.length || lanes.some((lane) => failed.has(lane) || own.includes(lane))) return;
    const side = lanes.some((lane) => banks.has(index.bankOf(lane))) ? 'beside' : 'across';
    const tested = lanes.every((lane) => passed.has(lane)) ? 4 : 0;
    const loose = other.soldered ? 0 : 8;
    const otherLine = lanes.some((lane) => sharesLine(index, lane, own)) ? 0 : 1;
    const near = Math.abs(at - socket) - (makesPair(index, socket, at) ? 0.5 : 0);
    const score = loose + tested + otherLine - near / 1e6;
    if (score > best[side].score) best[side] = { at, score };
  });
  return { beside: best.beside.at, across: best.across.at };
}

/** A chip of another bank on the same data line, whose leg leads to the same trace; null where there is none. */
export function onSameLine({ findings: { index } }: Beliefs, socket: SocketIndex): SocketIndex | null {
  const own = lanesOfSocket(index, socket);
  const banks = new Set(own.map((lane) => index.bankOf(lane)));
  const lines = own.map((lane) => index.lineOfLane[lane] as number);
  let found: SocketIndex | null = null;
  index.document.sockets.forEach((_, n) => {
    const lanes = lanesOfSocket(index, n as SocketIndex);
    if (found !== null || n === socket || lanes.some((lane) => banks.has(index.bankOf(lane)))) return;
    if (lines.every((line) => lanes.some((lane) => index.lineOfLane[lane] === line))) found = n as SocketIndex;
  });
  return found;
}

/**
 * Of two neighbours the one that makes an even and odd pair by its number: every chip then has one fixed partner,
 * and the swap back is the same swap.
 */
function makesPair(index: LayoutIndex, one: SocketIndex, other: SocketIndex): boolean {
  const numberOf = (socket: SocketIndex) => Number(/(\d+)\D*$/.exec(labelOf(index, socket))?.[1] ?? NaN);
  const [a, b] = [numberOf(one), numberOf(other)];
  return a % 2 === 0 ? b === a + 1 : b === a - 1;
}

function sharesLine(index: LayoutIndex, lane: Lane, own: readonly Lane[]): boolean {
  return own.some((each) => index.lineOfLane[each] === index.lineOfLane[lane]);
}
