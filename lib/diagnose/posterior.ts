import { sum } from 'd3-array';
import type { Lane } from '../brand';
import type { Cause, Kind, Part } from './cause-types';
import { inferNoisyOr, type HiddenVariable } from './noisy-or';
import type { RunObservation } from './observe/observations';
import type { Priors } from './priors';
import type { Scope } from './scopes';
import { shownBy, type ShapeRow, type Tried } from './shapes';
import type { Signals } from './signals';

/** Of the kinds of one cause. */
type Probabilities = readonly number[] | Float64Array;

/** Posterior of every kind of every cause, given what each run showed. */
export interface Posterior {
  /** Natural logarithm of the probability of all observations. */
  readonly logEvidence: number;
  /** By part, cause and kind. */
  readonly kinds: readonly (readonly Probabilities[])[];
  /** Probability that at least one of these parts has failed; in large groups as if they failed apart from each other. */
  readonly anyOf: (parts: ReadonlySet<number>) => number;
  /** Upper bound of the share of probability that was left out. */
  readonly leftOut: number;
}

interface Slot {
  readonly part: number;
  readonly cause: number;
  readonly variable: HiddenVariable;
}

/**
 * Weighs the parts against what the runs showed, by the noisy-OR model of `priors`. Patterns and signs weigh the kinds
 * that reach a failure; the others cannot be told by them.
 */
export function weigh(
  parts: readonly Part[],
  runs: readonly RunObservation[],
  { priors, signals }: { priors: Priors; signals: Signals },
): Posterior {
  const evidence = new Evidence(runs);
  const elsewhere = evidence.elsewhere(priors, signals);
  const leak = evidence.leaks(priors, signals);
  const touching: Slot[] = [];
  /** Logarithms of what each part contributes without touching any failure, and of its not being there. */
  const apart = new Float64Array(parts.length);
  const absent = new Float64Array(parts.length);
  const kinds: Probabilities[][] = parts.map((part, p) =>
    part.causes.map((cause, c) => {
      const variable = variableOf(evidence, signals, { part, cause });
      absent[p] = (absent[p] as number) + Math.log(variable.absent);
      if (variable.states.some((state) => state.touches.length > 0)) {
        touching.push({ part: p, cause: c, variable });
        return [];
      }
      const total = totalOf(variable);
      apart[p] = (apart[p] as number) + Math.log(total);
      return variable.states.map((state) => state.weight / total);
    }),
  );
  const always = sum(apart) + evidence.negatives * Math.log(1 - priors.leak);
  const solve = (slots: readonly Slot[]) =>
    inferNoisyOr({
      variables: [...slots.map((slot) => slot.variable), ...elsewhere],
      positives: evidence.positives,
      leak,
    });
  const answer = solve(touching);
  touching.forEach(({ part, cause }, i) => {
    (kinds[part] as Probabilities[])[cause] = answer.marginals[i] as Float64Array;
  });
  const anyOf = (chosen: ReadonlySet<number>): number => {
    // In a large group the answer is within a bound anyway, and both at once is nearly as rare as if they were apart.
    if (!answer.quick) return 1 - [...chosen].reduce((none, p) => none * (1 - probabilityIn(kinds, p)), 1);
    const without = solve(touching.filter((slot) => !chosen.has(slot.part)));
    let log = without.logEvidence - answer.logEvidence;
    for (const p of chosen) log += (absent[p] ?? 0) - (apart[p] ?? 0);
    return Math.min(1, Math.max(0, 1 - Math.exp(log)));
  };
  return { logEvidence: answer.logEvidence + always, kinds, anyOf, leftOut: answer.leftOut };
}

/** Probability of a part: the sum over its modes, which are so rare together that their overlap is nothing. */
export function probabilityOf(posterior: Posterior, part: number): number {
  return probabilityIn(posterior.kinds, part);
}

function probabilityIn(kinds: Posterior['kinds'], part: number): number {
  let total = 0;
  for (const own of kinds[part] ?? []) total += sum(own);
  return Math.min(1, total);
}

function totalOf(variable: HiddenVariable): number {
  return variable.absent + sum(variable.states, (state) => state.weight);
}

function variableOf(evidence: Evidence, signals: Signals, of: { part: Part; cause: Cause }): HiddenVariable {
  let prior = 0;
  for (const kind of of.cause.kinds) prior += kind.prior;
  const states = of.cause.kinds.map((kind) => {
    const state = evidence.stateOf(kind, () => signals.rowOf(of.part, of.cause));
    if (signals.silent || state.touches.length === 0) return state;
    return { ...state, weight: state.weight * signals.factor(of.part, of.cause, kind) };
  });
  return { absent: 1 - prior, states };
}

/** Passes that a set of lanes gave: how many as a whole, and what was tried of the others. */
interface Passes {
  readonly whole: number;
  readonly tried: readonly Tried[];
}

/** Probability that a fault of this row of the table of shapes shows on none of them. */
function allMissed({ whole, tried }: Passes, miss: number, row: () => ShapeRow): number {
  let product = miss ** whole;
  if (tried.length === 0) return product;
  const own = row();
  for (const each of tried) product *= 1 - (1 - miss) * shownBy(own, each);
  return product;
}

