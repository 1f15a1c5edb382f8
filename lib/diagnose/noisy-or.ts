/**
 * Exact inference in a noisy-OR model with many hidden variables and a few observations that came out
 * positive (a lane that failed). The idea that negative observations factorise and only positive ones
 * couple the variables: D. Heckerman, A tractable inference algorithm for diagnosing multiple diseases,
 * UAI 1989 (from memory). His sum over subsets alternates in sign and loses digits as soon as several
 * rare faults meet, so the sum here runs over "which positives are already explained": every term is
 * positive and nothing cancels.
 */

import { mergeAlike } from './merge-alike';

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
  /** Probability that a positive observation comes from nothing in the model. */
  readonly leak: number;
}

export interface NoisyOrAnswer {
  /** Natural logarithm of the probability of the observations, -Infinity where it is 0. */
  readonly logEvidence: number;
  /** Posterior of each state of each variable. */
  readonly marginals: readonly Float64Array[];
  /** Upper bound of the share of probability that was left out; 0 where the sum is whole. */
  readonly leftOut: number;
}

/** A variable in the form that the sum works on: weights add up to 1 with `none`. */
interface Node {
  readonly none: number;
  readonly share: Float64Array;
  readonly touches: readonly (readonly number[])[];
  readonly miss: Float64Array;
  readonly widest: number;
}

interface Solution {
  readonly z: number;
  readonly dropped: number;
  /** For each node asked about, the mass of each of its states. */
  readonly mass: readonly Float64Array[];
}

/** Work that one answer may take before combinations of many faults are left out, in elementary steps. */
const workLimit = 6_000_000;
/** A group whose table of explained subsets costs less than this is summed in one go. */
const tableLimit = 40_000;
/** The share of probability that may be left out while the answer still counts as exact. */
export const exactWithin = 1e-10;

const emptyMass = (node: Node) => new Float64Array(node.share.length);

function toNode(variable: HiddenVariable): { node: Node; total: number } {
  let total = variable.absent;
  for (const state of variable.states) total += state.weight;
  const safe = total > 0 ? total : 1;
  return {
    total,
    node: {
      none: variable.absent / safe,
      share: Float64Array.from(variable.states, (state) => state.weight / safe),
      touches: variable.states.map((state) => state.touches),
      miss: Float64Array.from(variable.states, (state) => state.miss),
      widest: variable.states.reduce((most, state) => Math.max(most, state.touches.length), 0),
    },
  };
}

/** Posterior of every state of every variable, given that all positives came out positive. Never throws. */
export function inferNoisyOr(model: NoisyOrModel): NoisyOrAnswer {
  const merged = mergeAlike(model);
  const answer = inferMerged(merged.model);
  return { ...answer, marginals: merged.unmerge(answer.marginals) };
}

function inferMerged(model: NoisyOrModel): NoisyOrAnswer {
  let logScale = 0;
  const nodes: Node[] = [];
  for (const variable of model.variables) {
    const { node, total } = toNode(variable);
    logScale += Math.log(total);
    nodes.push(node);
  }
  const marginals = nodes.map((node) => Float64Array.from(node.share));
  const sum = new Sum(nodes);
  const all = Array.from({ length: model.positives }, (_, o) => o);
  const quiet = new Float64Array(model.positives).fill(1 - model.leak);

  let logZ = 0;
  let leftOut = 0;
  for (const part of sum.split(
    nodes.map((_, v) => v).filter((v) => (nodes[v] as Node).widest > 0),
    all,
  )) {
    const solution = sum.solveWithin(part, quiet);
    if (!(solution.z > 0)) return { logEvidence: -Infinity, marginals, leftOut: 1 };
    logZ += Math.log(solution.z);
    leftOut += solution.dropped / solution.z;
    part.nodes.forEach((v, i) => {
      const mass = solution.mass[i] as Float64Array;
      marginals[v] = mass.map((m) => m / solution.z);
    });
  }
  return { logEvidence: logScale + logZ, marginals, leftOut: Math.min(1, leftOut) };
}

interface Component {
  readonly nodes: readonly number[];
  readonly positives: readonly number[];
}

/** The sum itself, over one model. */
class Sum {
  private work = 0;
  private budget = workLimit;

  constructor(private readonly nodes: readonly Node[]) {}

