import type { BoardFault } from './faults';
import { lanesAtFault } from './lane-state';
import { testBoard, type Random, type TestOptions, type TestResult } from './self-test';
import type { Wiring } from './wiring';

/** How faults show and what handling does, as shares from 0 to 1. */
export interface BenchFigures {
  /** A fault that is always there shows on a lane in this share of passes. */
  readonly detectionHard: number;
  readonly detectionIntermittent: number;
  /** Handling a position cures an open contact in this share of cases. */
  readonly handlingCures: number;
  /** Handling a position leaves a bent leg or a chip turned round in this share of cases. */
  readonly handlingHarms: number;
  /** A lane that reads bad in a pass for no cause that stays. */
  readonly leak: number;
}

/** A bench on which everything shows and handling neither cures nor harms. */
export const steadyBench: BenchFigures = {
  detectionHard: 1,
  detectionIntermittent: 0.5,
  handlingCures: 0,
  handlingHarms: 0,
  leak: 0,
};

export interface BenchSetUp {
  readonly faults: readonly BoardFault[];
  readonly random: Random;
  readonly figures?: BenchFigures;
  /** The faults of a chip that is fitted as a spare, by the id that it gets. Left out: it is good. */
  readonly spare?: (chip: string, socket: string) => readonly BoardFault[];
}

/**
 * A simulated board on the bench: chips that can be moved and replaced, positions and shared parts that stay, and a test
 * that says what it finds. A chip is named by the socket where it was first seen: chip:U25, and chip:U25#2 for the
 * next one fitted there. Methods that name a socket that the board does not have throw a RangeError.
 */
export class SimulatedBench {
  private faultsNow: BoardFault[];
  private readonly chipAt: string[];
  private readonly fitted = new Map<string, number>();
  private readonly random: Random;
  private readonly figures: BenchFigures;

  constructor(
    readonly wiring: Wiring,
    private readonly setUp: BenchSetUp,
  ) {
    this.faultsNow = [...setUp.faults];
    this.random = setUp.random;
    this.figures = setUp.figures ?? steadyBench;
    this.chipAt = wiring.labels.map((label) => `chip:${label}`);
  }

  /** The faults that are there now: handling may have cured some and added others. */
  get faults(): readonly BoardFault[] {
    return this.faultsNow;
  }

  /** The id of the chip in a socket. */
  chipIn(socket: string): string {
    return this.chipAt[this.position(socket)] as string;
  }

  swap(one: string, other: string): void {
    const [a, b] = [this.position(one), this.position(other)];
    const kept = this.chipAt[a] as string;
    this.chipAt[a] = this.chipAt[b] as string;
    this.chipAt[b] = kept;
    this.handle(one);
    this.handle(other);
  }

  /** Fits another chip in a socket; the one that was there leaves the board. */
  replace(socket: string): void {
    const position = this.position(socket);
    const nth = (this.fitted.get(socket) ?? 1) + 1;
    this.fitted.set(socket, nth);
    const chip = `chip:${socket}#${nth}`;
    this.chipAt[position] = chip;
    this.faultsNow.push(...(this.setUp.spare?.(chip, socket) ?? []));
    this.handle(socket);
  }

  reseat(socket: string): void {
    this.handle(socket);
  }

  /** One pass of the test. */
  run(options: TestOptions = {}): TestResult {
    const { wiring, random, figures } = this;
    const strays: BoardFault[] =
      figures.leak === 0
        ? []
        : wiring.lanes.flatMap((lane) =>
            random() < figures.leak ? [{ kind: 'stray' as const, lane, intermittent: false }] : [],
          );
    const states = lanesAtFault(
      {
        wiring,
        positionOfChip: new Map(this.chipAt.map((chip, position) => [chip, position])),
        shows: (fault) =>
          fault.kind === 'stray' ||
          random() < (fault.intermittent ? figures.detectionIntermittent : figures.detectionHard),
      },
      [...this.faultsNow, ...strays],
    );
    return testBoard(wiring, states, { ...options, random });
  }

  private position(socket: string): number {
    const position = this.wiring.positionOf.get(socket);
    if (position === undefined) throw new RangeError(`This board has no socket ${socket}.`);
    return position;
  }

  /** An open contact may be cured, a bent leg is found, and a new one may be made. */
  private handle(socket: string): void {
    this.faultsNow = this.faultsNow.filter((fault) => {
      if (!('socket' in fault) || fault.socket !== socket) return true;
      return fault.kind !== 'fitting' && this.random() >= this.figures.handlingCures;
    });
    if (this.random() < this.figures.handlingHarms) {
      this.faultsNow.push({ kind: 'fitting', socket, floats: 1, intermittent: false });
    }
  }
}
