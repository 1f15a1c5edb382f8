import type { BoardFault, CellCoupling, ChipShape, Reads } from './faults';
import { bitOf, inputsOf, withBit, type Wiring } from './wiring';

/** Where part of a chip is wrong: a test of the words inside it. */
export interface Region {
  readonly holds: (word: number) => boolean;
  readonly reads: Reads;
}

/** What is wrong with one data pin of a position and the chip in it during one pass. */
export interface PortState {
  /** The output never reaches the line, and no write comes in. */
  open: Reads | null;
  /** Ways in which the word that is reached differs from the word that is meant. */
  readonly detours: ((word: number) => number)[];
  readonly regions: Region[];
  readonly couplings: { readonly word: number; readonly coupling: CellCoupling }[];
  readonly decays: {
    readonly holds: (word: number) => boolean;
    readonly seconds: number;
    readonly to: (word: number) => 0 | 1;
  }[];
}

/** What is wrong with one lane during one pass. */
export interface LaneState {
  /** The level of the way to the processor, null where that is sound. */
  level: Reads | null;
  /** Lanes of the same bank whose data lines are joined to this one. */
  readonly joined: number[];
  deselected: Reads | null;
  writesLost: boolean;
  stray: boolean;
  /** One for each port of the lane. */
  readonly ports: readonly PortState[];
}

const seconds = { refresh: 0.01 };

/** A board as it stands in one pass: who is where, and who is there in this pass. */
export interface Standing {
  readonly wiring: Wiring;
  /** The position of each chip by its id; undefined while it is not on the board. */
  readonly positionOfChip: ReadonlyMap<string, number>;
  /** Whether a fault shows on a lane in this pass. */
  readonly shows: (fault: BoardFault) => boolean;
}

/** The lanes on which anything is wrong in this pass, with what. Lanes that are not named are sound. */
export function lanesAtFault(standing: Standing, faults: readonly BoardFault[]): Map<number, LaneState> {
  const states = new Map<number, LaneState>();
  for (const fault of faults) spoil(standing, fault, states);
  return states;
}

function stateOf(wiring: Wiring, states: Map<number, LaneState>, lane: number): LaneState {
  const before = states.get(lane);
  if (before) return before;
  const made: LaneState = {
    level: null,
    joined: [],
    deselected: null,
    writesLost: false,
    stray: false,
    ports: (wiring.portsOfLane.get(lane) ?? []).map(() => ({
      open: null,
      detours: [],
      regions: [],
      couplings: [],
      decays: [],
    })),
  };
  states.set(lane, made);
  return made;
}

/** The words inside a chip that a shape covers. */
export function shapeOf(
  wiring: Wiring,
  position: number,
  { shape, word: at, addressBit }: { shape: ChipShape; word: number; addressBit: number },
): (word: number) => boolean {
  const { row, column } = inputsOf(wiring, position);
  const same = (bits: readonly number[]) => (word: number) => bits.every((bit) => bitOf(word, bit) === bitOf(at, bit));
  switch (shape) {
    case 'cell':
      return (word) => word === at;
    case 'row':
      return same(row);
    case 'column':
      return same(column);
    case 'block':
      return (word) => bitOf(word, addressBit) === bitOf(at, addressBit);
    case 'scattered':
      return (word) => word === at || spread(word, at) < 0.2;
    case 'whole':
      return () => true;
  }
}

/** A number from 0 to 1 that a word and a seed always give again, with no pattern in it. */
function spread(word: number, seed: number): number {
  let mixed = Math.imul((word + 1) ^ Math.imul(seed + 7, 0x9e3779b1), 0x85ebca6b);
  mixed ^= mixed >>> 13;
  mixed = Math.imul(mixed, 0xc2b2ae35);
  return ((mixed ^ (mixed >>> 16)) >>> 0) / 2 ** 32;
}

const forced =
  (bits: readonly number[], level: 0 | 1) =>
  (word: number): number =>
    bits.reduce((at, bit) => withBit(at, bit, level), word);

const lowerWins =
  (pairs: readonly (readonly [number, number])[]) =>
  (word: number): number =>
    pairs.reduce((at, [one, other]) => {
      const level = bitOf(at, one) * bitOf(at, other);
      return withBit(withBit(at, one, level), other, level);
    }, word);

