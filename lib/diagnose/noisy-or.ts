import { addScaled, solveByTable, tableSteps, type Component, type Node, type Solution } from './explained-table';
import { ceiling, planCut, splitComponent, type Plan } from './cut-plan';
import { mergeAlike } from './merge-alike';

/**
 * Exact inference in a noisy-OR model with many hidden variables and a few observations that came out
 * positive (a lane that failed). The idea that negative observations factorise and only positive ones
 * couple the variables: D. Heckerman, A tractable inference algorithm for diagnosing multiple diseases,
 * UAI 1989 (from memory). His sum over subsets alternates in sign and loses digits as soon as several
 * rare faults meet, so the sum here runs over "which positives are already explained": every term is
 * positive and nothing cancels.
 */

/** One way for a variable to be there. Negative observations are already in its weight. */
export interface HiddenState {
  /** Prior probability times the chance that all negative observations it touches came out so, 0 to 1. */
  readonly weight: number;
  /** Positive observations that it can explain, ascending, each once. */
  readonly touches: readonly number[];
  /** Probability that it fails to show on one of them, 0 to 1. */
  readonly miss: number;
}

export interface HiddenVariable {
  /** Prior probability that it is not there. */
  readonly absent: number;
  readonly states: readonly HiddenState[];
}

export interface NoisyOrModel {
  readonly variables: readonly HiddenVariable[];
  readonly positives: number;
  /** Probability that a positive observation comes from nothing in the model: one for all, or one for each. */
  readonly leak: number | Float64Array;
}

export interface NoisyOrAnswer {
  /** Natural logarithm of the probability of the observations, -Infinity where it is 0. */
  readonly logEvidence: number;
  /** Posterior of each state of each variable. */
  readonly marginals: readonly Float64Array[];
  /** Upper bound of the share of probability that was left out; 0 where the sum is whole. */
  readonly leftOut: number;
}

/** The share of probability that may be left out while the answer still counts as exact. */
export const exactWithin = 1e-9;
/** Work that one answer may take before combinations of many faults are left out, in elementary steps. */
const workLimit = 300_000;
/** A whole group is summed by one table up to this many steps: they are short ones, and nothing is left out. */
const wholeTable = 150_000;
/** A piece of a larger group whose table of explained subsets costs less than this is summed in one go. */
const smallTable = 3_000;
/** Up to this the table is still taken where the group only falls apart after many variables are fixed. */
const largeTable = 150_000;
const longCut = 3;
/** Below this many positives a table is cheaper than finding out which variables are alike. */
const mergeFrom = 5;

/** Posterior of every state of every variable, given that all positives came out positive. Never throws. */
export function inferNoisyOr(model: NoisyOrModel): NoisyOrAnswer {
  if (model.positives <= mergeFrom) return inferMerged(model);
  const merged = mergeAlike(model);
  const answer = inferMerged(merged.model);
  return { ...answer, marginals: merged.unmerge(answer.marginals) };
}

function inferMerged(model: NoisyOrModel): NoisyOrAnswer {
  let logScale = 0;
  const nodes: Node[] = [];
  for (const variable of model.variables) {
    let total = variable.absent;
    for (const state of variable.states) total += state.weight;
    const safe = total > 0 ? total : 1;
    logScale += Math.log(total);
    nodes.push({
      none: variable.absent / safe,
      share: Float64Array.from(variable.states, (state) => state.weight / safe),
      touches: variable.states.map((state) => state.touches),
      miss: Float64Array.from(variable.states, (state) => state.miss),
      widest: variable.states.reduce((most, state) => Math.max(most, state.touches.length), 0),
    });
  }
  const marginals = nodes.map((node) => Float64Array.from(node.share));
  const { leak } = model;
  const quiet = Float64Array.from(
    { length: model.positives },
    (_, o) => 1 - (typeof leak === 'number' ? leak : (leak[o] ?? 0)),
  );
  const everything = {
    nodes: nodes.map((_, v) => v).filter((v) => (nodes[v] as Node).widest > 0),
    positives: Array.from({ length: model.positives }, (_, o) => o),
  };
  let logZ = 0;
  let leftOut = 0;
  for (const part of splitComponent(nodes, everything)) {
    const solution = solveWithin(nodes, part, quiet);
    if (!(solution.z > 0)) return { logEvidence: -Infinity, marginals, leftOut: 1 };
    logZ += Math.log(solution.z);
    leftOut += solution.dropped / solution.z;
    part.nodes.forEach((v, i) => {
      marginals[v] = (solution.mass[i] as Float64Array).map((m) => m / solution.z);
    });
  }
  return { logEvidence: logScale + logZ, marginals, leftOut: Math.min(1, leftOut) };
}