  /** Sums one connected group, leaving out less and less until the answer is exact or the work is used up. */
  solveWithin(part: Component, quiet: Float64Array): Solution {
    this.budget = workLimit;
    let best: Solution | null = null;
    // A first coarse pass tells how large the sum is; the next ones leave out only what is small beside it.
    for (let threshold = 1e-5, pass = 0; pass < 6; pass++) {
      this.work = 0;
      const solution: Solution | null = this.solve(part, quiet, threshold);
      if (!solution) break;
      best = solution;
      if (solution.dropped <= solution.z * exactWithin) break;
      this.budget -= this.work;
      if (this.budget < this.work * 2) break;
      threshold = Math.min(threshold * 1e-3, solution.z * exactWithin);
    }
    return best ?? this.fallBack(part, quiet);
  }

  /** Splits positives into groups that share no variable. */
  split(nodeList: readonly number[], positives: readonly number[]): Component[] {
    const group = new Map<number, number>();
    for (const o of positives) group.set(o, o);
    const root = (o: number): number => {
      let at = o;
      while (group.get(at) !== at) {
        const up = group.get(group.get(at) as number) as number;
        group.set(at, up);
        at = up;
      }
      return at;
    };
    const home: number[] = [];
    for (const v of nodeList) {
      let first = -1;
      for (const touches of (this.nodes[v] as Node).touches) {
        for (const o of touches) {
          if (!group.has(o)) continue;
          if (first < 0) first = o;
          else group.set(root(o), root(first));
        }
      }
      home.push(first);
    }
    const parts = new Map<number, { nodes: number[]; positives: number[] }>();
    for (const o of positives) {
      const r = root(o);
      const part = parts.get(r);
      if (part) part.positives.push(o);
      else parts.set(r, { nodes: [], positives: [o] });
    }
    const loose: number[] = [];
    nodeList.forEach((v, i) => {
      const first = home[i] as number;
      if (first < 0) loose.push(v);
      else parts.get(root(first))?.nodes.push(v);
    });
    const list: Component[] = [...parts.values()];
    if (loose.length > 0) list.push({ nodes: loose, positives: [] });
    return list;
  }

  private solve(part: Component, quiet: Float64Array, threshold: number): Solution | null {
    if (part.positives.length === 0) {
      return { z: 1, dropped: 0, mass: part.nodes.map((v) => (this.nodes[v] as Node).share) };
    }
    const steps = this.tableSteps(part);
    if (part.positives.length === 1 || steps <= tableLimit) {
      this.work += steps;
      return this.work > this.budget ? null : this.table(part, quiet);
    }
    return this.branch(part, quiet, threshold);
  }

  private tableSteps(part: Component): number {
    const n = part.positives.length;
    if (n > 14) return Infinity;
    let states = 1;
    for (const v of part.nodes) for (const touches of (this.nodes[v] as Node).touches) states += 1 + touches.length;
    return states * 2 ** n;
  }

  /** Fixes the variable that reaches furthest in each of its states, and sums what then falls apart. */
  private branch(part: Component, quiet: Float64Array, threshold: number): Solution | null {
    const chosen = this.furthest(part);
    const node = this.nodes[chosen] as Node;
    const rest = part.nodes.filter((v) => v !== chosen);
    const mass = new Map<number, Float64Array>(part.nodes.map((v) => [v, emptyMass(this.nodes[v] as Node)]));
    let z = 0;
    let dropped = 0;
    for (let s = -1; s < node.share.length; s++) {
      const share = s < 0 ? node.none : (node.share[s] as number);
      if (share === 0) continue;
      if (share < threshold) {
        dropped += share;
        continue;
      }
      const local = s < 0 ? quiet : this.quietened(quiet, node, s);
      const parts = this.split(rest, part.positives);
      const solutions: Solution[] = [];
      let product = share;
      let bound = share;
      for (const child of parts) {
        this.work += child.nodes.length + child.positives.length;
        const solution = this.solve(child, local, threshold / share);
        if (!solution || this.work > this.budget) return null;
        solutions.push(solution);
        product *= solution.z;
        bound *= Math.min(1, solution.z + solution.dropped);
      }
      z += product;
      dropped += Math.max(0, bound - product);
      if (s >= 0) (mass.get(chosen) as Float64Array)[s] = product;
      parts.forEach((child, c) => {
        const own = solutions[c] as Solution;
        if (!(own.z > 0)) return;
        const factor = product / own.z;
        child.nodes.forEach((v, i) => addScaled(mass.get(v) as Float64Array, own.mass[i] as Float64Array, factor));
      });
    }
    return { z, dropped, mass: part.nodes.map((v) => mass.get(v) as Float64Array) };
  }

  private quietened(quiet: Float64Array, node: Node, state: number): Float64Array {
    const local = Float64Array.from(quiet);
    for (const o of node.touches[state] as readonly number[])
      local[o] = (local[o] as number) * (node.miss[state] as number);
    return local;
  }

