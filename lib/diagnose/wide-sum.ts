import type { Component, Node, Solution } from './explained-table';
import { collectGroup, type Group } from './wide-group';

/**
 * The sum of a large group over which far-reaching variables are there, everything that reaches one positive only being
 * summed exactly below it. Once some are there, each further one helps less than it did before (what is explained
 * already needs no second cause), so the product of the single gains bounds everything above a combination from above,
 * and its first terms are exact. A combination is taken further while that bound leaves more open than `fine`.
 */

/** What a combination may leave open, beside the weightiest one. */
const fine = 1e-7;
/** Gains that add up to less than this hardly depend on each other. */
const gentleUpTo = 0.5;
/** What may lie above a combination of gentle gains that is not taken further. */
const fineAbove = 1e-6;
/** Elementary steps until combinations are no longer taken further. */
const workLimit = 120_000;
/** Most variables that are there at once in the combination that is found first. */
const mostAtOnce = 12;
/** Combinations below this share change no digit that is shown, so their near variables are not looked at. */
const nearFrom = 1e-7;

/** Sums a group, and says what the bound leaves open. Never throws. */
export function solveWide(nodes: readonly Node[], part: Component, quiet: Float64Array): Solution {
  return new WideSum(collectGroup(nodes, part, quiet), nodes, part).solve();
}

class WideSum {
  /** What the far variables of the present combination leave unexplained, one product a positive. */
  private readonly left: Float64Array;
  private readonly mass: Float64Array[];
  private z = 0;
  private dropped = 0;
  private work = 0;
  private scale = 0;
  private readonly order: number[];
  private readonly chosen: { variable: number; state: number }[] = [];

  constructor(
    private readonly group: Group,
    private readonly nodes: readonly Node[],
    private readonly part: Component,
  ) {
    this.left = new Float64Array(group.missed.length).fill(1);
    this.mass = part.nodes.map((v) => new Float64Array((nodes[v] as Node).share.length));
    this.order = group.variables.map((_, n) => n);
  }

  solve(): Solution {
    const { group } = this;
    const first = this.logNow();
    const gains = group.variables.map((_, n) => this.gainOf(n).total);
    this.order.sort((a, b) => (gains[b] as number) - (gains[a] as number));
    this.scale = this.greedy(first);
    this.take(0, { log: first, weight: 0 });
    return { z: this.z, dropped: this.dropped, mass: this.mass };
  }

  /** Logarithm of the chance that all positives are explained as things stand. */
  private logNow(): number {
    let log = 0;
    for (let i = 0; i < this.left.length; i++)
      log += Math.log1p(-(this.group.missed[i] as number) * (this.left[i] as number));
    return log;
  }

  /** Logarithms of what each state of a variable would gain now, its odds included, and of their sum. */
  private gainOf(n: number): { total: number; states: Float64Array } {
    const { missed, variables } = this.group;
    const { states } = variables[n] as Group['variables'][number];
    const gains = new Float64Array(states.length);
    let total = -Infinity;
    states.forEach(({ logOdds, touches, miss }, s) => {
      let log = logOdds;
      let product = 1;
      for (let t = 0; t < touches.length; t++) {
        const i = touches[t] as number;
        const open = (missed[i] as number) * (this.left[i] as number);
        product *= (1 - open * miss) / (1 - open);
        if (product > 1e200) {
          log += Math.log(product);
          product = 1;
        }
      }
      this.work += touches.length + 1;
      gains[s] = log + Math.log(product);
      total = logAdd(total, gains[s] as number);
    });
    return { total, states: gains };
  }

  private put(n: number, s: number): Float64Array {
    const before = Float64Array.from(this.left);
    const { touches, miss } = (this.group.variables[n] as Group['variables'][number]).states[s] as {
      touches: readonly number[];
      miss: number;
    };
    for (const i of touches) this.left[i] = (this.left[i] as number) * miss;
    return before;
  }

  /** Logarithm of the weightiest combination that single steps lead to: a lower bound of the sum, and its scale. */
  private greedy(first: number): number {
    const used = new Set<number>();
    let best = first;
    for (let size = 0; size < mostAtOnce; size++) {
      let next = { gain: 0, n: -1, s: -1 };
      this.group.variables.forEach((_, n) => {
        if (used.has(n)) return;
        this.gainOf(n).states.forEach((gain, s) => {
          if (gain > next.gain) next = { gain, n, s };
        });
      });
      if (next.n < 0) break;
      used.add(next.n);
      this.put(next.n, next.s);
      best += next.gain;
    }
    this.left.fill(1);
    this.work = 0;
    return best;
  }

