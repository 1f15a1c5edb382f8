import { sum } from 'd3-array';
import type { Lane } from '../brand';
import type { Cause, Kind, Part } from './cause-types';
import { inferNoisyOr, type HiddenVariable } from './noisy-or';
import type { RunObservation } from './observations';
import type { Priors } from './priors';
import type { Scope } from './scopes';

/** Of the kinds of one cause. */
type Probabilities = readonly number[] | Float64Array;

/** Posterior of every kind of every cause, given what each run showed. */
export interface Posterior {
  /** Natural logarithm of the probability of all observations. */
  readonly logEvidence: number;
  /** By part, cause and kind. */
  readonly kinds: readonly (readonly Probabilities[])[];
  /** Probability that at least one of these parts has failed; exact within `leftOut`. */
  readonly anyOf: (parts: ReadonlySet<number>) => number;
  /** Upper bound of the share of probability that was left out. */
  readonly leftOut: number;
}

interface Slot {
  readonly part: number;
  readonly cause: number;
  readonly variable: HiddenVariable;
}

/** Weighs the parts against what the runs showed, by the noisy-OR model of `priors`. */
export function weigh(parts: readonly Part[], runs: readonly RunObservation[], priors: Priors): Posterior {
  const evidence = new Evidence(runs);
  const touching: Slot[] = [];
  /** Logarithms of what each part contributes without touching any failure, and of its not being there. */
  const apart = new Float64Array(parts.length);
  const absent = new Float64Array(parts.length);
  const kinds: Probabilities[][] = parts.map((part, p) =>
    part.causes.map((cause, c) => {
      const variable = variableOf(cause, evidence);
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
    inferNoisyOr({ variables: slots.map((slot) => slot.variable), positives: evidence.positives, leak: priors.leak });
  const answer = solve(touching);
  touching.forEach(({ part, cause }, i) => {
    (kinds[part] as Probabilities[])[cause] = answer.marginals[i] as Float64Array;
  });
  const anyOf = (chosen: ReadonlySet<number>): number => {
    const without = solve(touching.filter((slot) => !chosen.has(slot.part)));
    let log = without.logEvidence - answer.logEvidence;
    for (const p of chosen) log += (absent[p] ?? 0) - (apart[p] ?? 0);
    return Math.min(1, Math.max(0, 1 - Math.exp(log)));
  };
  return { logEvidence: answer.logEvidence + always, kinds, anyOf, leftOut: answer.leftOut };
}

/** Probability of a part: the sum over its modes, which are so rare together that their overlap is nothing. */
export function probabilityOf(posterior: Posterior, part: number): number {
  let total = 0;
  for (const kinds of posterior.kinds[part] ?? []) total += sum(kinds);
  return Math.min(1, total);
}

function totalOf(variable: HiddenVariable): number {
  return variable.absent + sum(variable.states, (state) => state.weight);
}

function variableOf(cause: Cause, evidence: Evidence): HiddenVariable {
  let prior = 0;
  for (const kind of cause.kinds) prior += kind.prior;
  return { absent: 1 - prior, states: cause.kinds.map((kind) => evidence.stateOf(kind)) };
}

/** The observations, counted for each set of lanes once. */
class Evidence {
  readonly positives: number;
  readonly negatives: number;
  private readonly numberOf: ReadonlyMap<Lane, number>[];
  private readonly counted = new Map<Scope, { passed: number[]; failing: number[][] }>();
  private readonly lists = new Map<string, readonly number[]>();
  private readonly reached = new Map<Kind['scopes'], { passed: number; touches: readonly number[] }>();

  constructor(private readonly runs: readonly RunObservation[]) {
    let next = 0;
    this.numberOf = runs.map((run) => new Map([...run.failing].map((lane) => [lane, next++])));
    this.positives = next;
    this.negatives = sum(runs, (run) => run.passed.size);
  }

  stateOf(kind: Kind): HiddenVariable['states'][number] {
    const { passed, touches } = this.reachOf(kind.scopes);
    return { weight: kind.prior * kind.miss ** passed, touches, miss: kind.miss };
  }

  /** Many causes share one list of scopes, so it is counted once. */
  private reachOf(scopes: Kind['scopes']): { passed: number; touches: readonly number[] } {
    const before = this.reached.get(scopes);
    if (before) return before;
    let passed = 0;
    const touches: number[] = [];
    scopes.forEach((scope, r) => {
      if (!scope) return;
      const counts = this.countsOf(scope);
      passed += counts.passed[r] ?? 0;
      touches.push(...(counts.failing[r] ?? []));
    });
    const reach = { passed, touches: this.once(touches) };
    this.reached.set(scopes, reach);
    return reach;
  }

  private countsOf(scope: Scope) {
    const before = this.counted.get(scope);
    if (before) return before;
    const counts = {
      passed: this.runs.map((run) =>
        run.passed.size === 0 ? 0 : scope.lanes.reduce((n, lane) => n + (run.passed.has(lane) ? 1 : 0), 0),
      ),
      failing: this.runs.map((run, r) =>
        run.failing.size === 0 ? [] : scope.lanes.flatMap((lane) => this.numberOf[r]?.get(lane) ?? []),
      ),
    };
    this.counted.set(scope, counts);
    return counts;
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
