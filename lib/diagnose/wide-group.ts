import type { Component, Node } from './explained-table';

/** One way for a far-reaching variable to be there. */
interface WideState {
  /** Which state of its variable it is. */
  readonly number: number;
  readonly logOdds: number;
  /** Places of the positives in the group. */
  readonly touches: readonly number[];
  readonly miss: number;
}

/** A variable that reaches several positives. */
interface WideVariable {
  /** Place of the variable in the group. */
  readonly slot: number;
  readonly states: readonly WideState[];
  readonly odds: number;
}

/** A variable that reaches one positive only. */
interface NearVariable {
  readonly slot: number;
  readonly positive: number;
  readonly states: readonly {
    readonly number: number;
    readonly share: number;
    /** The chance that neither anything else near nor this state explains the positive. */
    readonly others: number;
  }[];
}

/** A connected group laid out for the sum: far-reaching variables apart, near ones drawn together by positive. */
export interface Group {
  readonly variables: readonly WideVariable[];
  readonly near: readonly NearVariable[];
  /** Variables that reach no positive of the group. */
  readonly loose: readonly { readonly slot: number }[];
  /** For each positive the chance that neither the outside nor a near variable explains it. */
  readonly missed: Float64Array;
}

/** Lays out a group. `quiet` is, by positive, the probability that nothing outside the group explains it. */
export function collectGroup(nodes: readonly Node[], part: Component, quiet: Float64Array): Group {
  const place = new Map(part.positives.map((o, i) => [o, i]));
  const missed = Float64Array.from(part.positives, (o) => quiet[o] as number);
  const variables: WideVariable[] = [];
  const nearOnes: { slot: number; positive: number; node: Node; touched: readonly boolean[]; own: number }[] = [];
  const loose: { slot: number }[] = [];
  part.nodes.forEach((v, slot) => {
    const node = nodes[v] as Node;
    const touches = node.touches.map((list) => list.flatMap((o) => place.get(o) ?? []));
    const reached = new Set(touches.flat());
    if (reached.size === 0) loose.push({ slot });
    else if (reached.size === 1) {
      const positive = [...reached][0] as number;
      const touched = touches.map((list) => list.length > 0);
      let shown = 0;
      touched.forEach((yes, s) => {
        if (yes) shown += (node.share[s] as number) * (1 - (node.miss[s] as number));
      });
      missed[positive] = (missed[positive] as number) * (1 - shown);
      nearOnes.push({ slot, positive, node, touched, own: 1 - shown });
    } else variables.push(wideVariable(node, slot, touches));
  });
  const near = nearOnes.map(({ slot, positive, node, touched, own }): NearVariable => {
    const others = (missed[positive] as number) / Math.max(own, 1e-300);
    return {
      slot,
      positive,
      states: touched.map((yes, number) => ({
        number,
        share: node.share[number] as number,
        others: others * (yes ? (node.miss[number] as number) : 1),
      })),
    };
  });
  return { variables, near, loose, missed };
}

function wideVariable(node: Node, slot: number, touches: readonly (readonly number[])[]): WideVariable {
  const states = touches.flatMap((list, number): WideState[] => {
    const odds = (node.share[number] as number) / node.none;
    return odds > 0 ? [{ number, logOdds: Math.log(odds), touches: list, miss: node.miss[number] as number }] : [];
  });
  return { slot, states, odds: states.reduce((sum, state) => sum + Math.exp(state.logOdds), 0) };
}
