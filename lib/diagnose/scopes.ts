import { bankIndex, type Lane, type SocketIndex } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { segmentsInSocket, segmentsOf } from '../layout/segments';

/** A set of lanes that a cause spoils while the chips lie as they do in one run. Equal sets are one object. */
export interface Scope {
  readonly lanes: readonly Lane[];
  /** Where a bank is several chips deep: the chips behind each lane that the cause reaches, as a mask. */
  readonly within?: ReadonlyMap<Lane, number>;
}

/** Makes each set of lanes of a layout once. */
export class Scopes {
  private readonly known = new Map<string, Scope>();
  private readonly perSocket: (Scope | undefined)[] = [];
  private linesMade: Scope[] | null = null;
  private allMade: Scope | null = null;
  private readonly perBanks = new Map<string, Scope>();

  constructor(private readonly index: LayoutIndex) {}

  /** The set of these lanes, which may come in any order. */
  of(lanes: readonly Lane[]): Scope {
    const sorted = [...lanes].sort((a, b) => a - b);
    const key = sorted.join(' ');
    const before = this.known.get(key);
    if (before) return before;
    const scope = { lanes: sorted };
    this.known.set(key, scope);
    return scope;
  }

  /** Some of the lanes of one socket: its own chip behind each of them, where there are several. */
  inSocket(socket: SocketIndex, lanes: readonly Lane[]): Scope {
    const deep = lanes.some((lane) => segmentsOf(this.index, lane).length > 1);
    if (!deep) return this.of(lanes);
    const key = `${socket}: ${[...lanes].sort((a, b) => a - b).join(' ')}`;
    const before = this.known.get(key);
    if (before) return before;
    const within = new Map(lanes.map((lane) => [lane, segmentsInSocket(this.index, lane, socket)]));
    const scope = { lanes: [...lanes].sort((a, b) => a - b), within };
    this.known.set(key, scope);
    return scope;
  }

  /** What the chip in a socket holds. */
  ofSocket(socket: SocketIndex): Scope {
    const before = this.perSocket[socket];
    if (before) return before;
    const { socketLaneStart, socketLanes } = this.index;
    const lanes = socketLanes.subarray(socketLaneStart[socket], socketLaneStart[socket + 1]);
    const scope = this.inSocket(socket, [...lanes] as Lane[]);
    this.perSocket[socket] = scope;
    return scope;
  }

  /** All banks' lanes on one data line. */
  ofLine(line: number): Scope {
    if (!this.linesMade) {
      const lists: Lane[][] = Array.from({ length: this.index.lineCount }, () => []);
      for (const lane of this.index.lanes) lists[this.index.lineOfLane[lane] as number]?.push(lane as Lane);
      this.linesMade = lists.map((list) => this.of(list));
    }
    return this.linesMade[line] ?? this.of([]);
  }

  /** Every lane of the banks in which a socket's chip holds anything: those that share its strobe. */
  ofBanksOf(socket: SocketIndex): Scope {
    const banks = [...new Set(this.ofSocket(socket).lanes.map((lane) => this.index.bankOf(lane)))];
    const key = banks.join(' ');
    const before = this.perBanks.get(key);
    if (before) return before;
    const scope = this.of(banks.flatMap((bank) => this.ofBank(bank).lanes));
    this.perBanks.set(key, scope);
    return scope;
  }

  ofBank(bank: number): Scope {
    const first = this.index.laneOf(bankIndex(bank), 0 as never);
    const lanes: Lane[] = [];
    for (let bit = 0; bit < this.index.bitCount; bit++) {
      if (this.index.laneExists[first + bit]) lanes.push((first + bit) as Lane);
    }
    return this.of(lanes);
  }

  /** Every lane of the board. */
  all(): Scope {
    this.allMade ??= this.of([...this.index.lanes] as Lane[]);
    return this.allMade;
  }
}
