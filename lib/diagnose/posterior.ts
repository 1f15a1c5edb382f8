import type { Lane } from '../brand';
import type { Cause, Kind, Part } from './causes';
import { inferNoisyOr, type HiddenVariable } from './noisy-or';
import type { RunObservation } from './observations';
import type { Priors } from './priors';
import type { Scope } from './scopes';

/** Posterior of every kind of every cause, given what each run showed. */
export interface Posterior {
  /** Natural logarithm of the probability of all observations. */
  readonly logEvidence: number;
  /** By part, cause and kind. */
  readonly kinds: readonly (readonly Float64Array[])[];
  /** Probability that at least one of these parts has failed; exact within `leftOut`. */
  readonly anyOf: (parts: ReadonlySet<number>) => number;
  /** Upper bound of the share of probability that was left out. */
  readonly leftOut: number;
}

interface Slot {
  readonly part: number;
  readonly cause: number;
  readonly variable: HiddenVariable;
  readonly touching: boolean;
}

/** Weighs the parts against what the runs showed, by the noisy-OR model of `priors`. */
export function weigh(parts: readonly Part[], runs: readonly RunObservation[], priors: Priors): Posterior {
  const evidence = new Evidence(runs);
  const slots: Slot[] = parts.flatMap((part, p) =>
    part.causes.map((cause, c) => {
      const variable = variableOf(cause, evidence);
      return { part: p, cause: c, variable, touching: variable.states.some((state) => state.touches.length > 0) };
    }),
  );
  const solve = (left: readonly Slot[]) => {
    const touching = left.filter((slot) => slot.touching);
    const answer = inferNoisyOr({
      variables: touching.map((slot) => slot.variable),
      positives: evidence.positives,
      leak: priors.leak,
    });
    let log = answer.logEvidence + evidence.negatives * Math.log(1 - priors.leak);
    for (const slot of left) if (!slot.touching) log += Math.log(totalOf(slot.variable));
    return { answer, touching, log };
  };
  const { answer, touching, log } = solve(slots);
  const kinds = parts.map((part) => part.causes.map((cause) => new Float64Array(cause.kinds.length)));
  for (const slot of slots) {
    if (slot.touching) continue;
    const total = totalOf(slot.variable);
    kinds[slot.part]?.[slot.cause]?.set(slot.variable.states.map((state) => state.weight / total));
  }
  touching.forEach((slot, i) => kinds[slot.part]?.[slot.cause]?.set(answer.marginals[i] ?? []));

  const anyOf = (chosen: ReadonlySet<number>): number => {
    let absent = 0;
    for (const slot of slots) if (chosen.has(slot.part)) absent += Math.log(slot.variable.absent);
    const without = solve(slots.filter((slot) => !chosen.has(slot.part)));
    return Math.min(1, Math.max(0, 1 - Math.exp(without.log + absent - log)));
  };
  return { logEvidence: log, kinds, anyOf, leftOut: answer.leftOut };
}

/** Probability of a part: the sum over its modes, which are so rare together that their overlap is nothing. */
export function probabilityOf(posterior: Posterior, part: number): number {
  let sum = 0;
  for (const kinds of posterior.kinds[part] ?? []) for (const p of kinds) sum += p;
  return Math.min(1, sum);
}

function totalOf(variable: HiddenVariable): number {
  return variable.states.reduce((sum, state) => sum + state.weight, variable.absent);
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

  constructor(private readonly runs: readonly RunObservation[]) {
    let next = 0;
    this.numberOf = runs.map((run) => new Map([...run.failing].map((lane) => [lane, next++])));
    this.positives = next;
    this.negatives = runs.reduce((sum, run) => sum + run.passed.size, 0);
  }

  stateOf(kind: Kind): HiddenVariable['states'][number] {
    let passed = 0;
    const touches: number[] = [];
    kind.scopes.forEach((scope, r) => {
      if (!scope) return;
      const counts = this.countsOf(scope);
      passed += counts.passed[r] ?? 0;
      touches.push(...(counts.failing[r] ?? []));
    });
    return { weight: kind.prior * kind.miss ** passed, touches: this.once(touches), miss: kind.miss };
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
