import type { Lane, SocketIndex } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import type { State } from './states';

/** A chip goes from one socket to another. */
export interface Move {
  readonly from: SocketIndex;
  readonly to: SocketIndex;
}

const perSocket = new WeakMap<LayoutIndex, (readonly Lane[])[]>();

/** The lanes that a socket holds, ascending. */
export function lanesOfSocket(index: LayoutIndex, socket: SocketIndex): readonly Lane[] {
  let known = perSocket.get(index);
  if (!known) {
    const { socketLaneStart: start, socketLanes } = index;
    known = index.document.sockets.map((_, s) => [...socketLanes.subarray(start[s], start[s + 1])] as Lane[]);
    perSocket.set(index, known);
  }
  return known[socket] ?? [];
}

const perLine = new WeakMap<LayoutIndex, readonly (readonly Lane[])[]>();

function lanesOfLine(index: LayoutIndex, line: number): readonly Lane[] {
  let known = perLine.get(index);
  if (!known) {
    const lists: Lane[][] = Array.from({ length: index.lineCount }, () => []);
    for (const lane of index.lanes) lists[index.lineOfLane[lane] as number]?.push(lane as Lane);
    perLine.set(index, (known = lists));
  }
  return known[line] ?? [];
}

/** The lanes behind each data pin of a socket, in the order of the layout. */
function lanesByPin(index: LayoutIndex, socket: SocketIndex): Map<number, Lane[]> {
  const pins = new Map<number, Lane[]>();
  for (const { pin, bank, bit } of index.document.sockets[socket]?.holds ?? []) {
    const at = index.bankByName.get(bank);
    if (at === undefined || bit >= index.bitCount) continue;
    const lane = index.laneOf(at, bit as never);
    if (!index.laneExists[lane]) continue;
    const list = pins.get(pin);
    if (!list) pins.set(pin, [lane]);
    else if (!list.includes(lane)) list.push(lane);
  }
  return pins;
}

/** What the lanes that a chip spoils become when it is moved: pin by pin, line by line or bank by bank. */
export function afterMove(index: LayoutIndex, { cause, lanes }: State, { from, to }: Move): readonly Lane[] {
  switch (cause.mode) {
    case 'holds-address':
      return lanes;
    case 'holds-strobe':
      return banksMoved(index, lanes, { from, to });
    case 'holds-line':
      return linesMoved(index, lanes, { from, to });
    default:
      return pinsMoved(index, lanes, { from, to });
  }
}

function pinsMoved(index: LayoutIndex, lanes: readonly Lane[], { from, to }: Move): readonly Lane[] {
  const there = lanesByPin(index, to);
  const moved = new Set<Lane>();
  for (const [pin, own] of lanesByPin(index, from)) {
    const other = there.get(pin) ?? [];
    own.forEach((lane, n) => {
      if (!lanes.includes(lane)) return;
      if (own.length === other.length) moved.add(other[n] as Lane);
      else for (const each of other) moved.add(each);
    });
  }
  return ascending(moved);
}

/** The bit of every bank that it was seen in, on the line of the new place. */
function linesMoved(index: LayoutIndex, lanes: readonly Lane[], { from, to }: Move): readonly Lane[] {
  const there = lanesByPin(index, to);
  const moved = new Set<Lane>();
  for (const [pin, own] of lanesByPin(index, from)) {
    const lines = new Set(own.map((lane) => index.lineOfLane[lane]));
    const held = lanes.filter((lane) => lines.has(index.lineOfLane[lane]));
    if (held.length === 0) continue;
    const banks = new Set(held.map((lane) => index.bankOf(lane)));
    const target = new Set((there.get(pin) ?? []).map((lane) => index.lineOfLane[lane]));
    const onLine = [...target].flatMap((line) => (line === undefined ? [] : lanesOfLine(index, line)));
    const seen = onLine.filter((lane) => banks.has(index.bankOf(lane)));
    for (const lane of seen.length > 0 ? seen : onLine) moved.add(lane);
  }
  return ascending(moved);
}

function banksMoved(index: LayoutIndex, lanes: readonly Lane[], { from, to }: Move): readonly Lane[] {
  const banksAt = (socket: SocketIndex) => [...new Set(lanesOfSocket(index, socket).map((lane) => index.bankOf(lane)))];
  const own = banksAt(from);
  const target = banksAt(to);
  if (own.length === target.length && own.every((bank) => target.includes(bank))) return lanes;
  const banks = new Set(target);
  return ([...index.lanes] as Lane[]).filter((lane) => banks.has(index.bankOf(lane)));
}

const ascending = (lanes: Iterable<Lane>): Lane[] => [...lanes].sort((a, b) => a - b);