/** The observations, counted for each set of lanes once. */
class Evidence {
  readonly positives: number;
  readonly negatives: number;
  private readonly numberOf: ReadonlyMap<Lane, number>[];
  private readonly counted = new Map<Scope, { passed: Passes[]; failing: number[][] }>();
  private readonly lists = new Map<string, readonly number[]>();
  private readonly reached = new Map<Kind['scopes'], { passed: Passes; touches: readonly number[] }>();

  constructor(private readonly runs: readonly RunObservation[]) {
    let next = 0;
    this.numberOf = runs.map((run) => new Map([...run.failing].map((lane) => [lane, next++])));
    this.positives = next;
    this.negatives = sum(runs, (run) => run.passed.size);
  }

  stateOf(kind: Kind, row: () => ShapeRow): HiddenVariable['states'][number] {
    const { passed, touches } = this.reachOf(kind.scopes);
    return { weight: kind.prior * allMissed(passed, kind.miss, row), touches, miss: kind.miss };
  }

  /** The chance of each failure to come from nothing, one for all where nothing tells them apart. */
  leaks(priors: Priors, signals: Signals): number | Float64Array {
    if (signals.silent) return priors.leak;
    const leaks = new Float64Array(this.positives);
    this.numberOf.forEach((lanes, r) => {
      for (const [lane, o] of lanes) leaks[o] = priors.leak * signals.unknown(r, lane);
    });
    return leaks;
  }

  /** For each lane that failed, something outside the listed parts that spoils it in every run. */
  elsewhere(priors: Priors, signals: Signals): HiddenVariable[] {
    const lanes = new Set(this.runs.flatMap((run) => [...run.failing]));
    return [...lanes].map((lane) => {
      const { passed, failing } = this.countAfresh({ lanes: [lane] });
      const all = joined(passed);
      const touches = this.once(failing.flat());
      const first = this.runs.findIndex((run) => run.failing.has(lane));
      const factor = signals.silent ? 1 : signals.unknown(first, lane);
      const prior = priors.elsewhere / signals.pinsBehind(lane);
      const state = (share: number, miss: number) => ({
        weight: prior * share * allMissed(all, miss, () => 'unknown') * factor,
        touches,
        miss,
      });
      return {
        absent: 1 - prior,
        states: [
          state(1 - priors.intermittentShare, 1 - priors.detectionHard),
          state(priors.intermittentShare, 1 - priors.detectionIntermittent),
        ],
      };
    });
  }

  /** Many causes share one list of scopes, so it is counted once. */
  private reachOf(scopes: Kind['scopes']): { passed: Passes; touches: readonly number[] } {
    const before = this.reached.get(scopes);
    if (before) return before;
    const passes: Passes[] = [];
    const touches: number[] = [];
    scopes.forEach((scope, r) => {
      if (!scope) return;
      const counts = this.countsOf(scope);
      passes.push(counts.passed[r] as Passes);
      touches.push(...(counts.failing[r] ?? []));
    });
    const reach = { passed: joined(passes), touches: this.once(touches) };
    this.reached.set(scopes, reach);
    return reach;
  }

  private countsOf(scope: Scope) {
    const before = this.counted.get(scope);
    if (before) return before;
    const counts = this.countAfresh(scope);
    this.counted.set(scope, counts);
    return counts;
  }

  private countAfresh(scope: Scope) {
    return {
      passed: this.runs.map((run): Passes => passesOf(run, scope)),
      failing: this.runs.map((run, r) =>
        run.failing.size === 0
          ? []
          : scope.lanes.flatMap((lane) => {
              const o = this.numberOf[r]?.get(lane);
              return o === undefined || !reaches(scope, lane, run.failingSegments) ? [] : [o];
            }),
      ),
    };
  }

  /** Equal lists become one object, by which causes of the same reach are found quickly. */
  private once(touches: number[]): readonly number[] {
    touches.sort((a, b) => a - b);
    const key = touches.join(' ');
    const before = this.lists.get(key);
    if (before) return before;
    this.lists.set(key, touches);
    return touches;
  }
}

/** Where single words are known, a chip of a deep bank is only touched by words that it holds. */
function reaches(scope: Scope, lane: Lane, segments: ReadonlyMap<Lane, number>): boolean {
  const own = scope.within?.get(lane);
  const known = segments.get(lane);
  return own === undefined || known === undefined || (own & known) !== 0;
}

function passesOf(run: RunObservation, scope: Scope): Passes {
  let whole = 0;
  const tried: Tried[] = [];
  if (run.passed.size === 0 && run.rightSegments.size === 0) return { whole, tried };
  for (const lane of scope.lanes) {
    const chips = scope.within?.get(lane);
    const right = chips === undefined ? undefined : run.rightSegments.get(lane);
    const segmentRight = right !== undefined && chips !== 0 && ((chips ?? 0) & right) === chips;
    // Where another chip on the line was right, the line itself is.
    const lineRight = chips === undefined && run.failing.has(lane) && (run.rightSegments.get(lane) ?? 0) !== 0;
    if (!run.passed.has(lane) && !segmentRight && !lineRight) continue;
    const own = run.tried.get(lane);
    if (own === undefined) whole++;
    else tried.push(own);
  }
  return { whole, tried };
}

function joined(passes: readonly Passes[]): Passes {
  if (passes.length === 1) return passes[0] as Passes;
  return { whole: sum(passes, (each) => each.whole), tried: passes.flatMap((each) => each.tried) };
}