  /** Adds a combination and all that holds more variables, of those from place `from` of the order on. */
  private take(from: number, at: { log: number; weight: number }): void {
    const value = Math.exp(at.log - this.scale);
    const later: { n: number; gains: Float64Array; total: number }[] = [];
    let above = 0;
    let gains = -Infinity;
    for (let place = from; place < this.order.length; place++) {
      const n = this.order[place] as number;
      const { total, states } = this.gainOf(n);
      later.push({ n, gains: states, total });
      above += logOnePlus(total);
      gains = logAdd(gains, total);
    }
    const open = above > 500 ? Infinity : value * Math.expm1(above);
    const bound = Math.min(open, this.boundAbove(at, gains, later));
    // Single variables are always looked at, so that the budget never hides the leading cause.
    const used = this.chosen.length > 0 && this.work > workLimit;
    // Where the gains are small, their product gives what lies above nearly right, but not how it divides near a lane.
    const gentle = above < gentleUpTo;
    if (bound <= fine || (gentle && open <= fineAbove) || used) {
      this.addCombination(value, gentle ? later : []);
      this.dropped += Math.min(bound, Number.MAX_VALUE);
      return;
    }
    this.addCombination(value, []);
    later.forEach(({ n, gains }, k) => {
      gains.forEach((gain, s) => {
        const before = this.put(n, s);
        this.chosen.push({ variable: n, state: s });
        const { logOdds } = (this.group.variables[n] as Group['variables'][number]).states[s] as { logOdds: number };
        this.take(from + k + 1, { log: at.log + gain, weight: at.weight + logOdds });
        this.chosen.pop();
        this.left.set(before);
      });
    });
  }

  /**
   * Everything above a combination: with k further variables no more than the k-fold product of the gains, of whose sum
   * `gains` is the logarithm, and no more than the prior weight of k variables with everything explained.
   */
  private boundAbove(at: { log: number; weight: number }, gains: number, later: readonly { n: number }[]): number {
    let odds = 0;
    for (const { n } of later) odds += (this.group.variables[n] as Group['variables'][number]).odds;
    if (odds === 0) return 0;
    let total = 0;
    let logFactorial = 0;
    const byValue = at.log - this.scale;
    const byWeight = at.weight - this.scale;
    for (let k = 1; k <= later.length; k++) {
      logFactorial += Math.log(k);
      const value = byValue + k * gains - logFactorial;
      const weight = byWeight + k * Math.log(odds) - logFactorial;
      total += Math.exp(Math.min(600, value, weight));
    }
    return total;
  }

  private addCombination(value: number, gentle: readonly { n: number; gains: Float64Array; total: number }[]): void {
    let all = value;
    for (const { total } of gentle) all *= 1 + Math.exp(total);
    this.z += all;
    for (const { variable, state } of this.chosen) this.give(variable, state, all);
    for (const { n, gains, total } of gentle) {
      gains.forEach((gain, s) => this.give(n, s, (all * Math.exp(gain)) / (1 + Math.exp(total))));
    }
    if (all > nearFrom) this.addNear(all);
  }

  private give(variable: number, state: number, share: number): void {
    const { slot, states } = this.group.variables[variable] as Group['variables'][number];
    const own = this.mass[slot] as Float64Array;
    const { number } = states[state] as { number: number };
    own[number] = (own[number] as number) + share;
  }

  /** What each variable that reaches one positive only gets of a combination. */
  private addNear(share: number): void {
    const { near, loose, missed } = this.group;
    for (const { slot, positive, states } of near) {
      const own = this.mass[slot] as Float64Array;
      const left = this.left[positive] as number;
      const all = 1 - (missed[positive] as number) * left;
      for (const { number, share: prior, others } of states) {
        own[number] = (own[number] as number) + (share * prior * (1 - others * left)) / all;
      }
      this.work += states.length;
    }
    for (const { slot } of loose) {
      const own = this.mass[slot] as Float64Array;
      const prior = (this.nodes[this.part.nodes[slot] as number] as Node).share;
      prior.forEach((p, s) => void (own[s] = (own[s] as number) + share * p));
    }
  }
}

function logAdd(a: number, b: number): number {
  if (a === -Infinity) return b;
  if (b === -Infinity) return a;
  return a > b ? a + Math.log1p(Math.exp(b - a)) : b + Math.log1p(Math.exp(a - b));
}

function logOnePlus(log: number): number {
  return log > 0 ? log + Math.log1p(Math.exp(-log)) : Math.log1p(Math.exp(log));
}
