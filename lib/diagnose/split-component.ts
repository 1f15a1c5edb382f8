import type { Component, Node } from './explained-table';

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
