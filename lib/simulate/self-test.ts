import { settle, writeCell, type CellFault } from './cell-faults';
import type { Reads } from './faults';
import type { LaneState, PortState } from './lane-state';
import { marchTest, type MarchName, type MarchTest } from './march-tests';
import { sampledWords } from './sample';
import type { Wiring } from './wiring';

/** A number from 0 (included) to 1 (not included), another at each call. */
export type Random = () => number;

/** What a test writes into a word: a data background, or its complement. */
export interface Pattern {
  /** 0: all bits alike. n: groups of 2^(n-1) bits take turns. */
  readonly background: number;
  readonly value: 0 | 1;
}

/** What a pattern holds in one bit of the word. */
export const patternBit = ({ background, value }: Pattern, bit: number): 0 | 1 =>
  ((background === 0 ? 0 : (bit >> (background - 1)) & 1) ^ value) as 0 | 1;

/** A word that read otherwise than it was written. */
export interface FailingWord {
  readonly bank: number;
  /** Number of the word in its bank. */
  readonly word: number;
  readonly written: Pattern;
  /** The bits that read wrong, ascending. */
  readonly bits: readonly number[];
}

/** What one pass of the test found. */
export interface TestResult {
  /** Failing lanes (bank * bits + bit), ascending. */
  readonly lanes: readonly number[];
  /** Each failing word once for each pattern under which it failed, bank by bank in the order of the test. */
  readonly words: readonly FailingWord[];
  /** Seconds that were waited between writing and reading. */
  readonly waited: number;
}

/** How a machine tests. */
export interface TestOptions {
  readonly march?: MarchName;
  /** Seconds that the test waits before each element. Fractions of a second pass anyway. */
  readonly waits?: number;
  /** Chips of no more words are simulated whole, see `sampledWords`. */
  readonly wholeUpTo?: number;
}

/** Seconds that a pass over the memory takes, so that rows which nobody refreshes are lost. */
const passSeconds = 0.5;

/**
 * Runs a March test over the board, bank by bank, and lists what failed. Lanes without a fault are sound and left out.
 * Where data lines are joined it is run once for each data background (all bits alike, then groups of 1, 2, 4 and more
 * bits in turn, so that any two lines are told apart): no other fault tells one background from another.
 */
export function testBoard(
  wiring: Wiring,
  states: ReadonlyMap<number, LaneState>,
  { random, march = 'March C-', waits = 0, wholeUpTo }: TestOptions & { random: Random },
): TestResult {
  const banks = [...new Set([...states.keys()].map((lane) => Math.floor(lane / wiring.bits)))].sort((a, b) => a - b);
  const words = banks.flatMap((bank) =>
    testBank({ wiring, states, bank, random, march: marchTest(march), waits, most: wholeUpTo }),
  );
  const lanes = new Set(words.flatMap(({ bank, bits }) => bits.map((bit) => bank * wiring.bits + bit)));
  return { lanes: [...lanes].sort((a, b) => a - b), words, waited: waits };
}

interface BankTest {
  readonly wiring: Wiring;
  readonly states: ReadonlyMap<number, LaneState>;
  readonly bank: number;
  readonly random: Random;
  readonly march: MarchTest;
  readonly waits: number;
  readonly most: number | undefined;
}

function testBank(test: BankTest): FailingWord[] {
  const { wiring, bank, march, waits } = test;
  const lanes = [...test.states.keys()].filter((lane) => Math.floor(lane / wiring.bits) === bank).sort((a, b) => a - b);
  const words = wordsOfBank(test, lanes);
  const tested = lanes.map((lane) => new TestedLane(test, lane, words));
  const byLane = new Map(tested.map((each) => [each.lane, each]));
  for (const each of tested) each.join(byLane);
  const failing = new Map<string, { at: number; written: Pattern; bits: Set<number> }>();
  // Only joined lines tell one background from another: without them the first has said it all.
  const joined = lanes.some((lane) => (test.states.get(lane)?.joined.length ?? 0) > 0);
  const backgrounds = joined ? 1 + Math.ceil(Math.log2(Math.max(2, wiring.bits))) : 1;
  for (let background = 0; background < backgrounds; background++) {
    march.elements.forEach(({ order, operations }, element) => {
      if (element > 0) for (const each of tested) each.wait(waits + passSeconds);
      for (let n = 0; n < words.length; n++) {
        const at = order === 'down' ? words.length - 1 - n : n;
        for (const { does, value } of operations) {
          const pattern: Pattern = { background, value };
          for (const each of tested) each.drive(patternBit(pattern, each.bit));
          if (does === 'write') for (const each of tested) each.write(at);
          else
            for (const each of tested) {
              if (each.read(at) === each.driven) continue;
              const key = `${at} ${background} ${value}`;
              const known = failing.get(key);
              if (known) known.bits.add(each.bit);
              else failing.set(key, { at, written: pattern, bits: new Set([each.bit]) });
            }
        }
      }
    });
  }
  return [...failing.values()].map(({ at, written, bits }) => ({
    bank,
    word: words[at] as number,
    written,
    bits: [...bits].sort((a, b) => a - b),
  }));
}

/** The words of the bank that are simulated: those of every chip behind the lanes, ascending. */
function wordsOfBank({ wiring, most }: BankTest, lanes: readonly number[]): number[] {
  const found = new Set<number>();
  const seen = new Set<string>();
  for (const lane of lanes) {
    for (const number of wiring.portsOfLane.get(lane) ?? []) {
      const port = wiring.ports[number]!;
      const key = `${port.from} ${port.to} ${port.at} ${wiring.addressBits[port.position]}`;
      if (seen.has(key)) continue;
      seen.add(key);
      for (const word of sampledWords(wiring, port.position, most === undefined ? {} : { most })) {
        const inBank = word - port.at + port.from;
        if (inBank >= port.from && inBank <= port.to) found.add(inBank);
      }
    }
  }
  return [...found].sort((a, b) => a - b);
}

