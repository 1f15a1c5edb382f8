import { solveByTable, tableSteps, type Component, type Node, type Solution } from './explained-table';
import { mergeAlike } from './merge-alike';
import { splitComponent } from './split-component';
import { solveWide } from './wide-sum';

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
  /** Every group was summed by a table, which is quick enough to be done again for a further question. */
  readonly quick: boolean;
}

/** The share of probability that may be left out while the answer still counts as exact. */
export const exactWithin = 1e-9;
/** A whole group is summed by one table up to this many elementary steps: nothing is left out then. */
const wholeTable = 150_000;
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
  let quick = true;
  for (const part of splitComponent(nodes, everything)) {
    const solution = solveWithin(nodes, part, quiet);
    if (tableSteps(nodes, part) > wholeTable) quick = false;
    if (!(solution.z > 0)) return { logEvidence: -Infinity, marginals, leftOut: 1, quick: true };
    logZ += Math.log(solution.z);
    leftOut += solution.dropped / solution.z;
    part.nodes.forEach((v, i) => {
      marginals[v] = (solution.mass[i] as Float64Array).map((m) => m / solution.z);
    });
  }
  return { logEvidence: logScale + logZ, marginals, leftOut: Math.min(1, leftOut), quick };
}

/** Sums one connected group: by one table where that is short, else over the combinations that weigh anything. */
function solveWithin(nodes: readonly Node[], part: Component, quiet: Float64Array): Solution {
  return tableSteps(nodes, part) <= wholeTable ? solveByTable(nodes, part, quiet) : solveWide(nodes, part, quiet);
}