/** Sums one connected group, leaving out less and less until the answer is exact or the work is used up. */
function solveWithin(nodes: readonly Node[], part: Component, quiet: Float64Array): Solution {
  if (tableSteps(nodes, part) <= wholeTable) return solveByTable(nodes, part, quiet);
  let best: Solution | null = null;
  let spent = 0;
  // A first coarse pass tells how large the sum is; the next ones leave out only what is small beside it.
  for (let threshold = 1e-4, pass = 0; pass < 8; pass++) {
    const sum = new BoundedSum(nodes, workLimit - spent);
    const solution = sum.solve(part, quiet, threshold);
    spent += sum.work;
    if (!solution) break;
    best = solution;
    if (solution.dropped <= solution.z * exactWithin * 0.1 || spent * 3 > workLimit) break;
    threshold = Math.min(threshold * 1e-2, (solution.z * solution.z * 1e-2) / Math.max(solution.dropped, 1e-300));
  }
  return best ?? oneAtATime(nodes, part, quiet);
}

interface Remembered {
  readonly solution: Solution;
  readonly threshold: number;
}

/** The sum over the states of the variables that reach far, with everything else summed by table below them. */
class BoundedSum {
  work = 0;
  private readonly plans = new Map<Component, Plan>();
  private readonly memory = new Map<Component, Map<string, Remembered>>();

  constructor(
    private readonly nodes: readonly Node[],
    private readonly budget: number,
  ) {}

  /** Null where the work would exceed the budget. */
  solve(part: Component, quiet: Float64Array, threshold: number): Solution | null {
    if (part.positives.length === 0) {
      return { z: 1, dropped: 0, mass: part.nodes.map((v) => (this.nodes[v] as Node).share) };
    }
    let known = this.memory.get(part);
    if (!known) this.memory.set(part, (known = new Map()));
    let key = '';
    for (const o of part.positives) key += `${quiet[o]},`;
    const before = known.get(key);
    this.work += part.positives.length;
    if (before && (before.solution.dropped === 0 || before.threshold <= threshold)) return before.solution;
    const solution = this.solveAfresh(part, quiet, threshold);
    if (solution) known.set(key, { solution, threshold });
    return solution;
  }

  private solveAfresh(part: Component, quiet: Float64Array, threshold: number): Solution | null {
    const steps = tableSteps(this.nodes, part);
    const byTable =
      part.positives.length === 1 ||
      steps <= smallTable ||
      (steps <= largeTable && this.planFor(part).cut.length >= longCut);
    if (!byTable) return this.enumerate(this.planFor(part), part, { quiet, threshold });
    this.work += steps;
    return this.work > this.budget ? null : solveByTable(this.nodes, part, quiet);
  }

  private planFor(part: Component): Plan {
    const known = this.plans.get(part);
    if (known) return known;
    const plan = planCut(this.nodes, part, smallTable);
    this.work += part.nodes.length * (2 * plan.cut.length + 1);
    this.plans.set(part, plan);
    return plan;
  }

