import type { Finding, Shape, SharedPart, Sign } from '@/shared';
import { findingWeight } from './finding-weights';
import type { Lane, SocketIndex } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { segmentsOf } from '../layout/segments';
import type { Cause, Kind, Part } from './cause-types';
import { linePairs, looksJoined, type LinePair } from './line-pairs';
import type { RunObservation } from './observe/observations';
import { fixedBits, shapeRowOf, shapesThatFit, shareOf, type ChipSize, type ShapeRow } from './shapes';
import { signWeight, unknownWeights } from './sign-weights';

/** What is known of how one failing lane fails. */
export interface LaneShape {
  readonly shapes: readonly Shape[];
  /** Address bits of the chip that are the same in every failing word, or that lead to one cell. */
  readonly addressBits: readonly number[];
  readonly key: string;
}

/** What was said of the board beside lanes and readings. */
interface Said {
  readonly signs: readonly Sign[];
  readonly findings: readonly Finding[];
}

/** A short whose lines were never seen to be joined though their values were known. */
const notJoined = 0.02;
/** An address line that is not among those that the readings point at. */
const otherAddressLine = 0.01;

/**
 * The patterns in the readings and the signs of the board, as a factor on the probability of each cause: its
 * likelihood by the tables of shapes and signs. One shape that several lanes of a cause show counts once.
 */
export class Signals {
  /** Nothing beyond lanes is known, so every factor is 1. */
  readonly silent: boolean;
  readonly pairs: readonly LinePair[];
  readonly lanes: readonly ReadonlyMap<Lane, LaneShape>[];
  private readonly roles: ReadonlyMap<string, SharedPart['role']>;
  private readonly pairOf: ReadonlyMap<string, LinePair>;
  private readonly signs: readonly Sign[];
  private readonly findings: readonly Finding[];

  constructor(
    private readonly index: LayoutIndex,
    private readonly runs: readonly RunObservation[],
    said: Said,
  ) {
    const { signs, findings } = said;
    this.findings = findings;
    const readings = runs.some((run) => run.seen.size > 0 || run.aliased.size > 0 || run.values.length > 0);
    const telling = signs.filter((sign) => sign.sign !== 'dead');
    const picked = runs.some((run) => run.picked !== null);
    this.silent = !readings && !picked && telling.length === 0 && findings.length === 0;
    this.signs = telling;
    this.pairs = readings ? linePairs(index, runs) : [];
    this.pairOf = new Map(this.pairs.map((pair) => [pair.lines.join('-'), pair]));
    const joined = new Set(this.pairs.filter(looksJoined).flatMap((pair) => pair.lines));
    this.lanes = runs.map((run) => (readings ? this.shapesOf(run, joined) : new Map<Lane, LaneShape>()));
    this.roles = new Map(index.document.sharedParts.map((part) => [part.label, part.role]));
  }

  private shapesOf(run: RunObservation, joined: ReadonlySet<number>): Map<Lane, LaneShape> {
    const found = new Map<Lane, LaneShape>();
    for (const lane of run.failing) {
      const alias = run.aliased.get(lane);
      if (alias) {
        found.set(lane, laneShape(['block'], alias));
        continue;
      }
      if (joined.has(this.index.lineOfLane[lane] as number)) {
        found.set(lane, laneShape(['follows-neighbour'], []));
        continue;
      }
      const seen = run.seen.get(lane);
      if (!seen) continue;
      const size = chipSize(this.index, lane);
      const shapes = shapesThatFit(seen, { size, whole: run.whole });
      if (shapes)
        found.set(
          lane,
          laneShape(shapes, shapes.length === 1 && shapes[0] === 'block' ? fixedBits(seen, size.words) : []),
        );
    }
    return found;
  }

  /** Likelihood of what is known beside the lanes, given that this kind of the cause is there; above 0, at most 1. */
  factor(part: Part, cause: Cause, kind: Kind): number {
    if (this.silent) return 1;
    let product = this.signFactor(part, cause, kind) * this.pickedFactor(kind);
    if (cause.mode === 'short') return product * this.shortFactor(cause, kind);
    const row = this.rowOf(part, cause);
    const counted = new Set<string>();
    this.lanes.forEach((lanes, r) => {
      if (lanes.size === 0) return;
      for (const lane of kind.scopes[r]?.lanes ?? []) {
        const own = lanes.get(lane);
        if (!own || counted.has(own.key)) continue;
        counted.add(own.key);
        const other = cause.addressBits && own.addressBits.length > 0 && !meet(cause.addressBits, own.addressBits);
        product *= other ? otherAddressLine : shareOf(row, own.shapes);
      }
    });
    return product;
  }

