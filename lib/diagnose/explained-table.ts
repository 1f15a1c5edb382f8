/** A hidden variable with its weights made to add up to 1. */
export interface Node {
  readonly none: number;
  readonly share: Float64Array;
  /** Positives that each state can explain. */
  readonly touches: readonly (readonly number[])[];
  readonly miss: Float64Array;
  /** The most that any state touches. */
  readonly widest: number;
}

/** A connected group: variables and the positives that they can explain. */
export interface Component {
  readonly nodes: readonly number[];
  readonly positives: readonly number[];
}

/** Mass of a group: that all its positives are explained, and how that divides among the states of each node. */
export interface Solution {
  readonly z: number;
  /** Upper bound of the mass that was left out. */
  readonly dropped: number;
  readonly mass: readonly Float64Array[];
}

/** Elementary steps that the table of a group takes; Infinity where it would be too large to keep. */
export function tableSteps(nodes: readonly Node[], part: Component): number {
  if (part.positives.length > 14) return Infinity;
  let states = 1;
  for (const v of part.nodes) for (const touches of nodes[v]?.touches ?? []) states += 1 + touches.length;
  return states * 2 ** part.positives.length;
}

/**
 * Sums a group over the table of "which positives are explained so far", forwards and backwards, which
 * gives every marginal in twice the work of the sum. `quiet` is, for each positive, the probability that
 * nothing outside the group explains it.
 */
export function solveByTable(nodes: readonly Node[], part: Component, quiet: Float64Array): Solution {
  if (part.positives.length === 1) return solveOne(nodes, part, quiet);
  const place = new Map(part.positives.map((o, i) => [o, i]));
  const size = 2 ** part.positives.length;
  const own = part.nodes.map((v) => nodes[v] as Node);
  const bits = own.map((node) =>
    node.touches.map((touches) => {
      const list: number[] = [];
      for (const o of touches) {
        const i = place.get(o);
        if (i !== undefined) list.push(1 << i);
      }
      return list;
    }),
  );
  let forward = new Float64Array(size);
  forward[0] = 1;
  part.positives.forEach((o, i) => explain(forward, 1 << i, quiet[o] as number));
  const before: Float64Array[] = [];
  const scratch = new Float64Array(size);
  own.forEach((node, i) => {
    before.push(forward);
    const next = new Float64Array(size);
    addScaled(next, forward, node.none);
    bits[i]?.forEach((list, s) => {
      const share = node.share[s] as number;
      if (share === 0) return;
      scratch.set(forward);
      for (const bit of list) explain(scratch, bit, node.miss[s] as number);
      addScaled(next, scratch, share);
    });
    forward = next;
  });
  const z = forward[size - 1] as number;

  let backward = new Float64Array(size);
  backward[size - 1] = 1;
  const mass: Float64Array[] = new Array(own.length);
  for (let i = own.length - 1; i >= 0; i--) {
    const node = own[i] as Node;
    const states = new Float64Array(node.share.length);
    const earlier = before[i] as Float64Array;
    const previous = new Float64Array(size);
    addScaled(previous, backward, node.none);
    bits[i]?.forEach((list, s) => {
      const share = node.share[s] as number;
      if (share === 0) return;
      scratch.set(backward);
      for (const bit of list) explainBack(scratch, bit, node.miss[s] as number);
      states[s] = share * dot(earlier, scratch);
      addScaled(previous, scratch, share);
    });
    mass[i] = states;
    backward = previous;
  }
  return { z, dropped: 0, mass };
}

/** The table of a single positive, written out: it is the most common group by far. */
function solveOne(nodes: readonly Node[], part: Component, quiet: Float64Array): Solution {
  const only = part.positives[0] as number;
  const missed = part.nodes.map((v) => {
    const node = nodes[v] as Node;
    let shown = 0;
    node.touches.forEach((touches, s) => {
      if (touches.includes(only)) shown += (node.share[s] as number) * (1 - (node.miss[s] as number));
    });
    return 1 - shown;
  });
  const allMiss = missed.reduce((product, m) => product * m, quiet[only] as number);
  const mass = part.nodes.map((v, i) => {
    const node = nodes[v] as Node;
    const othersMiss = (missed[i] as number) > 0 ? allMiss / (missed[i] as number) : 0;
    return node.share.map((share, s) => {
      const own = node.touches[s]?.includes(only) ? (node.miss[s] as number) : 1;
      return share * (1 - othersMiss * own);
    });
  });
  return { z: 1 - allMiss, dropped: 0, mass };
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

/** Adds factor times `from` to `to`, in place. */
export function addScaled(to: Float64Array, from: Float64Array, factor: number): void {
  for (let i = 0; i < to.length; i++) to[i] = (to[i] as number) + (from[i] as number) * factor;
}

function dot(a: Float64Array, b: Float64Array): number {
  let total = 0;
  for (let i = 0; i < a.length; i++) total += (a[i] as number) * (b[i] as number);
  return total;
}