/** Marks what a fault does. Each lane is asked for itself whether the fault shows there in this pass. */
function spoil(standing: Standing, fault: BoardFault, states: Map<number, LaneState>): void {
  const { wiring } = standing;
  const lanes = (numbers: Iterable<number>, mark: (state: LaneState, lane: number) => void) => {
    for (const lane of new Set(numbers))
      if (wiring.portsOfLane.has(lane) && standing.shows(fault)) mark(stateOf(wiring, states, lane), lane);
  };
  const ports = (position: number | undefined, pin: number | null, mark: (state: PortState, pin: number) => void) => {
    const own = position === undefined ? [] : (wiring.portsOfPosition[position] ?? []);
    const wanted = own.filter((port) => pin === null || wiring.ports[port]?.pin === pin);
    lanes(
      wanted.map((port) => wiring.ports[port]?.lane ?? -1),
      (state, lane) => {
        wiring.portsOfLane.get(lane)?.forEach((port, nth) => {
          const at = state.ports[nth];
          if (at && wanted.includes(port)) mark(at, wiring.ports[port]?.pin ?? 0);
        });
      },
    );
  };
  const everyPort = (numbers: Iterable<number>, mark: (state: PortState) => void) =>
    lanes(numbers, (state) => state.ports.forEach(mark));
  const home = 'chip' in fault ? standing.positionOfChip.get(fault.chip) : undefined;
  const place = 'socket' in fault ? wiring.positionOf.get(fault.socket) : undefined;
  const own = home === undefined ? [] : (wiring.portsOfPosition[home] ?? []).map((port) => wiring.ports[port]!);

  switch (fault.kind) {
    case 'chip':
      return ports(home, fault.pin, (state) =>
        state.regions.push({ holds: shapeOf(wiring, home ?? 0, fault), reads: fault.reads }),
      );
    case 'cell':
      return ports(home, fault.pin, (state) => state.couplings.push(fault));
    case 'retention':
      return ports(home, fault.pin, (state) =>
        state.decays.push({
          holds: shapeOf(wiring, home ?? 0, fault),
          seconds: fault.seconds,
          to: () => fault.decaysTo,
        }),
      );
    case 'chip-address':
      return ports(home, null, (state) => state.detours.push(forced(fault.addressBits, fault.level)));
    case 'holds-line': {
      const lines = own.filter(({ pin }) => pin === fault.pin).map(({ lane }) => wiring.lineOfLane.get(lane) ?? -1);
      return lanes(
        lines.flatMap((line) => wiring.lanesOfLine.get(line) ?? []),
        (state) => (state.level = fault.level),
      );
    }
    case 'holds-strobe': {
      const banks = new Set(own.map(({ bank }) => bank));
      return lanes(
        wiring.lanes.filter((lane) => banks.has(Math.floor(lane / wiring.bits))),
        (state) => (state.deselected = fault.floats),
      );
    }
    case 'holds-address':
      if (home === undefined) return;
      return everyPort(wiring.lanes, (state) => state.detours.push(forced(fault.addressBits, fault.level)));
    case 'contact':
      return ports(place, fault.pin, (state) => (state.open = fault.floats));
    case 'fitting':
      return ports(place, null, (state) => (state.open = fault.floats));
    case 'contact-address':
      return ports(place, null, (state) => state.detours.push(forced(fault.addressBits, fault.level)));
    default:
      return spoilShared({ wiring, lanes, everyPort, states }, fault);
  }
}

type Mark = (numbers: Iterable<number>, mark: (state: LaneState, lane: number) => void) => void;
type MarkPorts = (numbers: Iterable<number>, mark: (state: PortState) => void) => void;
type SharedFault = Extract<
  BoardFault,
  { kind: 'data' | 'short' | 'strobe' | 'address' | 'address-short' | 'write' | 'refresh' | 'stray' }
>;

/** Marks what a fault does that has no socket. */
function spoilShared(
  {
    wiring,
    lanes,
    everyPort,
    states,
  }: { wiring: Wiring; lanes: Mark; everyPort: MarkPorts; states: Map<number, LaneState> },
  fault: SharedFault,
): void {
  switch (fault.kind) {
    case 'data':
      return lanes(fault.lanes, (state) => (state.level = fault.level));
    case 'short':
      for (const [one, other] of fault.pairs) {
        lanes([one], (state) => state.joined.push(other));
        lanes([other], (state) => state.joined.push(one));
        // The partner's level is needed whether or not the fault shows there.
        for (const lane of [one, other]) if (wiring.portsOfLane.has(lane)) stateOf(wiring, states, lane);
      }
      return;
    case 'strobe':
      return lanes(fault.lanes, (state) => (state.deselected = fault.floats));
    case 'address':
      return everyPort(fault.lanes, (state) => state.detours.push(forced(fault.addressBits, fault.level)));
    case 'address-short':
      return everyPort(fault.lanes, (state) => state.detours.push(lowerWins(fault.pairs)));
    case 'write':
      return lanes(fault.lanes, (state) => (state.writesLost = true));
    case 'refresh':
      return everyPort(fault.lanes, (state) =>
        state.decays.push({
          holds: () => true,
          seconds: seconds.refresh,
          to: (word) => (spread(word, 3) < 0.5 ? 0 : 1),
        }),
      );
    case 'stray':
      return lanes([fault.lane], (state) => (state.stray = true));
  }
}
