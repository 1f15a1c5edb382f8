import { tableSteps, type Component, type Node } from './explained-table';

/** How a group too large for one table is taken apart: fix the variables of `cut`, and the rest falls into `parts`. */
export interface Plan {
  readonly cut: readonly number[];
  readonly parts: readonly Component[];
  /** For each number of variables fixed so far, how much the group can be worth at the most. */
  readonly ceilings: readonly Ceiling[];
}

/** Positives of which no two share an open variable, each with the chance that the open variables miss it. */
interface Ceiling {
  readonly positives: readonly number[];
  readonly missed: readonly number[];
}

/**
 * Fixes the variables that reach furthest until the group falls apart, or until a table of at most `tableSize`
 * steps holds each part. Further cuts are made inside the parts, each on its own: that adds up where one long
 * cut would multiply.
 */
export function planCut(nodes: readonly Node[], part: Component, tableSize: number): Plan {
  const reach = (v: number) => (nodes[v] as Node).widest;
  const order = [...part.nodes].sort((a, b) => reach(b) - reach(a));
  const cut: number[] = [];
  let parts: Component[] = [part];
  const tooLarge = (each: Component) => each.positives.length > 1 && tableSteps(nodes, each) > tableSize;
  while (parts.filter((each) => each.positives.length > 0).length < 2 && parts.some(tooLarge) && order.length > 0) {
    cut.push(order.shift() as number);
    parts = splitComponent(nodes, { nodes: order, positives: part.positives });
  }
  return { cut, parts, ceilings: ceilingsOf(nodes, part, cut) };
}

/** Splits a group into the groups that share no variable. Variables that explain none of its positives come last. */
export function splitComponent(nodes: readonly Node[], whole: Component): Component[] {
  const parent = new Map<number, number>(whole.positives.map((o) => [o, o]));
  const root = (o: number): number => {
    let at = o;
    for (let up = parent.get(at) as number; up !== at; up = parent.get(at) as number) {
      parent.set(at, parent.get(up) as number);
      at = up;
    }
    return at;
  };
  const home = whole.nodes.map((v) => {
    let first = -1;
    for (const touches of (nodes[v] as Node).touches) {
      for (const o of touches) {
        if (!parent.has(o)) continue;
        if (first < 0) first = o;
        else parent.set(root(o), root(first));
      }
    }
    return first;
  });
  const parts = new Map<number, { nodes: number[]; positives: number[] }>();
  for (const o of whole.positives) {
    const part = parts.get(root(o));
    if (part) part.positives.push(o);
    else parts.set(root(o), { nodes: [], positives: [o] });
  }
  const loose: number[] = [];
  whole.nodes.forEach((v, i) => {
    const first = home[i] as number;
    if (first < 0) loose.push(v);
    else parts.get(root(first))?.nodes.push(v);
  });
  return loose.length > 0 ? [...parts.values(), { nodes: loose, positives: [] }] : [...parts.values()];
}

/**
 * Ceilings by how many variables of the cut are fixed. Explaining some of the positives is never less likely
 * than explaining all, and those that share no open variable are explained independently of each other.
 */
function ceilingsOf(nodes: readonly Node[], part: Component, cut: readonly number[]): Ceiling[] {
  const n = part.positives.length;
  const at = new Map(part.positives.map((o, i) => [o, i]));
  const missed = new Float64Array(n).fill(1);
  const openAt: number[][] = part.positives.map(() => []);
  const open = (v: number): void => {
    const node = nodes[v] as Node;
    const shows = new Map<number, number>();
    node.touches.forEach((touches, s) => {
      const shown = (node.share[s] as number) * (1 - (node.miss[s] as number));
      for (const o of touches) shows.set(o, (shows.get(o) ?? 0) + shown);
    });
    for (const [o, shown] of shows) {
      const i = at.get(o);
      if (i === undefined) continue;
      missed[i] = (missed[i] as number) * (1 - shown);
      (openAt[i] as number[]).push(v);
    }
  };
  // A stride that visits all places and lands far from the last ones finds lanes of different banks and bits.
  let stride = Math.max(1, Math.round(n * 0.618));
  while (greatestDivisor(stride, n) !== 1) stride++;
  const choose = (): Ceiling => {
    const taken = new Set<number>();
    const chosen: number[] = [];
    for (let k = 0; k < n; k++) {
      const i = (k * stride) % n;
      const own = openAt[i] as number[];
      if (own.some((v) => taken.has(v))) continue;
      own.forEach((v) => taken.add(v));
      chosen.push(i);
    }
    return {
      positives: chosen.map((i) => part.positives[i] as number),
      missed: chosen.map((i) => missed[i] as number),
    };
  };
  const inCut = new Set(cut);
  for (const v of part.nodes) if (!inCut.has(v)) open(v);
  const ceilings: Ceiling[] = [choose()];
  for (let d = cut.length - 1; d > 0; d--) {
    open(cut[d] as number);
    ceilings.push(choose());
  }
  ceilings.push({ positives: [], missed: [] });
  return ceilings.reverse();
}

/** The most that a group can be worth once some variables are fixed, given what explains its positives so far. */
export function ceiling(own: Ceiling | undefined, quiet: Float64Array): number {
  let most = 1;
  own?.positives.forEach((o, i) => (most *= 1 - (quiet[o] as number) * (own.missed[i] as number)));
  return most;
}

function greatestDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestDivisor(b, a % b);
}