/** The cells behind one port: those of the simulated words, and others that a wrong address reaches. */
class PortCells {
  private readonly words: number[] = [];
  private readonly numberOf = new Map<number, number>();
  private readonly content: number[] = [];
  /** What each cell reads whatever it holds; -1 for its content, 2 for another value at each look. */
  private readonly fixed: number[] = [];
  private readonly coupled: CellFault[] = [];

  constructor(
    private readonly state: PortState,
    private readonly random: Random,
  ) {
    for (const { word, coupling } of state.couplings) {
      if (coupling.kind === 'transition') this.coupled.push({ ...coupling, cell: this.cell(word) });
      else this.coupled.push({ ...coupling, aggressor: this.cell(coupling.aggressor), victim: this.cell(word) });
    }
  }

  /** The cell that the chip reaches when a word is meant. */
  reached(word: number): number {
    return this.cell(this.state.detours.reduce((at, detour) => detour(at), word));
  }

  private cell(word: number): number {
    const before = this.numberOf.get(word);
    if (before !== undefined) return before;
    const made = this.words.length;
    this.words.push(word);
    this.numberOf.set(word, made);
    this.content.push(this.random() < 0.5 ? 0 : 1);
    const region = this.state.regions.find(({ holds }) => holds(word));
    this.fixed.push(region === undefined ? -1 : region.reads === 'changing' ? 2 : region.reads);
    return made;
  }

  read(cell: number): 0 | 1 {
    const fixed = this.fixed[cell] as number;
    if (fixed < 0) return this.content[cell] as 0 | 1;
    return fixed === 2 ? (this.random() < 0.5 ? 0 : 1) : (fixed as 0 | 1);
  }

  write(cell: number, value: 0 | 1): void {
    const [first] = this.coupled;
    if (!first) this.content[cell] = value;
    else {
      writeCell(this.content, first, { cell, value });
      for (const other of this.coupled.slice(1)) settle(this.content, other);
    }
  }

  wait(seconds: number): void {
    for (const decay of this.state.decays) {
      if (decay.seconds > seconds) continue;
      this.words.forEach((word, cell) => {
        if (decay.holds(word)) this.content[cell] = decay.to(word);
      });
    }
  }
}

class TestedLane {
  readonly bit: number;
  /** What the test puts on the line, or expects from it. */
  driven: 0 | 1 = 0;
  private readonly state: LaneState;
  private readonly cells: readonly PortCells[];
  /** For each simulated word of the bank which port answers, -1 where none does, and its cell. */
  private readonly portAt: Int32Array;
  private readonly cellAt: Int32Array;
  private readonly random: Random;
  private joined: readonly TestedLane[] = [];
  /** The read that a stray error spoils; -1 once it is past. */
  private strayIn: number;

  constructor(
    { wiring, states, random }: BankTest,
    readonly lane: number,
    words: readonly number[],
  ) {
    this.bit = lane % wiring.bits;
    this.random = random;
    this.state = states.get(lane) as LaneState;
    this.cells = this.state.ports.map((state) => new PortCells(state, random));
    this.portAt = new Int32Array(words.length).fill(-1);
    this.cellAt = new Int32Array(words.length);
    wiring.portsOfLane.get(lane)?.forEach((number, nth) => {
      const port = wiring.ports[number]!;
      words.forEach((word, at) => {
        if (word < port.from || word > port.to) return;
        this.portAt[at] = nth;
        this.cellAt[at] = (this.cells[nth] as PortCells).reached(word - port.from + port.at);
      });
    });
    this.strayIn = this.state.stray ? Math.floor(random() * words.length) : -1;
  }

  join(lanes: ReadonlyMap<number, TestedLane>): void {
    this.joined = this.state.joined.flatMap((lane) => lanes.get(lane) ?? []);
  }

  drive(value: 0 | 1): void {
    this.driven = value;
  }

  private level(of: Reads): 0 | 1 {
    return of === 'changing' ? (this.random() < 0.5 ? 0 : 1) : of;
  }

  /** What the chips of this lane put on its data line. */
  private output(at: number): 0 | 1 {
    if (this.state.deselected !== null) return this.level(this.state.deselected);
    const nth = this.portAt[at] as number;
    if (nth < 0) return 1;
    const open = this.state.ports[nth]?.open ?? null;
    return open === null ? (this.cells[nth] as PortCells).read(this.cellAt[at] as number) : this.level(open);
  }

  read(at: number): 0 | 1 {
    let value = this.output(at);
    for (const other of this.joined) value = (value & other.output(at)) as 0 | 1;
    if (this.state.level !== null) value = this.level(this.state.level);
    if (this.strayIn >= 0 && this.strayIn-- === 0) value = (1 - this.driven) as 0 | 1;
    return value;
  }

  write(at: number): void {
    const nth = this.portAt[at] as number;
    if (nth < 0 || this.state.writesLost || this.state.deselected !== null || this.state.ports[nth]?.open != null)
      return;
    let value = this.driven;
    for (const other of this.joined) value = (value & other.driven) as 0 | 1;
    if (this.state.level !== null) value = this.level(this.state.level);
    (this.cells[nth] as PortCells).write(this.cellAt[at] as number, value);
  }

  wait(seconds: number): void {
    for (const cells of this.cells) cells.wait(seconds);
  }
}