  private furthest(part: Component): number {
    const inside = new Set(part.positives);
    let chosen = part.nodes[0] as number;
    let reach = -1;
    for (const v of part.nodes) {
      const node = this.nodes[v] as Node;
      if (node.widest <= reach) continue;
      const most = node.touches.reduce(
        (m, t) =>
          Math.max(
            m,
            t.reduce((k, o) => k + (inside.has(o) ? 1 : 0), 0),
          ),
        0,
      );
      if (most > reach) {
        reach = most;
        chosen = v;
      }
    }
    return chosen;
  }

  /**
   * Sums a small group over the table of "which positives are explained so far", forwards and backwards,
   * which gives every marginal in twice the work of the sum.
   */
  private table(part: Component, quiet: Float64Array): Solution {
    const place = new Map(part.positives.map((o, i) => [o, i]));
    const size = 2 ** part.positives.length;
    const bits = part.nodes.map((v) =>
      (this.nodes[v] as Node).touches.map((touches) => {
        const list: number[] = [];
        for (const o of touches) {
          const i = place.get(o);
          if (i !== undefined) list.push(1 << i);
        }
        return list;
      }),
    );
    let f = new Float64Array(size);
    f[0] = 1;
    part.positives.forEach((o, i) => explain(f, 1 << i, quiet[o] as number));
    const before: Float64Array[] = [];
    part.nodes.forEach((v, i) => {
      before.push(f);
      const node = this.nodes[v] as Node;
      const g = f.map((x) => x * node.none);
      bits[i]?.forEach((own, s) => {
        const share = node.share[s] as number;
        if (share === 0) return;
        const h = f.map((x) => x * share);
        for (const bit of own) explain(h, bit, node.miss[s] as number);
        addScaled(g, h, 1);
      });
      f = g;
    });
    const z = f[size - 1] as number;

    let b = new Float64Array(size);
    b[size - 1] = 1;
    const mass: Float64Array[] = new Array(part.nodes.length);
    for (let i = part.nodes.length - 1; i >= 0; i--) {
      const node = this.nodes[part.nodes[i] as number] as Node;
      const own = emptyMass(node);
      const earlier = before[i] as Float64Array;
      const c = b.map((x) => x * node.none);
      bits[i]?.forEach((list, s) => {
        const share = node.share[s] as number;
        if (share === 0) return;
        const h = b.map((x) => x * share);
        for (const bit of list) explainBack(h, bit, node.miss[s] as number);
        own[s] = dot(earlier, h);
        addScaled(c, h, 1);
      });
      mass[i] = own;
      b = c;
    }
    return { z, dropped: 0, mass };
  }

  /** The answer when even the coarsest pass costs too much: one state of one variable at a time. */
  private fallBack(part: Component, quiet: Float64Array): Solution {
    const mass = part.nodes.map((v) => emptyMass(this.nodes[v] as Node));
    const leakOnly = part.positives.reduce((p, o) => p * (1 - (quiet[o] as number)), 1);
    let none = 1;
    for (const v of part.nodes) none *= (this.nodes[v] as Node).none;
    let z = none * leakOnly;
    part.nodes.forEach((v, i) => {
      const node = this.nodes[v] as Node;
      node.touches.forEach((touches, s) => {
        let likelihood = leakOnly;
        for (const o of touches) {
          const q = quiet[o] as number;
          likelihood *= (1 - q * (node.miss[s] as number)) / (1 - q);
        }
        const m = node.none > 0 ? (none / node.none) * (node.share[s] as number) * likelihood : 0;
        (mass[i] as Float64Array)[s] = m;
        z += m;
      });
    });
    return { z, dropped: z, mass };
  }
}

/** Lets one cause explain one positive, with probability 1 - miss, in a table of explained subsets. */
function explain(table: Float64Array, bit: number, miss: number): void {
  const hit = 1 - miss;
  for (let m = 0; m < table.length; m++) {
    if (m & bit) continue;
    const x = table[m] as number;
    table[m | bit] = (table[m | bit] as number) + x * hit;
    table[m] = x * miss;
  }
}

/** The transpose of `explain`. */
function explainBack(table: Float64Array, bit: number, miss: number): void {
  const hit = 1 - miss;
  for (let m = 0; m < table.length; m++) {
    if (m & bit) continue;
    table[m] = (table[m] as number) * miss + (table[m | bit] as number) * hit;
  }
}

function addScaled(to: Float64Array, from: Float64Array, factor: number): void {
  for (let i = 0; i < to.length; i++) to[i] = (to[i] as number) + (from[i] as number) * factor;
}

function dot(a: Float64Array, b: Float64Array): number {
  let total = 0;
  for (let i = 0; i < a.length; i++) total += (a[i] as number) * (b[i] as number);
  return total;
}