  /** Of the lanes or banks that fail, the test named just this one. */
  private pickedFactor(kind: Kind): number {
    let product = 1;
    this.runs.forEach((run, r) => {
      if (run.picked === null) return;
      const untested = (kind.scopes[r]?.lanes ?? []).filter((lane) => !run.passed.has(lane));
      const failing =
        run.picked === 'lane' ? untested.length : new Set(untested.map((lane) => this.index.bankOf(lane))).size;
      if (failing > 1) product /= failing;
    });
    return product;
  }

  /** The row of the table of shapes for a cause, which also says what a pass in single words is worth. */
  rowOf(part: Part, cause: Cause): ShapeRow {
    return shapeRowOf(part, cause, this.roleOf(part));
  }

  private shortFactor(cause: Cause, kind: Kind): number {
    const pair = this.pairOf.get((cause.lines ?? []).join('-'));
    if (pair && looksJoined(pair)) return shareOf('short', ['follows-neighbour']);
    let product = pair && pair.against > 0 ? notJoined : 1;
    // Lanes that do not follow this neighbour show a short no better than any other fault of a line does.
    const counted = new Set<string>();
    this.lanes.forEach((lanes, r) => {
      for (const lane of kind.scopes[r]?.lanes ?? []) {
        const own = lanes.get(lane);
        if (!own || counted.has(own.key)) continue;
        counted.add(own.key);
        product *= shareOf('data channel', own.shapes);
      }
    });
    return product;
  }

  private signFactor(part: Part, cause: Cause, kind: Kind): number {
    let product = 1;
    for (const sign of this.signs) {
      const socket = sign.socket === undefined ? undefined : this.index.socketByLabel.get(sign.socket);
      const here = socket === undefined ? null : part.socket === socket;
      product *= signWeight(sign.sign, { part, cause, kind, role: this.roleOf(part), here });
    }
    for (const finding of this.findings) product *= findingWeight(finding, { part, cause });
    return product;
  }

  /** The same for a failure of this lane that nothing in the model explains. */
  unknown(run: number, lane: Lane): number {
    if (this.silent) return 1;
    const own = this.lanes[run]?.get(lane);
    let product = own ? shareOf('unknown', own.shapes) : 1;
    for (const sign of this.signs) product *= unknownWeights[sign.sign];
    for (const finding of this.findings) product *= findingWeight(finding, null);
    return product;
  }

  /** Data pins of the chip that holds a lane: what goes wrong beside a chip is divided among them. */
  pinsBehind(lane: Lane): number {
    const socket = this.index.laneSockets[this.index.laneSocketStart[lane] as number];
    const holds = socket === undefined ? [] : (this.index.document.sockets[socket]?.holds ?? []);
    return Math.max(1, new Set(holds.map(({ pin }) => pin)).size);
  }

  private roleOf(part: Part): SharedPart['role'] | null {
    return part.sharedPart === null ? null : (this.roles.get(part.sharedPart) ?? null);
  }
}

function laneShape(shapes: readonly Shape[], addressBits: readonly number[]): LaneShape {
  return { shapes, addressBits, key: `${shapes.join(' ')}|${addressBits.join(' ')}` };
}

function meet(one: readonly number[], other: readonly number[]): boolean {
  return one.some((bit) => other.includes(bit));
}

/** The chip behind a lane, the first one where there are several. */
export function chipSize(index: LayoutIndex, lane: Lane): ChipSize {
  const [segment] = segmentsOf(index, lane);
  const { multiplexing } = index.document;
  const held = segment ? segment.to - segment.from + 1 : 0;
  const family = segment ? index.familyOfSocket[segment.socket as SocketIndex] : null;
  return {
    words: held > 0 ? held : (family?.words ?? 0),
    rows: multiplexing ? 2 ** multiplexing.row.length : 0,
    columns: multiplexing ? 2 ** multiplexing.column.length : 0,
  };
}