  private enumerate(plan: Plan, part: Component, start: { quiet: Float64Array; threshold: number }): Solution | null {
    const { nodes } = this;
    const slot = new Map(part.nodes.map((v, i) => [v, i]));
    const mass = part.nodes.map((v) => new Float64Array((nodes[v] as Node).share.length));
    /** How much each solution of a part weighs in the end, so that its masses are added once. */
    const used = new Map<Solution, { part: Component; factor: number }>();
    const chosen: number[] = [];
    let z = 0;
    let dropped = 0;

    const leaf = (quiet: Float64Array, share: number): boolean => {
      let product = share;
      let bound = share;
      const solutions: Solution[] = [];
      for (const child of plan.parts) {
        const solution = this.solve(child, quiet, start.threshold / share);
        if (!solution || this.work > this.budget) return false;
        solutions.push(solution);
        product *= solution.z;
        bound *= Math.min(1, solution.z + solution.dropped);
      }
      z += product;
      dropped += Math.max(0, bound - product);
      chosen.forEach((s, i) => {
        const own = mass[slot.get(plan.cut[i] as number) as number] as Float64Array;
        if (s >= 0) own[s] = (own[s] as number) + product;
      });
      solutions.forEach((solution, i) => {
        if (!(solution.z > 0)) return;
        const entry = used.get(solution);
        if (entry) entry.factor += product / solution.z;
        else used.set(solution, { part: plan.parts[i] as Component, factor: product / solution.z });
      });
      return true;
    };

    const visit = (depth: number, quiet: Float64Array, share: number): boolean => {
      const v = plan.cut[depth];
      if (v === undefined) return leaf(quiet, share);
      const node = nodes[v] as Node;
      for (let s = -1; s < node.share.length; s++) {
        const next = share * (s < 0 ? node.none : (node.share[s] as number));
        if (next === 0) continue;
        if (next < start.threshold) {
          dropped += next;
          continue;
        }
        const local = s < 0 ? quiet : quietened(quiet, node, s);
        const atMost = next * ceiling(plan.ceilings[depth + 1], local);
        this.work += 4;
        if (atMost < start.threshold) {
          dropped += atMost;
          continue;
        }
        chosen[depth] = s;
        if (!visit(depth + 1, local, next)) return false;
      }
      return true;
    };
    if (!visit(0, start.quiet, 1)) return null;
    for (const [solution, { part: child, factor }] of used) {
      child.nodes.forEach((v, i) =>
        addScaled(mass[slot.get(v) as number] as Float64Array, solution.mass[i] as Float64Array, factor),
      );
    }
    return { z, dropped, mass };
  }
}

function quietened(quiet: Float64Array, node: Node, state: number): Float64Array {
  const local = Float64Array.from(quiet);
  for (const o of node.touches[state] as readonly number[]) {
    local[o] = (local[o] as number) * (node.miss[state] as number);
  }
  return local;
}

/** The answer when even the coarsest pass costs too much: no more than one variable is there. */
function oneAtATime(nodes: readonly Node[], part: Component, quiet: Float64Array): Solution {
  const mass = part.nodes.map((v) => new Float64Array((nodes[v] as Node).share.length));
  let logNone = 0;
  for (const v of part.nodes) logNone += Math.log((nodes[v] as Node).none);
  let logLeak = 0;
  for (const o of part.positives) logLeak += Math.log(1 - (quiet[o] as number));
  const terms: { slot: number; state: number; log: number }[] = [{ slot: -1, state: -1, log: logNone + logLeak }];
  part.nodes.forEach((v, slot) => {
    const node = nodes[v] as Node;
    node.touches.forEach((touches, state) => {
      let log = logNone - Math.log(node.none) + Math.log(node.share[state] as number) + logLeak;
      for (const o of touches) {
        const q = quiet[o] as number;
        log += Math.log1p(-q * (node.miss[state] as number)) - Math.log1p(-q);
      }
      terms.push({ slot, state, log });
    });
  });
  // Scaled so that it neither overflows nor vanishes; only the ratios are used by the caller.
  const most = terms.reduce((m, term) => Math.max(m, term.log), -Infinity);
  const scale = Math.max(most, -700);
  let z = 0;
  for (const { slot, state, log } of terms) {
    const m = Math.exp(log - most + scale);
    z += m;
    if (slot >= 0) (mass[slot] as Float64Array)[state] = m;
  }
  return { z, dropped: z, mass };
}
